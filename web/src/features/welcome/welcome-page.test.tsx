import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { answer } from '../../testing/answer';
import { patientUser } from '../../testing/people';
import { problem } from '../../testing/problem';
import { renderApp } from '../../testing/render-app';

const invitation = { displayName: 'Leland Brask', email: 'leland@clinic.test', clinicName: 'Alder Falls' };
const home = { givenName: 'Leland', clinic: { name: 'Alder Falls', phone: '555-0142' }, program: null };

const choose = async (
  user: ReturnType<typeof renderApp>['user'],
  password: string,
  again = password,
): Promise<void> => {
  await user.type(await screen.findByLabelText('New password'), password);
  await user.type(screen.getByLabelText('The same password again'), again);
  await user.click(screen.getByRole('button', { name: 'Save and sign in' }));
};

describe('welcome page', () => {
  it('looks the link up, takes a password and signs in', async () => {
    const looked = answer('POST /api/auth/invitation/look-up', invitation);
    const accepted = answer('POST /api/auth/invitation/accept', { user: patientUser });
    answer('GET /api/me/home', home);
    const { user, address } = renderApp('/welcome#one-time-token', null);
    expect(await screen.findByRole('heading', { name: 'Welcome, Leland Brask' })).toBeVisible();
    await choose(user, 'twelve or more');
    await waitFor(() => expect(address()).toBe('/home'));
    expect(looked[0]?.body).toEqual({ token: 'one-time-token' });
    expect(accepted[0]?.body).toEqual({ token: 'one-time-token', password: 'twelve or more' });
  });

  it('refuses eleven characters and two that differ, before asking the server', async () => {
    answer('POST /api/auth/invitation/look-up', invitation);
    const accepted = answer('POST /api/auth/invitation/accept', { user: patientUser });
    const { user } = renderApp('/welcome#one-time-token', null);
    await choose(user, 'elevenchars');
    expect(screen.getByText('Use at least 12 characters. You have 11.')).toBeVisible();
    await user.type(screen.getByLabelText('New password'), 's');
    await user.click(screen.getByRole('button', { name: 'Save and sign in' }));
    expect(screen.getByText('The two passwords differ. Type the second one again.')).toBeVisible();
    expect(accepted).toHaveLength(0);
  });

  it('says what to do with a used or unknown link', async () => {
    answer('POST /api/auth/invitation/look-up', problem('not-found', 'This link is not known.'));
    renderApp('/welcome#used', null);
    expect(await screen.findByText(/This link has been used or is too old/)).toBeVisible();
    expect(screen.getByRole('heading', { level: 1, name: 'This link cannot be used' })).toBeVisible();
    expect(screen.queryByLabelText('New password')).not.toBeInTheDocument();
  });
});
