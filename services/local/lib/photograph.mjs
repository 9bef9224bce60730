/**
 * Photographs every screen of a running app: 1440 and 390 px wide, light and dark. Started by screenshots.mjs with the
 * TypeScript loader, because the list of screens is the web app's own router.
 * Arguments: address of the app, Chromium's path, folder for the pictures.
 */
/* global document, requestAnimationFrame -- functions given to the page run there */
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import process from 'node:process';
import { pathToFileURL } from 'node:url';
import { launchBrowser } from './browser.mjs';
import { root } from './paths.mjs';
import { addressOf, nameOf, patternsOf } from './screens.mjs';

const WIDTHS = [1440, 390];
const SCHEMES = /** @type {const} */ (['light', 'dark']);
const DEMO_ROLE = /engineer/i;
const SETTLED_WITHIN_MS = 30_000;

const [address = '', chromiumPath = '', folder = ''] = process.argv.slice(2);
/** @type {string[]} */
const faults = [];

/**
 * Waits until the page shows its content: no progress left, fonts there, two frames drawn.
 * @param {import('playwright-core').Page} page
 */
async function settled(page) {
  await page.waitForSelector('h1', { timeout: SETTLED_WITHIN_MS });
  await page.waitForFunction(
    () => document.querySelector('[role=progressbar], [aria-busy=true]') === null,
    undefined,
    {
      timeout: SETTLED_WITHIN_MS,
    },
  );
  await page.evaluate(async () => {
    await document.fonts.ready;
    await new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(resolve)));
  });
}

/**
 * @param {import('playwright-core').Page} page
 * @param {Set<string>} links
 */
async function collectLinks(page, links) {
  const found = await page.$$eval('a[href^="/"]', (anchors) =>
    anchors.map((anchor) => anchor.getAttribute('href') ?? ''),
  );
  for (const link of found) links.add(link);
}

/**
 * @param {import('playwright-core').Browser} browser
 * @param {string[]} patterns
 * @param {number} width
 * @param {'light' | 'dark'} colorScheme
 */
async function photographAll(browser, patterns, width, colorScheme) {
  const context = await browser.newContext({
    viewport: { width, height: 900 },
    colorScheme,
    baseURL: address,
    reducedMotion: 'reduce',
  });
  const page = await context.newPage();
  let screen = '';
  const fault = (/** @type {string} */ text) =>
    faults.push(`${screen} ${String(width)} px ${colorScheme}: ${text}`);
  page.on('console', (message) => message.type() === 'error' && fault(message.text()));
  page.on('pageerror', (error) => fault(error.message));

  const shoot = async (/** @type {string} */ pattern, /** @type {string} */ path) => {
    screen = nameOf(pattern);
    await page.goto(path);
    await settled(page);
    const overflow = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    );
    if (overflow > 0) fault(`${String(overflow)} px wider than the window`);
    await page.screenshot({
      path: join(folder, `${screen}-${String(width)}-${colorScheme}.png`),
      fullPage: true,
    });
  };

  const signIn = patterns.find((pattern) => pattern === '/sign-in') ?? '/';
  await shoot(signIn, signIn);
  await page.getByRole('button', { name: DEMO_ROLE }).click();
  await page.waitForURL((url) => url.pathname !== '/sign-in');
  await settled(page);

  /** @type {Set<string>} */
  const links = new Set();
  await collectLinks(page, links);
  // Twice, because a link to one screen may stand on another that comes later in the list.
  let open = patterns.filter((pattern) => pattern !== signIn);
  for (let round = 0; round < 2 && open.length > 0; round += 1) {
    /** @type {string[]} */
    const later = [];
    for (const pattern of open) {
      const path = addressOf(pattern, links);
      if (path === undefined) later.push(pattern);
      else {
        await shoot(pattern, path);
        await collectLinks(page, links);
      }
    }
    open = later;
  }
  for (const pattern of open) faults.push(`${pattern}: no link leads there`);
  await context.close();
}

/** @type {unknown} */
const module = await import(pathToFileURL(join(root, 'services/web/src/app/router.tsx')).href);
const { routes } = /** @type {{ routes: import('./screens.mjs').Route[] }} */ (module);
const patterns = patternsOf(routes);
mkdirSync(folder, { recursive: true });
const browser = await launchBrowser(chromiumPath);
try {
  for (const width of WIDTHS)
    for (const scheme of SCHEMES) await photographAll(browser, patterns, width, scheme);
} finally {
  await browser.close();
}
process.stdout.write(`${String(patterns.length)} screens in ${folder}\n`);
if (faults.length > 0) {
  process.stderr.write(`\n${faults.join('\n')}\n`);
  process.exitCode = 1;
}
