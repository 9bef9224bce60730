import { useCallback, useEffect, useRef } from 'react';
import { Outlet, useLocation } from 'react-router-dom';
import { FocusOnArrivalContext } from '../shared/components/focus-on-arrival.js';
import { LoadingState } from '../shared/components/loading-state.js';

/** Around every page: moves the focus when the page changes. */
export function Root() {
  const { pathname } = useLocation();
  const arrivedAt = useRef(pathname);
  const focus = useCallback((heading: HTMLElement | null) => {
    // Read from the window: the page's effects run before this component's.
    const now = window.location.pathname;
    if (heading === null || arrivedAt.current === now) return;
    arrivedAt.current = now;
    heading.focus({ preventScroll: true });
    window.scrollTo(0, 0);
  }, []);
  useEffect(() => {
    if (document.title === '') document.title = 'Noonwell';
  }, []);
  return (
    <FocusOnArrivalContext value={focus}>
      <Outlet />
    </FocusOnArrivalContext>
  );
}

export function HydrateFallback() {
  return <LoadingState label="Opening Noonwell" height={400} />;
}
