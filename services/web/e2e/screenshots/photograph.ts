/**
 * Photographs every screen of a running app, on a desk and on a phone, light and dark. The screens are those of the
 * router, so a new one needs no line here. Argument: folder for the pictures; the app's address as in the browser tests.
 */
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import type { Browser, Page } from 'playwright-core';
import { DESK, PHONE, openBrowser, visit, type Look } from '../support/browser.js';
import { signInAs } from '../support/people.js';
import { routesOfTheApp } from './app-routes.js';
import { addressOf, nameOf, patternsOf } from './screens.js';

const LOOKS: readonly Look[] = [DESK, PHONE].flatMap((look) =>
  (['light', 'dark'] as const).map((colorScheme) => ({ ...look, colorScheme })),
);
const SIGN_IN = '/sign-in';
const SETTLED_WITHIN_MS = 30_000;

/** Waits until the page shows its content: a heading, no progress left, fonts there, two frames drawn. */
async function settle(page: Page): Promise<void> {
  await page.waitForSelector('h1', { timeout: SETTLED_WITHIN_MS });
  await page.waitForFunction(
    () => document.querySelector('[role=progressbar], [aria-busy=true]') === null,
    undefined,
    { timeout: SETTLED_WITHIN_MS },
  );
  await page.evaluate(async () => {
    await document.fonts.ready;
    await new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(resolve)));
  });
}

async function linksOn(page: Page): Promise<string[]> {
  return page.$$eval('a[href^="/"]', (anchors) => anchors.map((anchor) => anchor.getAttribute('href') ?? ''));
}

/** @returns what went wrong, each with its screen */
async function photographAll(
  browser: Browser,
  patterns: readonly string[],
  look: Look,
  folder: string,
): Promise<string[]> {
  const { context, page, faults } = await visit(browser, look);
  const shoot = async (pattern: string, path: string): Promise<void> => {
    await page.goto(path);
    await settle(page);
    const name = `${nameOf(pattern)}-${look.width}-${look.colorScheme}.png`;
    await page.screenshot({ path: join(folder, name), fullPage: true });
  };
  const links = new Set<string>();
  await shoot(SIGN_IN, SIGN_IN);
  await signInAs(page, 'engineer');
  await settle(page);

  let open = patterns.filter((pattern) => pattern !== SIGN_IN);
  // Twice, because the link to a screen may stand on another that comes later in the list.
  for (let round = 0; round < 2; round += 1) {
    const later: string[] = [];
    for (const pattern of open) {
      for (const link of await linksOn(page)) links.add(link);
      const path = addressOf(pattern, links);
      if (path === undefined) later.push(pattern);
      else await shoot(pattern, path);
    }
    open = later;
  }
  await context.close();
  const where = `${look.width} px ${look.colorScheme}`;
  return [...faults, ...open.map((pattern) => `no link leads to ${pattern}`)].map(
    (fault) => `${where}: ${fault}`,
  );
}

const folder = process.argv[2];
if (folder === undefined) throw new Error('Give the folder for the pictures.');
mkdirSync(folder, { recursive: true });
const patterns = patternsOf(await routesOfTheApp());
const browser = await openBrowser();
const faults: string[] = [];
try {
  for (const look of LOOKS) faults.push(...(await photographAll(browser, patterns, look, folder)));
} finally {
  await browser.close();
}
process.stdout.write(`${patterns.length} screens, ${LOOKS.length} pictures of each, in ${folder}\n`);
if (faults.length > 0) {
  process.stderr.write(`${faults.join('\n')}\n`);
  process.exitCode = 1;
}
