import { Migration } from '@mikro-orm/migrations';

/** What the policies compare with. An ended SET LOCAL leaves '' behind: nullif makes that "nobody" again. */
const setting = (name: string): string => `nullif(current_setting('noonwell.${name}', true), '')`;
const WORKSPACE = `${setting('workspace_id')}::uuid`;
const USER = `${setting('user_id')}::uuid`;

/**
 * Tenant rows refer to each other by (workspace_id, id): the checks of foreign keys bypass row-level security,
 * so a plain reference could point into another workspace.
 */
const TABLES = `
create table workspaces (
  id uuid primary key,
  name text not null,
  is_demo boolean not null default false,
  created_at timestamptz(3) not null
);
create unique index workspaces_one_demo on workspaces (is_demo) where is_demo;

create table users (
  id uuid primary key,
  email text not null unique check (email = lower(email)),
  name text not null,
  password_hash text,
  disabled_at timestamptz(3),
  created_at timestamptz(3) not null
);

create table memberships (
  id uuid primary key,
  workspace_id uuid not null references workspaces (id) on delete cascade,
  user_id uuid not null references users (id) on delete cascade,
  role text not null check (role in ('admin', 'engineer', 'analyst', 'student')),
  created_at timestamptz(3) not null,
  updated_at timestamptz(3) not null,
  unique (workspace_id, user_id)
);
create index memberships_user on memberships (user_id);

create table refresh_tokens (
  id uuid primary key,
  family_id uuid not null,
  user_id uuid not null references users (id) on delete cascade,
  workspace_id uuid not null references workspaces (id) on delete cascade,
  token_hash text not null unique,
  created_at timestamptz(3) not null,
  used_at timestamptz(3),
  revoked_at timestamptz(3),
  expires_at timestamptz(3) not null,
  family_expires_at timestamptz(3) not null
);
create index refresh_tokens_family on refresh_tokens (family_id);
create index refresh_tokens_user on refresh_tokens (user_id);
create index refresh_tokens_workspace on refresh_tokens (workspace_id);

create table weather_years (
  id uuid primary key,
  workspace_id uuid not null references workspaces (id) on delete cascade,
  name text not null,
  format text not null,
  synthetic boolean not null,
  latitude_deg double precision not null,
  longitude_deg double precision not null,
  altitude_m double precision not null,
  utc_offset_hours double precision not null,
  original_file_name text not null,
  original_bytes integer not null,
  original_sha256 text not null,
  warnings jsonb not null,
  summary jsonb not null,
  created_at timestamptz(3) not null,
  created_by_id uuid not null references users (id),
  unique (workspace_id, id)
);
create index weather_years_listed on weather_years (workspace_id, created_at desc, id);
create index weather_years_created_by on weather_years (created_by_id);

create table weather_originals (
  weather_year_id uuid primary key,
  workspace_id uuid not null,
  bytes bytea not null,
  foreign key (workspace_id, weather_year_id) references weather_years (workspace_id, id) on delete cascade
);
create table weather_columns (
  weather_year_id uuid primary key,
  workspace_id uuid not null,
  bytes bytea not null,
  foreign key (workspace_id, weather_year_id) references weather_years (workspace_id, id) on delete cascade
);

create table studies (
  id uuid primary key,
  workspace_id uuid not null references workspaces (id) on delete cascade,
  name text not null,
  question text not null,
  sandbox boolean not null,
  owner_id uuid not null references users (id),
  created_at timestamptz(3) not null,
  updated_at timestamptz(3) not null,
  unique (workspace_id, id)
);
create index studies_listed on studies (workspace_id, updated_at desc, id);
create index studies_owner on studies (owner_id);

create table scenarios (
  id uuid primary key,
  workspace_id uuid not null,
  study_id uuid not null,
  name text not null,
  position integer not null check (position >= 0),
  newest_version integer not null check (newest_version >= 1),
  created_at timestamptz(3) not null,
  updated_at timestamptz(3) not null,
  unique (workspace_id, id),
  unique (study_id, position),
  foreign key (workspace_id, study_id) references studies (workspace_id, id) on delete cascade
);

create table scenario_versions (
  id uuid primary key,
  workspace_id uuid not null,
  scenario_id uuid not null,
  version integer not null check (version >= 1),
  document jsonb not null,
  weather_year_id uuid,
  created_at timestamptz(3) not null,
  created_by_id uuid not null references users (id),
  unique (workspace_id, id),
  unique (scenario_id, version),
  foreign key (workspace_id, scenario_id) references scenarios (workspace_id, id) on delete cascade,
  foreign key (workspace_id, weather_year_id) references weather_years (workspace_id, id)
);
create index scenario_versions_weather_year on scenario_versions (weather_year_id);
create index scenario_versions_created_by on scenario_versions (created_by_id);

create table runs (
  id uuid primary key,
  workspace_id uuid not null,
  study_id uuid not null,
  scenario_id uuid not null,
  scenario_version_id uuid not null,
  weather_year_id uuid not null,
  model_version text not null,
  state text not null check (state in ('queued', 'running', 'done', 'failed', 'cancelled')),
  progress double precision not null default 0 check (progress between 0 and 1),
  attempt integer not null default 1 check (attempt >= 1),
  failure text,
  cancel_requested boolean not null default false,
  requested_by_id uuid not null references users (id),
  created_at timestamptz(3) not null,
  started_at timestamptz(3),
  finished_at timestamptz(3),
  engine_ms double precision,
  unique (workspace_id, id),
  foreign key (workspace_id, study_id) references studies (workspace_id, id) on delete cascade,
  foreign key (workspace_id, scenario_id) references scenarios (workspace_id, id) on delete cascade,
  foreign key (workspace_id, scenario_version_id) references scenario_versions (workspace_id, id) on delete cascade,
  foreign key (workspace_id, weather_year_id) references weather_years (workspace_id, id)
);
create unique index runs_one_answer on runs (scenario_version_id, weather_year_id, model_version)
  where state in ('queued', 'running', 'done');
create index runs_of_study on runs (study_id, created_at desc, id);
create index runs_of_scenario on runs (scenario_id);
create index runs_of_version on runs (scenario_version_id, created_at desc);
create index runs_on_weather_year on runs (weather_year_id);
create index runs_requested_by on runs (requested_by_id);
create index runs_active on runs (created_at) where state in ('queued', 'running');

create table run_results (
  run_id uuid primary key,
  workspace_id uuid not null,
  model_version text not null,
  summary text not null,
  columns bytea not null,
  created_at timestamptz(3) not null,
  foreign key (workspace_id, run_id) references runs (workspace_id, id) on delete cascade
);

create table outbox (
  id bigint generated by default as identity primary key,
  workspace_id uuid not null,
  run_id uuid not null,
  queue text not null,
  payload jsonb not null,
  created_at timestamptz(3) not null,
  foreign key (workspace_id, run_id) references runs (workspace_id, id) on delete cascade
);
create index outbox_run on outbox (run_id);
`;

