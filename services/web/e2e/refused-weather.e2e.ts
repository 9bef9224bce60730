import { lineOfRow, pdfFile } from '@noonwell/testkit';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible } from './support/accessibility.js';
import { openBrowser, plain, visit, type Visit } from './support/browser.js';
import { signInAs } from './support/people.js';
import { dropFile, syntheticFile } from './support/weather.js';

let browser: Browser;
let here: Visit;
beforeAll(async () => {
  browser = await openBrowser();
  here = await visit(browser);
  await signInAs(here.page, 'analyst');
  await here.page.getByRole('link', { name: 'Weather', exact: true }).click();
  await here.page.getByRole('heading', { name: 'Weather', level: 1 }).waitFor();
});
afterAll(() => browser.close());

const BAD_ROW = 4321;
/** Direct normal radiation in the data dictionary of the format. */
const DNI_CELL = 15;

describe('a weather file that cannot be taken', () => {
  it('is refused with the line, the column and the reason', async () => {
    const { page } = here;
    const file = syntheticFile('a-word-inside.epw', {
      defects: [{ kind: 'cell', row: BAD_ROW, cell: DNI_CELL, text: 'sunny' }],
    });
    await dropFile(page, file);
    const row = page.getByRole('row').filter({ hasText: 'sunny' });
    await row.waitFor();
    const text = plain(await row.textContent());
    expect(text).toContain(lineOfRow(BAD_ROW).toLocaleString('en-GB'));
    expect(text).toContain(String(DNI_CELL));
    expect(await page.getByRole('button', { name: 'Accept as a weather year' }).count()).toBe(0);
    await expectAccessible(page, 'the refusal of a weather file');
  });

  it('is refused when it is another kind of file under the name', async () => {
    const { page } = here;
    await dropFile(page, { name: 'brochure.epw', synthetic: false, buffer: Buffer.from(pdfFile()) });
    await page.getByText('brochure.epw').first().waitFor();
    await expect
      .poll(async () => plain(await page.getByRole('main').textContent()))
      .toMatch(/PDF|not an EPW|LOCATION/i);
    expect(await page.getByRole('button', { name: 'Accept as a weather year' }).count()).toBe(0);
  });

  it('leaves nothing in the list', async () => {
    const { page } = here;
    await page.reload();
    await page.getByRole('heading', { name: 'Weather', level: 1 }).waitFor();
    expect(plain(await page.getByRole('main').textContent())).not.toMatch(/a-word-inside|brochure/);
  });

  it('went without any complaint of the browser', () => {
    expect(here.faults).toEqual([]);
  });
});
