import { Button } from '@fluentui/react-components';
import type { ScenarioView } from '@noonwell/schema';
import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { scenarioQuery } from './api.js';

interface LoadNewestProps {
  scenarioId: string;
  onLoaded: (scenario: ScenarioView) => void;
}

/** Reads the newest version again and puts it into the form. */
export function LoadNewest({ scenarioId, onLoaded }: LoadNewestProps) {
  const client = useQueryClient();
  const [state, setState] = useState<'idle' | 'loading' | 'failed'>('idle');
  const load = async () => {
    setState('loading');
    try {
      onLoaded(await client.query({ ...scenarioQuery(scenarioId), staleTime: 0 }));
      setState('idle');
    } catch {
      setState('failed');
    }
  };
  return (
    <Button
      disabledFocusable={state === 'loading'}
      onClick={() => {
        void load();
      }}
    >
      {state === 'failed' ? 'Not loaded: try again' : 'Load the newest version'}
    </Button>
  );
}
