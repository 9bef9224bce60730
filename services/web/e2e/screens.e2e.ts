import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible, expectNoSidewaysScrolling } from './support/accessibility.js';
import { DESK, openBrowser, PHONE, visit, type Look, type Visit } from './support/browser.js';
import { openSideBySide, openStudy, signInAs, STUDY, UPGRADE } from './support/people.js';

const looks: [string, Look][] = [
  ['on a desk, light', DESK],
  ['on a desk, dark', { ...DESK, colorScheme: 'dark' }],
  ['on a phone, light', PHONE],
  ['on a phone, dark', { ...PHONE, colorScheme: 'dark' }],
];

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

/** The demo comes with both scenarios already run, so every screen has something to show. */
describe.each(looks)('every screen %s', (_, look) => {
  let here: Visit;
  const check = async (where: string) => {
    await expectNoSidewaysScrolling(here.page, where);
    await expectAccessible(here.page, where);
  };

  beforeAll(async () => {
    here = await visit(browser, look);
  });
  afterAll(() => here.context.close());

  it('sign-in and studies', async () => {
    await here.page.goto('/sign-in');
    await here.page.getByRole('button', { name: /^Student/ }).waitFor();
    await check('the sign-in page');
    await signInAs(here.page, 'engineer');
    await here.page.getByRole('link', { name: STUDY }).first().waitFor();
    await check('the studies');
  });

  it('weather', async () => {
    await here.page.getByRole('link', { name: 'Weather', exact: true }).click();
    await here.page.getByRole('heading', { name: 'Weather', level: 1 }).waitFor();
    const first = here.page.getByRole('main').getByRole('table').getByRole('link').first();
    await first.waitFor();
    await check('the weather years');
    await first.click();
    await here.page.getByRole('img').locator('svg').first().waitFor();
    await check('a weather year');
  });

  it('study', async () => {
    await openStudy(here.page);
    await here.page.getByRole('heading', { name: 'Runs' }).waitFor();
    await check('the study');
  });

  it('side by side', async () => {
    await openSideBySide(here.page);
    await here.page.getByRole('img', { name: 'Hours of the week' }).locator('svg').first().waitFor();
    await check('side by side');
    await here.page.getByRole('link', { name: STUDY }).click();
    await here.page.getByRole('heading', { name: STUDY, level: 1 }).waitFor();
  });

  it('scenario', async () => {
    await here.page.getByRole('link', { name: UPGRADE }).first().click();
    await here.page.getByRole('heading', { name: 'Carry and keep' }).waitFor();
    await here.page.getByRole('heading', { name: 'Versions' }).waitFor();
    await check('the scenario');
  });

  it('went without any complaint of the browser', () => {
    expect(here.faults).toEqual([]);
  });
});
