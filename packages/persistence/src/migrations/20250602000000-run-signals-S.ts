import { Migration } from '@mikro-orm/migrations';
import { OUTBOX_CHANNEL, RUNS_CHANNEL } from '../queue/channels.js';

/**
 * The worker's claim of a run, and a signal for whoever waits: sent by the row itself, so that no writer can
 * forget it, and delivered when its transaction commits. Signals carry ids only, because they reach every
 * session that listens; what changed is read from the row, under row-level security.
 */
export class RunSignalsS extends Migration {
  override up(): void {
    this.addSql('alter table runs add column claim_token text');
    this.addSql(`
      create function tell_run_changed() returns trigger language plpgsql as $$
      begin
        -- A sign of life without news is no news.
        if tg_op = 'UPDATE' and (new.state, new.progress, new.failure, new.cancel_requested)
          is not distinct from (old.state, old.progress, old.failure, old.cancel_requested) then
          return null;
        end if;
        perform pg_notify('${RUNS_CHANNEL}', json_build_object(
          'workspaceId', new.workspace_id, 'studyId', new.study_id, 'runId', new.id)::text);
        return null;
      end $$`);
    this.addSql(`
      create trigger run_changed
      after insert or update of state, progress, failure, cancel_requested on runs
      for each row execute function tell_run_changed()`);
    this.addSql(`
      create function tell_outbox_filled() returns trigger language plpgsql as $$
      begin
        perform pg_notify('${OUTBOX_CHANNEL}', '');
        return null;
      end $$`);
    this.addSql(`
      create trigger outbox_filled after insert on outbox
      for each statement execute function tell_outbox_filled()`);
  }

  override down(): void {
    this.addSql('drop trigger outbox_filled on outbox');
    this.addSql('drop function tell_outbox_filled');
    this.addSql('drop trigger run_changed on runs');
    this.addSql('drop function tell_run_changed');
    this.addSql('alter table runs drop column claim_token');
  }
}
