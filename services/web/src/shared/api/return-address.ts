const HOME = '/studies';

/** The sign-in page with the way back to where somebody wanted to go. */
export function signInAddress({ pathname, search }: { pathname: string; search: string }): string {
  const wanted = `${pathname}${search}`;
  return wanted === '/' || wanted === HOME ? '/sign-in' : `/sign-in?to=${encodeURIComponent(wanted)}`;
}

/** Where to go after signing in: only ever a page of this app, whatever a link says. */
export function returnAddress(search: URLSearchParams): string {
  const wanted = search.get('to');
  if (wanted === null || !wanted.startsWith('/')) return HOME;
  const url = new URL(wanted, window.location.origin);
  // "//elsewhere" and "/\elsewhere" are addresses of other hosts.
  return url.origin === window.location.origin ? `${url.pathname}${url.search}` : HOME;
}
