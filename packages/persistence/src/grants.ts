/**
 * What the app role may do, one line a table: it owns nothing. Rows that go with their parent (versions, results,
 * bytes) are removed by the foreign key, so no right to delete them is given; versions and results never change.
 */
export const APP_GRANTS = {
  workspaces: ['select', 'insert', 'update'],
  users: ['select', 'insert', 'update'],
  memberships: ['select', 'insert', 'update', 'delete'],
  refresh_tokens: ['select', 'insert', 'update', 'delete'],
  weather_years: ['select', 'insert', 'update', 'delete'],
  weather_originals: ['select', 'insert'],
  weather_columns: ['select', 'insert'],
  studies: ['select', 'insert', 'update', 'delete'],
  scenarios: ['select', 'insert', 'update', 'delete'],
  scenario_versions: ['select', 'insert'],
  runs: ['select', 'insert', 'update', 'delete'],
  run_results: ['select', 'insert'],
  outbox: ['select', 'insert', 'delete'],
} as const satisfies Record<string, readonly ('select' | 'insert' | 'update' | 'delete')[]>;
