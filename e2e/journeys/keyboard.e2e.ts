import type { Locator, Page } from 'playwright-core';
import { describe, expect } from 'vitest';
import { demoPassword, accounts, showcasePatient } from '../fixtures/accounts';
import { dialog } from '../fixtures/record-steps';
import { test } from '../fixtures/test';

/** Tab forward until an element of this role and name has the focus. */
async function tabTo(page: Page, role: 'button' | 'link' | 'textbox' | 'application', name?: string): Promise<void> {
  const wanted = name === undefined ? page.getByRole(role) : page.getByRole(role, { name });
  await wanted.first().waitFor();
  for (let presses = 0; presses < 40; presses++) {
    if (await wanted.first().evaluate((element) => element === document.activeElement)) return;
    await page.keyboard.press('Tab');
  }
  throw new Error(`Tab does not reach ${role} ${name ?? ''}`);
}

/** The button that opened the drawer has the focus again. */
const focusIsBackOn = (page: Page, name: string): Promise<void> =>
  page.locator('button:focus').filter({ hasText: name }).waitFor();

/** Record, then the menu's second line. */
async function openResultDrawer(page: Page): Promise<Locator> {
  await tabTo(page, 'button', 'Record');
  await page.keyboard.press('Enter');
  await page.locator('[role="menuitem"]:focus').waitFor();
  await page.keyboard.press('ArrowDown');
  await page.locator('[role="menuitem"]:focus').filter({ hasText: 'Result' }).waitFor();
  await page.keyboard.press('Enter');
  return dialog(page, 'Record a result');
}

describe('by keyboard alone', () => {
  test('signs in, finds a patient, reads the chart, opens a test, records a result', async ({ visit }) => {
    const { page, planFailure } = await visit();
    planFailure('/api/auth/me');
    await page.goto('/sign-in');
    await tabTo(page, 'textbox', 'E-mail');
    await page.keyboard.type(accounts.coordinator);
    await page.keyboard.press('Tab');
    await page.keyboard.type(demoPassword);
    await page.keyboard.press('Enter');

    await page.getByRole('table').waitFor();
    await page.keyboard.press('/');
    await page.keyboard.type(showcasePatient.familyName);
    await page.getByRole('status').getByText('1 patient', { exact: true }).waitFor();
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
    await page.getByRole('heading', { level: 1, name: showcasePatient.name }).waitFor();

    await tabTo(page, 'application');
    await page.getByText(/^\d+ points\./).waitFor();
    const marks = await page.getByRole('application').locator('[data-mark]').count();
    await page.keyboard.press('End');
    await page.getByText(`Point ${marks} of ${marks}.`).waitFor();
    await page.keyboard.press('ArrowLeft');
    await page.getByText(`Point ${marks - 1} of ${marks}.`).waitFor();
    await page.keyboard.press('Escape');
    await page.getByText(`${marks} points.`).waitFor();
    await page.keyboard.press('End');
    await page.keyboard.press('Enter');
    await page
      .getByRole('heading', { level: 1, name: '6-minute walk distance' })
      .or(page.getByRole('heading', { name: '6-minute walk distance', exact: true }))
      .waitFor();
    await page.goBack();
    await page.getByRole('application').waitFor();

    const drawer = await openResultDrawer(page);
    await drawer.getByRole('combobox', { name: 'Result', exact: true }).waitFor();
    await page.keyboard.press('Escape');
    await drawer.waitFor({ state: 'detached' });
    await focusIsBackOn(page, 'Record');
  });

  test('records a result from the search of its name to the save', async ({ visit }) => {
    const { page } = await visit({ as: 'therapist' });
    await page.keyboard.press('/');
    await page.keyboard.type(showcasePatient.familyName);
    await page.getByRole('status').getByText('1 patient', { exact: true }).waitFor();
    await page.keyboard.press('ArrowDown');
    await page.keyboard.press('Enter');
    const drawer = await openResultDrawer(page);
    const picker = drawer.getByRole('combobox', { name: 'Result', exact: true });
    await picker.waitFor();
    for (let presses = 0; presses < 6 && !(await picker.evaluate((e) => e === document.activeElement)); presses++)
      await page.keyboard.press('Tab');
    await page.keyboard.type('CAT');
    await drawer.getByRole('option', { name: /COPD Assessment Test/ }).waitFor();
    await page.keyboard.press('Enter');
    // The chosen result's own field has the focus at once.
    await drawer.getByLabel('COPD Assessment Test').waitFor();
    await page.keyboard.type('17');
    await page.keyboard.press('Enter');
    await page
      .getByRole('status')
      .getByText(/CAT 17\b.* is in Tests/)
      .waitFor();
    expect(await drawer.count()).toBe(0);
    await focusIsBackOn(page, 'Record');
  });
});
