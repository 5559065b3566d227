import type { Page } from 'playwright-core';
import { describe } from 'vitest';
import { showcasePatient, type Account } from './fixtures/accounts';
import { expectAxeClean } from './fixtures/axe';
import { send } from './fixtures/in-page';
import { picture } from './fixtures/picture';
import { dialog, openRecordDrawer } from './fixtures/record-steps';
import { test, type Visitor } from './fixtures/test';

/** One state of a page: checked, and kept as a picture when pictures are asked for. */
async function look(page: Page, state: string, options: { whole?: boolean } = {}): Promise<void> {
  await picture(page, state, options);
  await expectAxeClean(page, state);
}

/** Holds back the answers of an address until `letGo`, so that the waiting state can be looked at. */
async function holdBack(page: Page, address: RegExp): Promise<() => void> {
  let letGo = (): void => undefined;
  const held = new Promise<void>((resolve) => (letGo = resolve));
  await page.route(address, async (route) => {
    await held;
    await route.continue();
  });
  return () => letGo();
}

/** Reloads with an address that cannot be reached, looks at what the page says, and lets it work again. */
async function lookWithout({ page, planFailure }: Visitor, address: RegExp, state: string, words: RegExp) {
  planFailure('/api/');
  await page.route(address, (route) => route.abort('connectionrefused'));
  await page.reload();
  // The query layer tries again by itself before it gives up.
  await page.getByText(words).first().waitFor({ timeout: 30_000 });
  await look(page, state);
  await page.unroute(address);
  await page.getByRole('button', { name: 'Try again' }).first().click();
}

async function openShowcase(page: Page): Promise<void> {
  await page.getByRole('searchbox').fill(showcasePatient.familyName);
  await page.getByRole('link', { name: new RegExp(showcasePatient.familyName) }).click();
  await page.getByRole('application').waitFor();
}

async function closeDialog(page: Page): Promise<void> {
  const open = page.getByRole('dialog').last();
  await open.getByRole('button', { name: 'Close' }).click();
  await open.waitFor({ state: 'detached' });
}

async function lookAtPatients(visitor: Visitor): Promise<void> {
  const { page } = visitor;
  const letGo = await holdBack(page, /\/api\/patients\?/);
  await page.reload();
  await page.getByText('Loading patients').waitFor({ state: 'attached' });
  await look(page, 'patients-loading');
  letGo();
  await page.getByRole('table').waitFor();
  await look(page, 'patients-list');
  await page.getByRole('searchbox').fill('nobody has this name');
  await page.getByText(/matches what you typed/).waitFor();
  await look(page, 'patients-nothing-found');
  await lookWithout(visitor, /\/api\/patients\?/, 'patients-error', /The list could not be loaded/);
  await page.getByRole('table').waitFor();
  await page.getByRole('link', { name: 'New patient' }).click();
  const drawer = dialog(page, 'New patient');
  await drawer.getByLabel('Given name').waitFor();
  await look(page, 'patient-new');
  await drawer.getByRole('button', { name: 'Save patient' }).click();
  await drawer.getByText('Choose a diagnosis group').waitFor();
  await look(page, 'patient-new-errors');
  await drawer.getByLabel('Given name').fill('Warren');
  await drawer.getByRole('button', { name: 'Close' }).click();
  await dialog(page, 'Leave without saving?').waitFor();
  await look(page, 'unsaved-work');
  await page.getByRole('button', { name: 'Leave' }).click();
}

async function lookAtSummary(visitor: Visitor): Promise<void> {
  const { page } = visitor;
  await look(page, 'record-summary', { whole: page.viewportSize()?.width === 390 });
  await page.getByRole('application').focus();
  await page.keyboard.press('End');
  await page.getByText(/^Point /).waitFor();
  await look(page, 'record-summary-reader');
  await page.getByRole('button', { name: /^FEV1 after/ }).click();
  await page.getByRole('heading', { name: 'FEV1, percent predicted' }).waitFor();
  await look(page, 'record-trend-bands', { whole: page.viewportSize()?.width === 390 });
  await page.getByRole('button', { name: 'Show as table' }).click();
  await look(page, 'record-summary-table');
  await page.getByRole('button', { name: 'Change rule' }).click();
  await page.getByRole('dialog').waitFor();
  await look(page, 'rule-dialog');
  await page.keyboard.press('Escape');
  const letGo = await holdBack(page, /\/trends/);
  await page.reload();
  await page.getByRole('heading', { level: 1 }).waitFor();
  await page.getByText('Loading the charts').waitFor({ state: 'attached' });
  await look(page, 'record-summary-loading');
  letGo();
  await lookWithout(visitor, /\/trends/, 'record-summary-error', /The summary could not be loaded/);
  await page.getByRole('region', { name: 'Pattern' }).waitFor();
}

async function lookAtSections({ page }: Visitor): Promise<void> {
  await page.getByRole('link', { name: /^Tests/ }).click();
  await page.getByRole('table', { name: 'Tests' }).waitFor();
  await look(page, 'record-tests');
  await page.getByRole('link', { name: 'Spirometry' }).first().click();
  await page.getByRole('heading', { name: 'History' }).waitFor();
  await look(page, 'test-spirometry');
  await page.getByRole('link', { name: /^File/ }).click();
  await page.getByRole('heading', { name: 'Oxygen order' }).waitFor();
  await look(page, 'record-file-list');
  await page.getByRole('link', { name: 'Details' }).click();
  await page.getByRole('button', { name: 'Edit patient' }).waitFor();
  await look(page, 'record-details');
  await page.getByRole('button', { name: 'Edit patient' }).click();
  await dialog(page, 'Edit patient').waitFor();
  await look(page, 'patient-edit');
  await closeDialog(page);
  await page.getByRole('button', { name: 'Change enrollment' }).click();
  await dialog(page, 'Change enrollment').waitFor();
  await look(page, 'enrollment-change');
  await closeDialog(page);
}

