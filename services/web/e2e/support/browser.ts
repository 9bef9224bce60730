import { existsSync } from 'node:fs';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';

const CANDIDATES = [process.env['NOONWELL_CHROMIUM'], '/usr/bin/chromium', '/usr/bin/chromium-browser'];

/** Debian's Chromium without its habits of a daily browser: nothing is fetched in the background. */
const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

export function appAddress(): string {
  const address = process.env['NOONWELL_E2E_URL'];
  if (address === undefined || address === '') {
    throw new Error('NOONWELL_E2E_URL is not set: start the app (npm start) and give its address.');
  }
  return address.replace(/\/$/, '');
}

export function openBrowser(): Promise<Browser> {
  const executablePath = CANDIDATES.find((path) => path !== undefined && existsSync(path));
  if (executablePath === undefined) {
    throw new Error('No Chromium: install the package chromium or set NOONWELL_CHROMIUM.');
  }
  return chromium.launch({ executablePath, args: FLAGS });
}

export interface Look {
  readonly width: number;
  readonly height: number;
  readonly colorScheme: 'light' | 'dark';
}

export const DESK: Look = { width: 1440, height: 900, colorScheme: 'light' };
export const PHONE: Look = { width: 390, height: 844, colorScheme: 'light' };

export interface Visit {
  readonly context: BrowserContext;
  readonly page: Page;
  /** Everything that a console, a policy or a script complained about so far. */
  readonly faults: string[];
}

/** A fresh visitor of the app who writes down every complaint of the browser. */
export async function visit(browser: Browser, look: Look = DESK): Promise<Visit> {
  const context = await browser.newContext({
    baseURL: appAddress(),
    viewport: { width: look.width, height: look.height },
    colorScheme: look.colorScheme,
    reducedMotion: 'reduce',
  });
  const faults: string[] = [];
  // A violation is told to the page only; from there it comes here.
  await context.exposeFunction('noonwellViolation', (text: string) => {
    faults.push(`content-security policy: ${text}`);
  });
  await context.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', (event) => {
      const tell = (window as Window & { noonwellViolation?: (text: string) => void }).noonwellViolation;
      tell?.(
        `${event.effectiveDirective} blocked ${event.blockedURI} at ${event.sourceFile}:${event.lineNumber}`,
      );
    });
  });
  const page = await context.newPage();
  page.on('pageerror', (error) => {
    faults.push(`uncaught: ${error.stack ?? error.message}`);
  });
  page.on('console', (message) => {
    if (message.type() !== 'error' || isFirstLook(message.text(), message.location().url)) return;
    faults.push(`console: ${message.text()} (${message.location().url})`);
  });
  return { context, page, faults };
}

/** A visitor without a session asks once whether the cookie is good; the browser notes the refusal as an error. */
function isFirstLook(text: string, url: string): boolean {
  return url.endsWith('/api/auth/refresh') && text.includes('401');
}

/** Text as it is read: spaces that do not break are spaces. */
export function plain(text: string | null): string {
  return (text ?? '').replaceAll(/[\u00a0\u202f\s]+/g, ' ').trim();
}
