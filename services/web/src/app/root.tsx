import { useCallback, useEffect, useRef } from 'react';
import { Outlet, useLocation } from 'react-router-dom';
import { FocusOnArrivalContext } from '../shared/components/focus-on-arrival.js';
import { LoadingState } from '../shared/components/loading-state.js';

/** Around every page: moves the focus when the page changes. */
export function Root() {
  const { pathname } = useLocation();
  const arrivedAt = useRef(pathname);
  // A new function for each page: headings that stay mounted from one page to the next notice it too.
  const focus = useCallback(
    (heading: HTMLElement | null) => {
      if (heading === null || arrivedAt.current === pathname) return;
      arrivedAt.current = pathname;
      heading.focus({ preventScroll: true });
      window.scrollTo(0, 0);
    },
    [pathname],
  );
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