/** Drafts of an earlier tour are not what these drawers open with. */
async function dropDrafts(page: Page): Promise<void> {
  const patientId = /patients\/([0-9a-f-]+)/.exec(page.url())?.[1] ?? '';
  for (const form of ['spirometry', 'measurement', 'body-size', 'file-entry'])
    await send(page, 'DELETE', `/api/drafts/${form}/${patientId}`);
}

async function lookAtRecording({ page }: Visitor): Promise<void> {
  await dropDrafts(page);
  await page.getByRole('button', { name: 'Record', exact: true }).first().click();
  await page.getByRole('menuitem', { name: 'Spirometry' }).waitFor();
  await look(page, 'record-menu');
  await page.keyboard.press('Escape');
  const spirometry = await openRecordDrawer(page, 'Spirometry');
  await look(page, 'spirometry-form');
  await spirometry.getByRole('checkbox', { name: 'Best values only' }).check();
  await spirometry.getByLabel('FVC', { exact: true }).waitFor();
  await look(page, 'spirometry-form-best');
  await spirometry.getByRole('button', { name: 'Keep as draft' }).click();
  await spirometry.waitFor({ state: 'detached' });
  const result = await openRecordDrawer(page, 'Result');
  await result.getByRole('combobox', { name: 'Result', exact: true }).click();
  await result.getByRole('option').first().waitFor();
  await look(page, 'result-picker');
  await page.keyboard.type('6-minute');
  await page.keyboard.press('Enter');
  await result.getByLabel('Course length').waitFor();
  await look(page, 'result-walk');
  await result.getByRole('button', { name: 'Keep as draft' }).click();
  await result.waitFor({ state: 'detached' });
  await openRecordDrawer(page, 'Body size');
  await look(page, 'body-size-form');
  await closeDialog(page);
  const file = await openRecordDrawer(page, 'File entry');
  await file.getByLabel('What to enter').selectOption('Oxygen order');
  await look(page, 'file-entry-oxygen');
  await file.getByRole('button', { name: 'Keep as draft' }).click();
  await file.waitFor({ state: 'detached' });
}

async function lookAtClinic(visitor: Visitor): Promise<void> {
  const { page } = visitor;
  await page.getByRole('table').waitFor();
  await look(page, 'users');
  await page.getByRole('button', { name: 'New user' }).click();
  await dialog(page, 'New user').waitFor();
  await look(page, 'user-new');
  await closeDialog(page);
  await page.getByRole('link', { name: 'Programs' }).click();
  await page.getByRole('table').waitFor();
  await look(page, 'programs');
  await page.getByRole('button', { name: 'New program' }).click();
  await dialog(page, 'New program').waitFor();
  await look(page, 'program-new');
  await closeDialog(page);
  await page.getByRole('link', { name: 'Rules' }).click();
  await page.getByRole('radio').first().waitFor();
  await look(page, 'rules');
  await page.getByRole('link', { name: 'Audit trail' }).click();
  await page.getByRole('row').nth(3).waitFor();
  await look(page, 'audit');
  await lookWithout(visitor, /\/api\/audit-events/, 'audit-error', /could not be loaded/);
}

async function lookAtHome(visitor: Visitor): Promise<void> {
  const { page } = visitor;
  await page.getByText('Call your local emergency number now.').waitFor();
  await look(page, 'home');
  await lookWithout(visitor, /\/api\/me\/home/, 'home-error', /could not be loaded/);
  await page.getByRole('heading', { level: 1 }).waitFor();
  await page.goto('/patients');
  await page.getByRole('heading', { name: 'Nothing at this address' }).waitFor();
  await look(page, 'not-found');
}

async function lookAtSignIn({ page, planFailure }: Visitor): Promise<void> {
  planFailure('/api/auth/');
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').waitFor();
  await look(page, 'sign-in');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.getByText('Enter your password.').waitFor();
  await look(page, 'sign-in-errors');
  await page.goto('/welcome');
  await page.getByText('This link is not complete.').waitFor();
  await look(page, 'welcome-incomplete');
}

const tours: { name: string; as?: Account; tour: (visitor: Visitor) => Promise<void> }[] = [
  { name: 'sign-in and invitation', tour: lookAtSignIn },
  { name: 'the list of patients', as: 'coordinator', tour: lookAtPatients },
  {
    name: 'a record and its sections',
    as: 'coordinator',
    tour: async (visitor) => {
      await openShowcase(visitor.page);
      await lookAtSummary(visitor);
      await lookAtSections(visitor);
    },
  },
  {
    name: 'the drawers that record',
    as: 'therapist',
    tour: async (visitor) => {
      await openShowcase(visitor.page);
      await lookAtRecording(visitor);
    },
  },
  { name: 'the clinic’s own pages', as: 'administrator', tour: lookAtClinic },
  { name: 'a patient’s home', as: 'patient', tour: lookAtHome },
];

describe.for([1280, 390] as const)('every page in its states at %i px', (width) => {
  test.for(tours)('$name', { timeout: 120_000 }, async ({ as, tour }, { visit }) => {
    await tour(await visit(as ? { as, width } : { width }));
  });
});
