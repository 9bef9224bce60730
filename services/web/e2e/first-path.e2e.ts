import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible } from './support/accessibility.js';
import { DESK, openBrowser, plain, visit, type Visit } from './support/browser.js';
import { BASELINE, openSideBySide, openStudy, signInAs, UPGRADE } from './support/people.js';
import { desertFile, dropFile, syntheticFile, type UploadFile } from './support/weather.js';

const desert = desertFile();
if (!desert) console.log('skipped: the path with a measured desert file (NOONWELL_WEATHER_DIR is not set)');

const files: [string, UploadFile][] = [
  ['a synthetic file', syntheticFile('made-for-the-test.epw')],
  ...(desert ? [['the measured desert file', desert] satisfies [string, UploadFile]] : []),
];

let browser: Browser;
beforeAll(async () => {
  browser = await openBrowser();
});
afterAll(() => browser.close());

describe.each(files)('the first path with %s', (_, file) => {
  let here: Visit;
  // The same database may have seen this test before.
  const yearName = `${file.name.slice(0, 24)} ${Date.now().toString(36)}`;

  beforeAll(async () => {
    here = await visit(browser, DESK);
  });
  afterAll(() => here.context.close());

  it('begins with one button for a demo role', async () => {
    const { page } = here;
    await page.goto('/sign-in');
    await page.getByRole('button', { name: /^Engineer/ }).waitFor();
    await expectAccessible(page, 'the sign-in page');
    await signInAs(page, 'engineer');
    await expectAccessible(page, 'the studies');
  });

  it('takes a weather file dropped on the weather page', async () => {
    const { page } = here;
    await page.getByRole('link', { name: 'Weather', exact: true }).click();
    await page.getByRole('heading', { name: 'Weather', level: 1 }).waitFor();
    await dropFile(page, file);
    const name = page.getByLabel('Name in the list');
    await name.fill(yearName);
    await expectAccessible(page, 'the preview of a weather file');
    await page.getByRole('button', { name: 'Accept as a weather year' }).click();
    await page.getByText(`"${yearName}" is a weather year of this workspace now.`).waitFor();
    await expectAccessible(page, 'the accepted weather year');
  });

  it('points both scenarios of the study at that year', async () => {
    const { page } = here;
    await openStudy(page);
    await page.getByRole('combobox', { name: 'Weather year of all scenarios' }).click();
    await page.getByRole('option', { name: yearName }).click();
    await page.getByRole('button', { name: 'Point the study at it' }).click();
    await page.getByText('All scenarios point at it now').waitFor();
    await expectAccessible(page, 'the study');
  });

  it('runs both and shows their progress until they are done', async () => {
    const { page } = here;
    await page.getByRole('button', { name: 'Run all scenarios' }).click();
    await page.getByRole('progressbar', { name: `Run of ${BASELINE}` }).waitFor();
    for (const name of [BASELINE, UPGRADE]) {
      await page
        .getByRole('listitem', { name })
        .getByText('Done', { exact: true })
        .waitFor({ timeout: 120_000 });
    }
    await expectAccessible(page, 'the study with its results');
  });

  it('says first what is gained and what is given up, and the table says the same', async () => {
    const { page } = here;
    await openSideBySide(page);
    const sentence = plain(await page.getByText(`Against “${BASELINE}”`).first().textContent());
    expect(sentence).toMatch(
      new RegExp(
        `^Against “${BASELINE}”, “${UPGRADE}” (gives up|gains) [\\d,.]+ kWh of (solar heat|electricity)`,
      ),
    );
    const marked = file.synthetic ? `${yearName} (synthetic)` : yearName;
    expect(sentence).toContain(`on the weather year “${marked}” and with the same loads`);

    const heat = /(gives up|gains) ([\d,.]+) kWh of solar heat/.exec(sentence);
    const power = /gains ([\d,.]+) kWh of electricity/.exec(sentence);
    const row = (label: string) => page.getByRole('row', { name: new RegExp(label) }).first();
    const heatRow = plain(await row('Solar heat delivered to the load').textContent());
    const powerRow = plain(await row('Electricity behind the inverter, kWh').textContent());
    expect(heatRow).toContain(
      `${heat?.[1] === 'gives up' ? '−' : '+'}${heat?.[2] ?? 'no heat in the sentence'}`,
    );
    expect(powerRow).toContain(`+${power?.[1] ?? 'no electricity in the sentence'}`);
    expect(powerRow).toContain('better');
  });

  it('draws the months and the hours, with their figures behind them', async () => {
    const { page } = here;
    for (const title of ['Heat month by month', 'Electricity month by month', 'Hours of the week']) {
      await page.getByRole('img', { name: title }).locator('svg').first().waitFor();
    }
    await page.getByRole('button', { name: 'Show the figures' }).last().click();
    const hours = page.getByRole('region', { name: 'Hours of the week' }).getByRole('row');
    // A week of hours and the headings.
    expect(await hours.count()).toBe(7 * 24 + 1);
  });

  it('shows a ledger that adds up, with its residual as a number', async () => {
    const { page } = here;
    const cells = await page
      .getByRole('region', { name: 'Residuals of all parts by size' })
      .locator('tbody tr td:last-child')
      .allTextContents();
    // One a scenario; a cell without a number is NaN and fails.
    expect(cells).toHaveLength(2);
    for (const cell of cells) expect(Number(plain(cell).replaceAll('−', '-'))).toBeLessThanOrEqual(1e-9);

    const dish = page.getByRole('region', { name: 'Ledger of the dish over the year' });
    const values = await dish.locator('tbody tr:not(:last-child) td:nth-child(3)').allTextContents();
    const numbers = values.map((value) => Number(plain(value).replaceAll(',', '').replaceAll('−', '-')));
    const sum = numbers.reduce((total, value) => total + value, 0);
    // Each line is shown to a tenth of a kWh.
    expect(numbers.length).toBeGreaterThan(5);
    expect(Math.abs(sum)).toBeLessThanOrEqual(0.05 * numbers.length);
    expect(numbers[0]).toBeGreaterThan(0);
  });

  it('keeps the view in the address: a reload shows the same', async () => {
    const { page } = here;
    await page.getByLabel('Look at').selectOption({ label: 'Receiver' });
    await page.getByLabel('Week from').selectOption({ label: 'March' });
    await page.getByRole('button', { name: 'A week later' }).click();
    await page.getByRole('radio', { name: UPGRADE }).click();
    await page.getByText(`Against “${UPGRADE}”`).first().waitFor();
    await page.waitForURL(/week=03-08/);
    const sentence = plain(await page.getByText(`Against “${UPGRADE}”`).first().textContent());
    expect(sentence).toContain('of electricity');
    await page.reload();
    await page.getByRole('heading', { name: 'Where lost?' }).waitFor();
    expect(plain(await page.getByText(`Against “${UPGRADE}”`).first().textContent())).toBe(sentence);
    expect(await page.getByLabel('Look at').inputValue()).toBe('receiver');
    await page.getByLabel('Week from').waitFor();
    expect(await page.getByLabel('Week from').inputValue()).toBe('03');
    expect(await page.getByLabel('Day').inputValue()).toBe('03-08');
    await page.getByRole('img', { name: 'Hours of the week' }).locator('svg').first().waitFor();
    await expectAccessible(page, 'side by side');
  });

  it('went without any complaint of the browser', () => {
    expect(here.faults).toEqual([]);
  });
});
