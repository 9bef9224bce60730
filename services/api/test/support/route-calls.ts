import { newScenario, type RouteKey } from '@noonwell/schema';
import type { Belongings } from './route-fixture';
import { PASSWORD, type Person } from './people';

export interface RouteCall {
  /** What stands for the parameter in the path; undefined where there is none. */
  readonly object?: (belongings: Belongings) => string;
  readonly body?: (belongings: Belongings, caller: Person) => object | FormData;
  /** Status for those who may: mostly success, else what shows that the call got past every check of rights. */
  readonly allowed: number;
  /** The call changes the object's study: a student may read shared ones only. */
  readonly writesStudy?: true;
  /** The object is part of a study, which may be somebody's sandbox. */
  readonly ofStudy?: true;
}

const study = { object: ({ studyId }: Belongings) => studyId, ofStudy: true } as const;
const scenario = { object: ({ scenarioId }: Belongings) => scenarioId, ofStudy: true } as const;
const version = { object: ({ versionId }: Belongings) => versionId, ofStudy: true } as const;
const doneRun = { object: ({ doneRunId }: Belongings) => doneRunId, ofStudy: true } as const;
const failedRun = { object: ({ failedRunId }: Belongings) => failedRunId, ofStudy: true } as const;
const weather = { object: ({ weatherYearId }: Belongings) => weatherYearId } as const;
const writes = { writesStudy: true } as const;

/** An upload that is read and refused: whether good files are saved is the weather routes' own test. */
function emptyFile(): FormData {
  const form = new FormData();
  form.set('file', new Blob([]), 'empty.epw');
  return form;
}

/** How to call each route. A route of ROUTES without a line here does not compile. */
export const ROUTE_CALLS: Readonly<Record<RouteKey, RouteCall>> = {
  'GET /api/health': { allowed: 200 },
  'GET /api/openapi.json': { allowed: 200 },
  'GET /api/scenario-schema': { allowed: 200 },
  'GET /api/auth/demo-accounts': { allowed: 200 },
  'POST /api/auth/sign-in': { allowed: 200, body: (_, { email }) => ({ email, password: PASSWORD }) },
  'POST /api/auth/demo-sign-in': { allowed: 200, body: () => ({ role: 'student' }) },
  // Without the cookie there is nothing to go on with, whoever asks; with it they have tests of their own.
  'POST /api/auth/refresh': { allowed: 401 },
  'POST /api/auth/sign-out': { allowed: 204 },
  'GET /api/auth/me': { allowed: 200 },
  'GET /api/workspace/members': { allowed: 200 },
  'PATCH /api/workspace/members/{userId}': {
    allowed: 200,
    object: ({ memberId }) => memberId,
    body: () => ({ role: 'student' }),
  },
  'GET /api/weather-years': { allowed: 200 },
  'POST /api/weather-years': { allowed: 422, body: emptyFile },
  'GET /api/weather-years/{id}': { allowed: 200, ...weather },
  'GET /api/weather-years/{id}/original': { allowed: 200, ...weather },
  'GET /api/weather-years/{id}/columns': { allowed: 200, ...weather },
  'DELETE /api/weather-years/{id}': { allowed: 204, object: ({ spareWeatherYearId }) => spareWeatherYearId },
  'GET /api/studies': { allowed: 200 },
  'POST /api/studies': { allowed: 201, body: () => ({ name: 'Another' }) },
  'GET /api/studies/{id}': { allowed: 200, ...study },
  'PATCH /api/studies/{id}': { allowed: 200, ...study, ...writes, body: () => ({ name: 'Renamed' }) },
  'DELETE /api/studies/{id}': { allowed: 204, ...study, ...writes },
  'POST /api/studies/{id}/scenarios': {
    allowed: 201,
    ...study,
    ...writes,
    body: () => ({ name: 'Cell', document: newScenario('cell'), weatherYearId: null }),
  },
  'PUT /api/studies/{id}/weather-year': {
    allowed: 200,
    ...study,
    ...writes,
    body: ({ spareWeatherYearId }) => ({ weatherYearId: spareWeatherYearId }),
  },
  'POST /api/studies/{id}/runs': { allowed: 200, ...study, ...writes, body: () => ({}) },
  'GET /api/studies/{id}/runs': { allowed: 200, ...study },
  'GET /api/studies/{id}/events': { allowed: 200, ...study },
  'GET /api/scenarios/{id}': { allowed: 200, ...scenario },
  'PUT /api/scenarios/{id}': {
    allowed: 200,
    ...scenario,
    ...writes,
    body: () => ({ basedOnVersion: 2, document: newScenario('cell'), weatherYearId: null }),
  },
  'DELETE /api/scenarios/{id}': { allowed: 204, ...scenario, ...writes },
  'GET /api/scenarios/{id}/versions': { allowed: 200, ...scenario },
  'GET /api/scenario-versions/{id}/export': { allowed: 200, ...version },
  'GET /api/runs/{id}': { allowed: 200, ...doneRun },
  'POST /api/runs/{id}/cancel': { allowed: 200, ...doneRun, ...writes },
  'POST /api/runs/{id}/retry': { allowed: 200, ...failedRun, ...writes },
  'GET /api/runs/{id}/summary': { allowed: 200, ...doneRun },
  'GET /api/runs/{id}/columns': { allowed: 200, ...doneRun },
};
