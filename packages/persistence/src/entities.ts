import { Membership } from './identity/membership.entity.js';
import { RefreshToken } from './identity/refresh-token.entity.js';
import { User } from './identity/user.entity.js';
import { Workspace } from './identity/workspace.entity.js';
import { OutboxMessage } from './runs/outbox.entity.js';
import { RunResultRow } from './runs/run-result.entity.js';
import { RunRow } from './runs/run.entity.js';
import { ScenarioVersion } from './studies/scenario-version.entity.js';
import { ScenarioRow } from './studies/scenario.entity.js';
import { Study } from './studies/study.entity.js';
import { WeatherColumns, WeatherOriginal } from './weather/weather-bytes.entity.js';
import { WeatherYear } from './weather/weather-year.entity.js';

/** Every table of ours. */
export const ENTITIES = [
  Workspace,
  User,
  Membership,
  RefreshToken,
  WeatherYear,
  WeatherOriginal,
  WeatherColumns,
  Study,
  ScenarioRow,
  ScenarioVersion,
  RunRow,
  RunResultRow,
  OutboxMessage,
];
