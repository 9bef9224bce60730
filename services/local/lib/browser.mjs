import { chromium } from 'playwright-core';

/** Debian's Chromium without its habits of a daily browser: no sandbox below root, nothing fetched in the background. */
const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/**
 * @param {string} executablePath
 * @returns {Promise<import('playwright-core').Browser>}
 */
export function launchBrowser(executablePath) {
  return chromium.launch({ executablePath, args: FLAGS });
}
