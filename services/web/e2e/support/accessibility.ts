import axe, { type AxeResults } from 'axe-core';
import type { Page } from 'playwright-core';
import { expect } from 'vitest';

/** Fluent's markers at the ends of a focus group: hidden elements that pass the focus on as soon as they get it. */
const FOCUS_PASSERS = '[data-tabster-dummy]';

/** Fails with the rule, the element and the advice when axe finds something serious or critical on the page. */
export async function expectAccessible(page: Page, where: string): Promise<void> {
  // Evaluated by the browser itself, so the page's own policy need not allow it.
  await page.evaluate(axe.source);
  const results = await page.evaluate<AxeResults>(
    `axe.run({ exclude: ['${FOCUS_PASSERS}'] }, { runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] })`,
  );
  const serious = results.violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .flatMap(({ id, nodes }) =>
      nodes.map(({ target, failureSummary }) => `${id} at ${target.join(' ')}: ${failureSummary ?? ''}`),
    );
  expect(serious, `accessibility of ${where}`).toEqual([]);
}

/** Nothing but tables may be wider than the screen. */
export async function expectNoSidewaysScrolling(page: Page, where: string): Promise<void> {
  const over = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  );
  expect(over, `pixels that ${where} is wider than the screen`).toBeLessThanOrEqual(0);
}
