import { matchPath, type RouteObject } from 'react-router-dom';

/** Every address pattern of the router, in its order, e.g. `/studies/:studyId`. */
export function patternsOf(routes: readonly RouteObject[], above = ''): string[] {
  return routes.flatMap(({ path, children }) => {
    const here = path === undefined ? above : `${above}/${path}`;
    return [...(path === undefined ? [] : [here]), ...patternsOf(children ?? [], here)];
  });
}

/**
 * A real address for a pattern: itself when nothing is open in it, else a link that was seen and fits it.
 *
 * @param links paths with their search
 */
export function addressOf(pattern: string, links: Iterable<string>): string | undefined {
  if (pattern.endsWith('*')) return '/no-such-page';
  if (!pattern.includes(':')) return pattern;
  // The one with the longest search shows the most: a link to a whole view rather than to its beginning.
  return [...links]
    .filter((link) => matchPath(pattern, new URL(link, 'http://app').pathname) !== null)
    .sort((a, b) => b.length - a.length)[0];
}

/** A file name for a pattern, e.g. `studies-study` for `/studies/:studyId`. */
export function nameOf(pattern: string): string {
  if (pattern.endsWith('*')) return 'not-found';
  return pattern
    .split('/')
    .filter((part) => part !== '')
    .map((part) =>
      part.replace(/^:(.*?)(Id)?$/, '$1').replaceAll(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`),
    )
    .join('-');
}
