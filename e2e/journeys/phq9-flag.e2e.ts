import { describe, expect } from 'vitest';
import { clinicDay } from '../fixtures/clinic-day';
import { addPatient } from '../fixtures/in-page';
import { inventPerson } from '../fixtures/invented-person';
import { expectAxeClean } from '../fixtures/axe';
import { picture } from '../fixtures/picture';
import { fillResult, openRecordDrawer, savedNote } from '../fixtures/record-steps';
import { test } from '../fixtures/test';

describe('a PHQ-9 whose ninth answer is not zero', () => {
  // Rule OM-1: at any total, here a minimal one.
  test('is flagged in the record at once and stays so until a therapist resolves it with a note', async ({ visit }) => {
    const { page } = await visit({ as: 'coordinator' });
    const id = await addPatient(page, inventPerson());
    await page.goto(`/patients/${id}/tests`);
    const drawer = await openRecordDrawer(page, 'Result');
    await drawer.getByLabel('Date and time').fill(`${clinicDay(0)}T00:01`);
    await fillResult(drawer, 'PHQ-9', '4');
    await drawer.getByRole('button', { name: 'Save result' }).click();
    const ninth = drawer.getByRole('group', { name: /ninth/i });
    await ninth.getByText('The ninth answer is needed').waitFor();
    await ninth.getByRole('radio', { name: '1', exact: true }).check();
    await drawer.getByText('Saving raises a safety flag.').waitFor();
    await picture(page, 'result-phq9');
    await drawer.getByRole('button', { name: 'Save result' }).click();
    await savedNote(page, /PHQ-9 4\b.* is in Tests/);

    const flags = page.getByRole('list', { name: 'Open flags' });
    await flags.getByRole('button', { name: 'PHQ-9 ninth answer' }).click();
    const detail = page.getByRole('dialog', { name: 'PHQ-9 ninth answer' });
    await detail.getByText('It stays open until its owner resolves it with a note.').waitFor();
    expect(await detail.getByRole('button', { name: 'Resolve flag' }).count()).toBe(0);
    await expectAxeClean(page, 'an open flag');
    await picture(page, 'record-flag');

    const { page: therapist } = await visit({ as: 'therapist' });
    await therapist.goto(`/patients/${id}/tests`);
    await therapist.getByRole('button', { name: 'PHQ-9 ninth answer' }).click();
    const own = therapist.getByRole('dialog', { name: 'PHQ-9 ninth answer' });
    await own.getByRole('button', { name: 'Resolve flag' }).click();
    await own.getByText('Write what was done before resolving it').waitFor();
    await own.getByLabel('What was done').fill('Talked the same day, referral made');
    await own.getByRole('button', { name: 'Resolve flag' }).click();
    await therapist.getByRole('button', { name: 'PHQ-9 ninth answer' }).waitFor({ state: 'detached' });
    await page.reload();
    await page.getByRole('heading', { name: 'Tests' }).waitFor();
    expect(await page.getByRole('list', { name: 'Open flags' }).count()).toBe(0);
  });
});
