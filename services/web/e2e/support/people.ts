import { ROLE_LABELS, type Role } from '@noonwell/schema';
import type { Page } from 'playwright-core';

/** Signs in by the button of a demo role, and waits for the studies. */
export async function signInAs(page: Page, role: Role): Promise<void> {
  await page.goto('/sign-in');
  await page.getByRole('button', { name: new RegExp(`^${ROLE_LABELS[role]}`) }).click();
  await page.getByRole('heading', { name: 'Studies', level: 1 }).waitFor();
}

export const STUDY = 'Brackenfold Creamery';
export const BASELINE = 'Present coil receiver';
export const UPGRADE = 'Dual cell receiver';

export async function openStudy(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'Studies', exact: true }).first().click();
  await page.getByRole('link', { name: STUDY }).first().click();
  await page.getByRole('heading', { name: STUDY, level: 1 }).waitFor();
}

export async function openSideBySide(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'Side by side' }).first().click();
  await page.getByRole('heading', { name: 'Side by side', level: 1 }).waitFor();
  await page.getByRole('heading', { name: 'Where lost?' }).waitFor();
}