const TENANT_TABLES = [
  'weather_years',
  'weather_originals',
  'weather_columns',
  'studies',
  'scenarios',
  'scenario_versions',
  'runs',
  'run_results',
  'outbox',
];
const IDENTITY_TABLES = ['workspaces', 'users', 'memberships', 'refresh_tokens'];

/** Policies of one table add up: a row is visible if any of them says so. */
const POLICIES = `
create policy own_workspace on workspaces using (id = ${WORKSPACE}) with check (id = ${WORKSPACE});
-- The sign-in page names the demo workspace before anybody is known.
create policy demo_is_public on workspaces for select using (is_demo);

-- The command that makes accounts looks a workspace up by its name.
create policy account_command on workspaces for select using (${setting('system_task')} = 'account-command');

create policy own_account on users using (id = ${USER}) with check (id = ${USER});
create policy account_signing_in on users for select using (email = ${setting('sign_in_email')});
create policy members_of_workspace on users for select
  using (exists (select 1 from memberships where memberships.user_id = users.id and memberships.workspace_id = ${WORKSPACE}));

create policy in_workspace on memberships using (workspace_id = ${WORKSPACE}) with check (workspace_id = ${WORKSPACE});
create policy own_memberships on memberships for select using (user_id = ${USER});

create policy own_sessions on refresh_tokens using (user_id = ${USER}) with check (user_id = ${USER});
create policy session_presented on refresh_tokens for select using (token_hash = ${setting('refresh_token_hash')});
-- Whoever manages members can end their sessions, nothing else.
create policy sessions_of_workspace on refresh_tokens for update
  using (workspace_id = ${WORKSPACE}) with check (workspace_id = ${WORKSPACE});

create policy relay on outbox using (${setting('system_task')} = 'outbox-relay');
create policy reconciler on runs for select using (${setting('system_task')} = 'reconciler');
`;

export class FirstPathS extends Migration {
  override up(): void {
    this.addSql(TABLES);
    for (const table of [...IDENTITY_TABLES, ...TENANT_TABLES]) {
      this.addSql(`alter table ${table} enable row level security, force row level security`);
    }
    for (const table of TENANT_TABLES) {
      this.addSql(
        `create policy in_workspace on ${table} using (workspace_id = ${WORKSPACE}) with check (workspace_id = ${WORKSPACE})`,
      );
    }
    this.addSql(POLICIES);
  }

  override down(): void {
    for (const table of [...IDENTITY_TABLES, ...TENANT_TABLES].reverse()) {
      this.addSql(`drop table ${table} cascade`);
    }
  }
}
