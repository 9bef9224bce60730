import type { RouteObject } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { addressOf, nameOf, patternsOf } from './screens.js';

const routes: RouteObject[] = [
  {
    children: [
      { index: true },
      { path: 'sign-in' },
      {
        children: [
          { path: 'studies' },
          { path: 'studies/:studyId' },
          { path: 'weather', children: [{ path: ':weatherYearId' }] },
        ],
      },
      { path: '*' },
    ],
  },
];

describe('the screens to photograph', () => {
  it('are every path of the router, nested ones joined', () => {
    expect(patternsOf(routes)).toEqual([
      '/sign-in',
      '/studies',
      '/studies/:studyId',
      '/weather',
      '/weather/:weatherYearId',
      '/*',
    ]);
  });

  it('get a real address from the links that were seen', () => {
    const links = ['/studies/7/side-by-side', '/studies/7', '/weather/3?month=2', '/weather/3'];
    expect(addressOf('/studies', links)).toBe('/studies');
    expect(addressOf('/studies/:studyId', links)).toBe('/studies/7');
    expect(addressOf('/weather/:weatherYearId', links)).toBe('/weather/3?month=2');
    expect(addressOf('/weather/:weatherYearId', [])).toBeUndefined();
    expect(addressOf('/*', links)).toBe('/no-such-page');
  });

  it('get file names without odd characters', () => {
    expect(['/sign-in', '/studies/:studyId', '/weather/:weatherYearId', '/*'].map(nameOf)).toEqual([
      'sign-in',
      'studies-study',
      'weather-weather-year',
      'not-found',
    ]);
  });
});
