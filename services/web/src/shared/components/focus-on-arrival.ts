import { createContext, useContext } from 'react';

/**
 * Moves the focus to a page's heading, once for each change of page, so that a screen reader reads the new
 * page and the keyboard goes on from there. Does nothing on the first page, where the browser does it.
 */
export const FocusOnArrivalContext = createContext<(heading: HTMLElement | null) => void>(() => undefined);

export function useFocusOnArrival(): (heading: HTMLElement | null) => void {
  return useContext(FocusOnArrivalContext);
}
