import { describe, expect } from 'vitest';
import { demoPassword } from '../fixtures/accounts';
import { signIn, signOut } from '../fixtures/sign-in';
import { test } from '../fixtures/test';

describe('sign-in', () => {
  test('asks for both fields, says what is not right, and opens the page that was wanted', async ({ visit }) => {
    const { page, planFailure } = await visit();
    planFailure('/api/auth/me');
    planFailure('/api/auth/sign-in');
    await page.goto('/patients?list=finished');
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.getByText('Enter your e-mail address.').waitFor();
    await page.getByText('Enter your password.').waitFor();

    await signIn(page, 'coordinator', 'not the password');
    await page.getByRole('alert').getByText('E-mail or password is not right').waitFor();
    await page.getByLabel('Password').fill(demoPassword);
    await page.keyboard.press('Enter');
    await page.getByRole('heading', { name: 'Finished patients' }).waitFor();

    await signOut(page);
    await page.goto('/patients');
    await page.getByRole('heading', { name: 'Sign in' }).waitFor();
    expect(await page.getByRole('table').count()).toBe(0);
  });
});
