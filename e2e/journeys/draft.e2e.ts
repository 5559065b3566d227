import { describe, expect } from 'vitest';
import { firstHeadings } from '../fixtures/accounts';
import { addPatient, send } from '../fixtures/in-page';
import { inventPerson } from '../fixtures/invented-person';
import { openRecordDrawer, savedNote } from '../fixtures/record-steps';
import { signIn, signOut } from '../fixtures/sign-in';
import { test } from '../fixtures/test';

describe('a half-filled spirometry form', () => {
  test('survives a reload and a new sign-in, is its owner’s alone, and goes once the test is saved', async ({
    visit,
  }) => {
    const { page, planFailure } = await visit({ as: 'therapist' });
    const id = await visit({ as: 'coordinator' }).then((other) => addPatient(other.page, inventPerson()));
    await page.goto(`/patients/${id}/tests`);
    const drawer = await openRecordDrawer(page, 'Spirometry');
    await drawer.getByLabel('Height', { exact: true }).fill('171.5');
    await drawer.getByLabel('Maneuver 1, FEV1 in L').fill('1,85');
    await drawer.getByLabel('Maneuver 1, FVC in L').fill('3.1');
    await drawer.getByText(/^Draft kept /).waitFor();
    await drawer.getByText('Not in the record yet.').waitFor();
    await page.reload();
    await openRecordDrawer(page, 'Spirometry');
    await drawer.getByText('This is your kept draft.').waitFor();
    // As it was typed, comma and all.
    expect(await drawer.getByLabel('Maneuver 1, FEV1 in L').inputValue()).toBe('1,85');
    await drawer.getByRole('button', { name: 'Keep as draft' }).click();
    await drawer.waitFor({ state: 'detached' });

    await signOut(page);
    await signIn(page, 'coordinator');
    await page.getByRole('heading', { level: 1, name: firstHeadings.coordinator }).waitFor();
    expect((await send<{ draft: unknown }>(page, 'GET', `/api/drafts/spirometry/${id}`)).body.draft).toBeNull();
    await page.goto(`/patients/${id}/tests`);
    await openRecordDrawer(page, 'Spirometry');
    expect(await drawer.getByText('This is your kept draft.').count()).toBe(0);
    expect(await drawer.getByLabel('Maneuver 1, FEV1 in L').inputValue()).toBe('');
    await drawer.getByRole('button', { name: 'Close' }).click();

    planFailure('/api/auth/');
    await signOut(page);
    await signIn(page, 'therapist');
    await page.getByRole('heading', { level: 1, name: firstHeadings.therapist }).waitFor();
    await page.goto(`/patients/${id}/tests`);
    await openRecordDrawer(page, 'Spirometry');
    expect(await drawer.getByLabel('Maneuver 1, FVC in L').inputValue()).toBe('3.1');
    await drawer.getByRole('button', { name: 'Save test' }).click();
    await savedNote(page, /^Saved\. /);
    await openRecordDrawer(page, 'Spirometry');
    expect(await drawer.getByLabel('Maneuver 1, FVC in L').inputValue()).toBe('');
  });
});
