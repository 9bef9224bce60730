import { matchPath } from 'react-router-dom';

/** @typedef {{ path?: string, index?: boolean, children?: Route[] }} Route as the web app's router declares it */

/**
 * Every address pattern of the router, in its order.
 * @param {Route[]} routes
 * @param {string} [above]
 * @returns {string[]} e.g. `/studies/:studyId`
 */
export function patternsOf(routes, above = '') {
  return routes.flatMap(({ path, children }) => {
    const here = path === undefined ? above : `${above}/${path}`;
    const own = path === undefined ? [] : [here];
    return [...own, ...patternsOf(children ?? [], here)];
  });
}

/**
 * A real address for a pattern: itself when nothing is open in it, else the first link seen that fits it.
 * @param {string} pattern
 * @param {Iterable<string>} links path with search
 * @returns {string | undefined}
 */
export function addressOf(pattern, links) {
  if (pattern.endsWith('*')) return '/no-such-page';
  if (!pattern.includes(':')) return pattern;
  // The one with the longest search shows the most: a link to a whole view rather than to its beginning.
  return [...links]
    .filter((link) => matchPath(pattern, new URL(link, 'http://app').pathname) !== null)
    .sort((a, b) => b.length - a.length)[0];
}

/**
 * A file name for a pattern.
 * @param {string} pattern
 * @returns {string} e.g. `studies-study` for `/studies/:studyId`
 */
export function nameOf(pattern) {
  if (pattern.endsWith('*')) return 'not-found';
  return pattern
    .split('/')
    .filter((part) => part !== '')
    .map((part) =>
      part.replace(/^:(.*?)(Id)?$/, '$1').replaceAll(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`),
    )
    .join('-');
}
