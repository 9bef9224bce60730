import type { EntityManager } from '@mikro-orm/postgresql';
import type { Study } from '@noonwell/persistence';
import { ACTIVE_RUN_STATES, type StudySummary } from '@noonwell/schema';
import type { Principal } from '../access/principal';
import { mayWriteStudy } from './study-access';

interface Counts {
  id: string;
  scenario_count: number;
  weather_years: StudySummary['weatherYears'];
  active_runs: number;
  last_run_finished_at: Date | string | null;
}

const marks = (values: readonly unknown[]): string => values.map(() => '?').join(', ');

/** What the list says about each study, in one query. Needs `owner` populated. */
export async function studySummaries(
  em: EntityManager,
  principal: Principal,
  studies: readonly Study[],
): Promise<StudySummary[]> {
  if (studies.length === 0) return [];
  const ids = studies.map(({ id }) => id);
  const rows = await em.execute<Counts[]>(
    `select s.id,
       (select count(*)::int from scenarios c where c.study_id = s.id) as scenario_count,
       (select coalesce(jsonb_agg(jsonb_build_object('id', w.id, 'name', w.name, 'synthetic', w.synthetic)
           order by w.name, w.id), '[]')
         from weather_years w where w.id in (
           select v.weather_year_id from scenarios c
             join scenario_versions v on v.scenario_id = c.id and v.version = c.newest_version
             where c.study_id = s.id)) as weather_years,
       (select count(*)::int from runs r
         where r.study_id = s.id and r.state in (${marks(ACTIVE_RUN_STATES)})) as active_runs,
       (select max(r.finished_at) from runs r where r.study_id = s.id and r.state = 'done') as last_run_finished_at
     from studies s where s.id in (${marks(ids)})`,
    [...ACTIVE_RUN_STATES, ...ids],
  );
  const byId = new Map(rows.map((row) => [row.id, row]));
  return studies.map((study) => {
    const counts = byId.get(study.id);
    const last = counts?.last_run_finished_at ?? null;
    return {
      id: study.id,
      name: study.name,
      question: study.question,
      sandbox: study.sandbox,
      ownerName: study.owner.getEntity().name,
      scenarioCount: counts?.scenario_count ?? 0,
      weatherYears: counts?.weather_years ?? [],
      activeRuns: counts?.active_runs ?? 0,
      lastRunFinishedAt: last === null ? null : new Date(last).toISOString(),
      updatedAt: study.updatedAt.toISOString(),
      mayWrite: mayWriteStudy(principal, study),
    };
  });
}
