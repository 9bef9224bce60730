import { parseScenarioText } from '@noonwell/schema';
import { readFile } from 'node:fs/promises';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { expectAccessible, expectNoSidewaysScrolling } from './support/accessibility.js';
import { openBrowser, plain, visit, type Visit } from './support/browser.js';
import { BASELINE, openStudy, signInAs } from './support/people.js';

let browser: Browser;
let here: Visit;
beforeAll(async () => {
  browser = await openBrowser();
  here = await visit(browser);
  await signInAs(here.page, 'engineer');
});
afterAll(() => browser.close());

/** A study of its own, so that the demo's stays as it is. */
async function openOwnScenario(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'New study' }).first().click();
  const dialog = page.getByRole('dialog');
  await dialog.getByLabel('Name').fill(`Form ${Date.now().toString(36)}`);
  await dialog.getByRole('button', { name: 'Create study' }).click();
  await page.getByRole('button', { name: 'Add a scenario' }).first().click();
  await dialog.getByLabel('Name').fill('Mine');
  await dialog.getByRole('button', { name: 'Add and open' }).click();
  await page.getByRole('heading', { name: 'Mine', level: 1 }).waitFor();
}

describe('the scenario form', () => {
  it('refuses a receiver larger than the dish at its field, and saves nothing', async () => {
    const { page } = here;
    await openOwnScenario(page);
    await page.getByRole('textbox', { name: 'Side of the square face', exact: true }).fill('4.9');
    await page.getByRole('button', { name: 'Save as version 2' }).click();
    const summary = page.getByRole('alert').filter({ hasText: 'Not saved' });
    await summary.waitFor();
    expect(plain(await summary.textContent())).toContain('The receiver is larger than the dish');
    await expectAccessible(page, 'the form with an error');
    await summary.getByRole('button', { name: 'Side of the square face' }).click();
    const side = page.getByRole('textbox', { name: 'Side of the square face', exact: true });
    await expect.poll(() => side.evaluate((field) => field === document.activeElement)).toBe(true);
  });

  it('names a value that is no number, with its unit', async () => {
    const { page } = here;
    await page.getByRole('textbox', { name: 'Side of the square face', exact: true }).fill('NaN');
    await page.getByText('Side of the square face must be a number in m').first().waitFor();
    await page.getByRole('textbox', { name: 'Side of the square face', exact: true }).fill('0.3');
  });

  it('takes a horizon out of a file and an outage by keyboard, on a narrow screen too', async () => {
    const { page } = here;
    await page.setInputFiles('input[type="file"][aria-label="Read a CSV file"]', {
      name: 'hill.csv',
      mimeType: 'text/csv',
      buffer: Buffer.from('azimuth;elevation\n60;3,5\n90;12\n120;2\n'),
    });
    await page.getByText('3 pairs read from hill.csv').waitFor();
    expect(await page.getByRole('textbox', { name: 'Elevation, row 1' }).inputValue()).toBe('3.5');
    await page
      .getByRole('group', { name: 'Scheduled outages' })
      .getByRole('button', { name: 'Add a row' })
      .focus();
    await page.keyboard.press('Enter');
    // The new row has the focus.
    await page.keyboard.type('03-01');
    await page.keyboard.press('Tab');
    await page.keyboard.type('03-14');
    expect(await page.getByRole('textbox', { name: 'First day, row 1' }).inputValue()).toBe('03-01');
    expect(await page.getByRole('textbox', { name: 'Last day, row 1' }).inputValue()).toBe('03-14');
    await page.getByRole('combobox', { name: 'How the pipe is laid' }).selectOption({ label: 'Buried' });
    await page.getByRole('textbox', { name: 'Depth of the axis', exact: true }).waitFor();
    const wide = page.viewportSize();
    await page.setViewportSize({ width: 390, height: 844 });
    await expectNoSidewaysScrolling(page, 'the form with a horizon');
    await expectAccessible(page, 'the form with a horizon');
    if (wide) await page.setViewportSize(wide);
  });

  it('switches the receiver with all of its fields, and saves a new version', async () => {
    const { page } = here;
    await page
      .getByRole('combobox', { name: 'Receiver', exact: true })
      .selectOption({ label: 'Cell receiver: heat and power' });
    await page.getByRole('textbox', { name: 'Packing', exact: true }).waitFor();
    await page.getByRole('button', { name: 'Take these' }).click();
    await page
      .getByRole('combobox', { name: 'In front of the cells' })
      .selectOption({ label: 'Nothing: bare array in the focal plane' });
    await page.getByText('A bare array in the focal plane of a good mirror').first().waitFor();
    await page.getByRole('button', { name: 'Save as version 2' }).click();
    await page.getByText('Version 2 is saved').waitFor();
    expect(here.faults).toEqual([]);
  });

  it('exports the version as a file that the command line reads', async () => {
    const { page } = here;
    const [download] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('button', { name: 'Export version 2' }).first().click(),
    ]);
    const parsed = parseScenarioText(await readFile(await download.path(), 'utf8'));
    expect(parsed.ok && parsed.scenario.catch.receiver.kind).toBe('cell');
    expect(parsed.ok && parsed.scenario.place.horizon).toHaveLength(3);
    expect(parsed.ok && parsed.scenario.catch.outages).toEqual([{ from: '03-01', to: '03-14' }]);
    expect(parsed.ok && parsed.scenario.carryAndKeep.pipe.kind).toBe('buried');
  });

  it('asks before unsaved changes are lost', async () => {
    const { page } = here;
    await page.getByRole('textbox', { name: 'Aperture diameter', exact: true }).fill('6');
    await page.getByRole('link', { name: 'Weather', exact: true }).click();
    await page.getByRole('alertdialog', { name: 'Leave without saving?' }).waitFor();
    await page.getByRole('button', { name: 'Keep it' }).click();
    expect(await page.getByRole('textbox', { name: 'Aperture diameter', exact: true }).inputValue()).toBe(
      '6',
    );
    await page.getByRole('button', { name: 'Discard changes' }).click();
    await page.getByText('Version 2 is saved').waitFor();
  });

  it('is read-only, with the reason, for a student in a shared study', async () => {
    const student = await visit(browser);
    await signInAs(student.page, 'student');
    await openStudy(student.page);
    await student.page.getByRole('link', { name: BASELINE }).first().click();
    await student.page.getByText('You can read this scenario, not change it').waitFor();
    expect(
      await student.page.getByRole('textbox', { name: 'Aperture diameter', exact: true }).isEditable(),
    ).toBe(false);
    expect(await student.page.getByRole('button', { name: /^Save as/ }).count()).toBe(0);
    await expectAccessible(student.page, 'the scenario of a shared study, for a student');
    expect(student.faults).toEqual([]);
    await student.context.close();
  });

  it('went without any complaint of the browser', () => {
    expect(here.faults).toEqual([]);
  });
});
