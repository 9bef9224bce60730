import { runEventSchema, type StudyView } from '@noonwell/schema';
import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { listen, type StreamState } from '../../shared/api/events.js';
import { STUDIES_KEY, studyQuery } from '../../shared/api/studies.js';
import { applyRunEvent, endsRun } from './model/apply-run-event.js';
import { observe, type Pace } from './model/time-left.js';

export interface StudyEvents {
  readonly line: StreamState;
  /** How fast each run has gone since this page first saw it, by run. */
  readonly paces: Readonly<Record<string, Pace>>;
}

/** Works the study's events into what is held of it, for as long as the page is open. */
export function useStudyEvents(studyId: string): StudyEvents {
  const client = useQueryClient();
  const [line, setLine] = useState<StreamState>('connecting');
  const [paces, setPaces] = useState<StudyEvents['paces']>({});
  useEffect(() => {
    const { queryKey } = studyQuery(studyId);
    // A run of an older version stays unknown after reading again: it is asked for once, not at each event.
    const askedFor = new Set<string>();
    return listen(
      'GET /api/studies/{id}/events',
      { params: { id: studyId } },
      {
        event: 'run',
        schema: runEventSchema,
        onState: setLine,
        onEvent: (event) => {
          const now = performance.now();
          if (event.state === 'running') {
            setPaces((before) => ({
              ...before,
              [event.runId]: observe(before[event.runId], event.progress, now),
            }));
          }
          const study = client.getQueryData<StudyView>(queryKey);
          if (!study) return;
          const next = applyRunEvent(study, event);
          if (next) client.setQueryData(queryKey, next);
          const unknown = next === null && !askedFor.has(event.runId);
          askedFor.add(event.runId);
          // The result itself does not travel with the event.
          if (unknown || (next !== null && next !== study && endsRun(event))) {
            void client.invalidateQueries({ queryKey: STUDIES_KEY });
          }
        },
      },
    );
  }, [client, studyId]);
  return { line, paces };
}
