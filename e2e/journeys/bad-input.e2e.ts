import type { Page } from 'playwright-core';
import { describe, expect } from 'vitest';
import { clinicDay } from '../fixtures/clinic-day';
import { addPatient, send } from '../fixtures/in-page';
import { inventPerson } from '../fixtures/invented-person';
import { picture } from '../fixtures/picture';
import { openRecordDrawer, savedNote } from '../fixtures/record-steps';
import { test } from '../fixtures/test';

interface TestList {
  items: { kind: string; values: Record<string, number> }[];
}

const testsOf = async (page: Page, patientId: string): Promise<TestList['items']> =>
  (await send<TestList>(page, 'GET', `/api/patients/${patientId}/tests`)).body.items;

async function openSpirometry(page: Page): Promise<string> {
  const id = await addPatient(page, inventPerson());
  await page.goto(`/patients/${id}/tests`);
  return id;
}

describe('what the spirometry form refuses and asks', () => {
  test('FEV1 above FVC, a date to come and 65 cm, each at its field, and nothing is stored', async ({ visit }) => {
    const { page, planFailure } = await visit({ as: 'coordinator' });
    const id = await openSpirometry(page);
    planFailure('/spirometry-tests');
    const drawer = await openRecordDrawer(page, 'Spirometry');
    await drawer.getByLabel('Maneuver 1, FEV1 in L').fill('3.40');
    await drawer.getByLabel('Maneuver 1, FVC in L').fill('3.10');
    await drawer.getByLabel('Maneuver 2, FEV1 in L').focus();
    await drawer.getByRole('alert').getByText('Maneuver 1: FEV1 cannot be more than FVC (3.10 L)').waitFor();
    await drawer.getByLabel('Date and time').fill(`${clinicDay(-2)}T09:00`);
    await drawer.getByLabel('Height', { exact: true }).fill('65');
    await drawer.getByText('Did you mean 65 inches (165.1 cm)?').waitFor();
    await drawer.getByText('Until you answer there is no percent predicted.').waitFor();
    await picture(page, 'spirometry-form-errors');
    await drawer.getByRole('button', { name: 'Save test' }).click();
    await drawer
      .getByRole('alert')
      .getByText(/FEV1 cannot be more than FVC/)
      .waitFor();

    await drawer.getByLabel('Maneuver 1, FEV1 in L').fill('1.40');
    await drawer.getByRole('button', { name: 'Yes, 165.1 cm' }).click();
    await drawer.getByRole('button', { name: 'Save test' }).click();
    await drawer.getByText(/future/).waitFor();
    expect(await drawer.getByLabel('Date and time').evaluate((field) => field === document.activeElement)).toBe(true);
    expect(await testsOf(page, id)).toEqual([]);

    await drawer.getByLabel('Date and time').fill(`${clinicDay(1)}T09:00`);
    await drawer.getByRole('button', { name: 'Save test' }).click();
    await savedNote(page, /^Saved\. /);
    expect(await testsOf(page, id)).toHaveLength(1);
  });

  test('keeps the numbers when saving fails, and saves one test however often it is tried', async ({ visit }) => {
    const { page, planFailure } = await visit({ as: 'coordinator' });
    const id = await openSpirometry(page);
    const drawer = await openRecordDrawer(page, 'Spirometry');
    await drawer.getByLabel('Date and time').fill(`${clinicDay(1)}T09:00`);
    await drawer.getByLabel('Height', { exact: true }).fill('165.1');
    await drawer.getByLabel('Bronchodilator', { exact: true }).selectOption('None given');
    await drawer.getByLabel('Maneuver 1, FEV1 in L').fill('1.40');
    await drawer.getByLabel('Maneuver 1, FVC in L').fill('2.60');

    planFailure('/spirometry-tests');
    // The first attempt never leaves; the second is stored, but its answer is lost on the way back.
    let attempts = 0;
    await page.route('**/spirometry-tests', async (route) => {
      attempts++;
      if (attempts === 2) await route.fetch();
      if (attempts <= 2) await route.abort('connectionreset');
      else await route.continue();
    });
    await drawer.getByRole('button', { name: 'Save test' }).click();
    await drawer.getByRole('alert').getByText('Not saved. ').waitFor();
    await picture(page, 'spirometry-form-not-saved');
    expect(await drawer.getByLabel('Maneuver 1, FEV1 in L').inputValue()).toBe('1.40');
    expect(await testsOf(page, id)).toEqual([]);

    const again = drawer.getByRole('button', { name: 'Try again' });
    await Promise.all([page.waitForEvent('requestfailed'), again.click()]);
    await again.waitFor();
    await again.click();
    await savedNote(page, /^Saved\. /);
    expect(attempts).toBe(3);
    const stored = await testsOf(page, id);
    expect(stored.map(({ kind, values }) => [kind, values.fev1])).toEqual([['spirometry-test', 1.4]]);
  });
});
