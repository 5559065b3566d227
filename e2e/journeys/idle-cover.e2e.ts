import type { Page } from 'playwright-core';
import { describe, expect } from 'vitest';
import { demoPassword, firstHeadings, showcasePatient } from '../fixtures/accounts';
import { expectAxeClean } from '../fixtures/axe';
import { picture } from '../fixtures/picture';
import { dialog, openRecordDrawer } from '../fixtures/record-steps';
import { signIn } from '../fixtures/sign-in';
import { test, type Visitor } from '../fixtures/test';

const idleMinutes = 15;

async function halfFilledForm({ page }: Visitor): Promise<void> {
  await page.getByRole('searchbox').fill(showcasePatient.familyName);
  await page.getByRole('link', { name: new RegExp(showcasePatient.familyName) }).click();
  const drawer = await openRecordDrawer(page, 'Body size');
  await drawer.getByLabel(/^Weight/).fill('79.4');
}

/** Everything of the page that can be read: as text, in fields, by a screen reader. */
async function readable(page: Page): Promise<string> {
  const spoken = await page.locator('body').ariaSnapshot();
  const drawn = await page.locator('body').innerText();
  return `${spoken}\n${drawn}`;
}

async function waitForCover(page: Page): Promise<void> {
  await page.clock.fastForward((idleMinutes - 1) * 60_000 + 5_000);
  await page.getByRole('alert').getByText('Still there?').waitFor();
  await page.clock.fastForward(60_000);
  await dialog(page, 'Continue with your password').waitFor();
}

describe('after 15 quiet minutes', () => {
  test('nothing can be read, and the same person goes on where the form stood', async ({ visit }) => {
    const visitor = await visit();
    const { page } = visitor;
    visitor.planFailure('/api/auth/');
    await page.clock.install();
    await signIn(page, 'coordinator');
    await page.getByRole('heading', { level: 1, name: firstHeadings.coordinator }).waitFor();
    await halfFilledForm(visitor);
    await waitForCover(page);

    const words = await readable(page);
    expect(words).toContain('Tamsin Wrede');
    expect(words).not.toMatch(/Tidewell|79\.4|Weight|COPD/);
    expect(await page.title()).not.toContain('Tidewell');
    await expectAxeClean(page, 'the cover');
    await picture(page, 'idle-cover');

    const cover = dialog(page, 'Continue with your password');
    await cover.getByLabel('Password').fill('not the password');
    await cover.getByRole('button', { name: 'Continue' }).click();
    await cover.getByText('This password is not right. Try it again.').waitFor();
    expect(await readable(page)).not.toMatch(/Tidewell|79\.4/);
    await cover.getByLabel('Password').fill(demoPassword);
    await cover.getByRole('button', { name: 'Continue' }).click();
    await cover.waitFor({ state: 'detached' });
    expect(
      await dialog(page, 'Record body size')
        .getByLabel(/^Weight/)
        .inputValue(),
    ).toBe('79.4');
  });

  test('another person starts fresh and finds nothing of the first', async ({ visit }) => {
    const visitor = await visit();
    const { page } = visitor;
    visitor.planFailure('/api/auth/');
    await page.clock.install();
    await signIn(page, 'coordinator');
    await page.getByRole('heading', { level: 1, name: firstHeadings.coordinator }).waitFor();
    await halfFilledForm(visitor);
    await waitForCover(page);
    await dialog(page, 'Continue with your password').getByRole('button', { name: 'Sign in as someone else' }).click();
    await page.getByRole('heading', { name: 'Sign in' }).waitFor();
    expect(await readable(page)).not.toMatch(/Tidewell|79\.4|Tamsin/);

    await signIn(page, 'stranger');
    await page.getByRole('heading', { level: 1, name: firstHeadings.stranger }).waitFor();
    await page.getByRole('table').waitFor();
    expect(new URL(page.url()).pathname).toBe('/patients');
    expect(await readable(page)).not.toMatch(/Tidewell|79\.4|Tamsin/);
    await page.goBack();
    expect(await readable(page)).not.toMatch(/Tidewell|79\.4|Tamsin/);
  });
});
