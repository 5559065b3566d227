import type { Page } from 'playwright-core';
import { describe, expect } from 'vitest';
import { firstHeadings, showcasePatient } from '../fixtures/accounts';
import { expectAxeClean } from '../fixtures/axe';
import { clinicDay } from '../fixtures/clinic-day';
import { addPatient, send } from '../fixtures/in-page';
import { inventPerson } from '../fixtures/invented-person';
import { picture } from '../fixtures/picture';
import { dialog, openRecordDrawer, savedNote } from '../fixtures/record-steps';
import { signIn, signOut } from '../fixtures/sign-in';
import { test } from '../fixtures/test';

const areasOf = (page: Page): Promise<string[]> =>
  page.getByRole('navigation', { name: 'Areas' }).getByRole('link').allInnerTexts();

async function openRecord(page: Page, familyName: string): Promise<string> {
  await page.getByRole('searchbox').fill(familyName);
  await page.getByRole('link', { name: new RegExp(familyName) }).click();
  await page.getByRole('button', { name: 'Record', exact: true }).waitFor();
  return /patients\/([0-9a-f-]+)/.exec(page.url())?.[1] ?? '';
}

async function nothingHere(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await page.getByRole('heading', { name: 'Nothing at this address' }).waitFor();
}

describe('what each role finds', () => {
  test('a therapist records, but neither adds nor enrolls patients', async ({ visit }) => {
    const { page } = await visit({ as: 'therapist' });
    expect(await areasOf(page)).toEqual(['Patients']);
    await page.getByRole('table').waitFor();
    expect(await page.getByRole('link', { name: 'New patient' }).count()).toBe(0);
    await openRecord(page, showcasePatient.familyName);
    await page.getByRole('link', { name: 'Details' }).click();
    await page.getByRole('heading', { name: 'Enrollment' }).waitFor();
    expect(await page.getByRole('button', { name: /Edit patient|Enroll|Change enrollment/ }).count()).toBe(0);
    await nothingHere(page, '/clinic/users');
  });

  test('a pulmonologist orders oxygen and releases a hold with a reason; others cannot', async ({ visit }) => {
    const person = inventPerson();
    const coordinator = await visit({ as: 'coordinator' });
    const id = await addPatient(coordinator.page, person);
    await coordinator.page.goto(`/patients/${id}/file`);
    const hold = await openRecordDrawer(coordinator.page, 'File entry');
    await hold.getByLabel('What to enter').selectOption('Safety hold');
    await hold.getByRole('radio', { name: 'Unexplained faint' }).check();
    await picture(coordinator.page, 'file-entry-hold');
    await hold.getByRole('button', { name: 'Save entry' }).click();
    await savedNote(coordinator.page, /Safety hold is in File/);
    await coordinator.page.getByRole('button', { name: 'History of Unexplained faint' }).click();
    await coordinator.page.getByText('Not amended since it was entered.').waitFor();
    expect(await coordinator.page.getByRole('button', { name: /^Release/ }).count()).toBe(0);

    const { page } = await visit({ as: 'pulmonologist' });
    await page.goto(`/patients/${id}/file`);
    await page.getByText('On hold', { exact: true }).waitFor();
    await page.getByRole('button', { name: 'Release Unexplained faint' }).click();
    const asked = dialog(page, 'Release this hold?');
    await asked.getByRole('button', { name: 'Release it' }).click();
    await asked.getByText(/reason/i).waitFor();
    await asked.getByLabel('Why it is released').fill('Holter and echo without findings');
    await expectAxeClean(page, 'the release of a hold');
    await asked.getByRole('button', { name: 'Release it' }).click();
    await page.getByText(/^Released .* by Dr\. Imre Castellow: Holter and echo without findings$/).waitFor();

    const order = await openRecordDrawer(page, 'File entry');
    await order.getByLabel('What to enter').selectOption('Oxygen order');
    await order.getByLabel('Walking').fill('3');
    await order.getByLabel('Device').selectOption('Portable concentrator');
    await order.getByLabel('Prescriber').fill('Dr. Imre Castellow');
    await order.getByRole('button', { name: 'Save entry' }).click();
    await savedNote(page, /Oxygen order is in File/);
    await page.getByRole('term').filter({ hasText: 'Oxygen' }).waitFor();
    await page.getByText('3 L/min when walking').waitFor();
    await picture(page, 'record-file');
  });

  test('an administrator invites a person, who chooses a password; the trail names people and nothing clinical', async ({
    visit,
  }) => {
    const { page } = await visit({ as: 'administrator' });
    expect(await areasOf(page)).toEqual(['Clinic']);
    const name = `Odo ${inventPerson().familyName}`;
    const email = `${name.replace(' ', '.').toLowerCase()}@alderfalls.test`;
    await page.getByRole('button', { name: 'New user' }).click();
    const drawer = dialog(page, 'New user');
    await drawer.getByLabel('Name', { exact: true }).fill(name);
    await drawer.getByLabel('E-mail').fill(email);
    await drawer.getByRole('checkbox', { name: 'Therapist' }).check();
    await picture(page, 'user-drawer');
    await drawer.getByRole('button', { name: 'Save user' }).click();
    const link = await page.getByLabel(`Invitation link for ${name}`).inputValue();
    await picture(page, 'users-invitation');
    await expectAxeClean(page, 'users with an invitation link');

    const invited = await visit();
    invited.planFailure('/api/auth/me');
    await invited.page.goto(link);
    await invited.page.getByRole('heading', { name: `Welcome, ${name}` }).waitFor();
    await expectAxeClean(invited.page, 'the invitation');
    await picture(invited.page, 'welcome');
    await invited.page.getByLabel('New password').fill('seven quiet herons');
    await invited.page.getByLabel('The same password again').fill('seven quiet herons');
    await invited.page.getByRole('button', { name: 'Save and sign in' }).click();
    await invited.page.getByRole('heading', { level: 1, name: firstHeadings.therapist }).waitFor();
    await openRecord(invited.page, showcasePatient.familyName);
    await signOut(invited.page);
    await signIn(invited.page, email, 'seven quiet herons');
    await invited.page.getByRole('heading', { level: 1, name: firstHeadings.therapist }).waitFor();
    // The link has done its work.
    const late = await visit();
    late.planFailure('/api/auth/');
    await late.page.goto(link);
    await late.page.getByText('This link has been used or is too old.').waitFor();

    await page.getByRole('link', { name: 'Audit trail' }).click();
    const rows = page.getByRole('row').filter({ hasText: name });
    await rows.filter({ hasText: 'Opened: patient' }).filter({ hasText: showcasePatient.name }).first().waitFor();
    await rows.filter({ hasText: 'Chose a password' }).first().waitFor();
    const trail = await page.getByRole('table').innerText();
    expect(trail).not.toMatch(/FEV1|COPD|\d (L|m|kg)\b|Obstructive|seven quiet herons/);
    await expectAxeClean(page, 'the audit trail');
    await picture(page, 'audit-trail');
    await nothingHere(page, '/patients');
  });

  test('a patient has a home and nothing else', async ({ visit }) => {
    const { page, planFailure } = await visit({ as: 'patient' });
    expect(await areasOf(page)).toEqual(['Home']);
    await page.getByText('Pulmonary rehabilitation, 12 weeks').waitFor();
    await page.getByText('Call your local emergency number now.').waitFor();
    await nothingHere(page, '/patients');
    planFailure('/api/');
    expect((await send(page, 'GET', '/api/patients')).status).toBe(403);
    expect((await send(page, 'GET', '/api/audit-events')).status).toBe(403);
  });

  test('another clinic’s coordinator cannot open, change or find a record of this one', async ({ visit }) => {
    const { page: own } = await visit({ as: 'coordinator' });
    const id = await openRecord(own, showcasePatient.familyName);
    const { page, planFailure } = await visit({ as: 'stranger' });
    planFailure(`/api/patients/${id}`);
    await page.getByRole('searchbox').fill(showcasePatient.familyName);
    await page.getByText('No patient under Current matches what you typed.').waitFor();
    await page.goto(`/patients/${id}/summary`);
    await page.getByRole('heading', { name: 'There is no such record' }).waitFor();
    expect(await page.locator('body').innerText()).not.toContain('Warren');
    for (const path of ['', '/tests', '/trends', '/file-entries'])
      expect((await send(page, 'GET', `/api/patients/${id}${path}`)).status, path).toBe(404);
    const body = { measure: 'cat', takenAt: `${clinicDay(1)}T16:00:00Z`, value: 11 };
    expect((await send(page, 'POST', `/api/patients/${id}/measurements`, body)).status).toBe(404);
  });
});
