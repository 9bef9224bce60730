import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router-dom';
import { parseView, serialiseView, type ViewState } from './model/address.js';

/** The view that the address holds, and how to change it: each change is a link that can be sent. */
export function useView(): [ViewState, (change: Partial<ViewState>) => void] {
  const [parameters, setParameters] = useSearchParams();
  const view = useMemo(() => parseView(parameters), [parameters]);
  const change = useCallback(
    (changes: Partial<ViewState>) => {
      setParameters((before) => serialiseView({ ...parseView(before), ...changes }), {
        replace: true,
        preventScrollReset: true,
      });
    },
    [setParameters],
  );
  return [view, change];
}
