import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { answer } from '../../testing/answer';
import { coordinator } from '../../testing/people';
import { problem } from '../../testing/problem';
import { renderApp } from '../../testing/render-app';

const noPatients = { items: [], nextCursor: null };

const fillIn = async (user: ReturnType<typeof renderApp>['user'], password = 'long enough words'): Promise<void> => {
  await user.type(await screen.findByLabelText('E-mail'), ' mira@clinic.test ');
  await user.type(screen.getByLabelText('Password'), password);
  await user.click(screen.getByRole('button', { name: 'Sign in' }));
};

describe('sign-in page', () => {
  it('sends someone who is not signed in here, and back to the page they wanted', async () => {
    answer('GET /api/patients', noPatients);
    const seen = answer('POST /api/auth/sign-in', { user: coordinator });
    const { user, address } = renderApp('/patients?list=finished', null);
    await fillIn(user);
    expect(await screen.findByRole('heading', { name: 'Finished patients' })).toBeVisible();
    expect(address()).toBe('/patients?list=finished');
    expect(seen[0]?.body).toEqual({ email: 'mira@clinic.test', password: 'long enough words' });
  });

  it('opens the first page of the person who signs in', async () => {
    answer('GET /api/patients', noPatients);
    answer('POST /api/auth/sign-in', { user: coordinator });
    const { user, address } = renderApp('/sign-in', null);
    await fillIn(user);
    await waitFor(() => expect(address()).toBe('/patients'));
  });

  it.each(['//elsewhere.test/x', '/\\elsewhere.test', 'https://elsewhere.test'])('does not follow %s', async (next) => {
    answer('GET /api/patients', noPatients);
    answer('POST /api/auth/sign-in', { user: coordinator });
    const { user, address } = renderApp(`/sign-in?next=${encodeURIComponent(next)}`, null);
    await fillIn(user);
    await waitFor(() => expect(address()).toBe('/patients'));
  });

  it('names the empty fields and asks the server nothing', async () => {
    const seen = answer('POST /api/auth/sign-in', { user: coordinator });
    const { user } = renderApp('/sign-in', null);
    await user.click(await screen.findByRole('button', { name: 'Sign in' }));
    expect(screen.getByLabelText('E-mail')).toHaveAccessibleDescription('Enter your e-mail address.');
    expect(screen.getByLabelText('Password')).toHaveAccessibleDescription('Enter your password.');
    expect(screen.getByLabelText('E-mail')).toHaveFocus();
    expect(seen).toHaveLength(0);
  });

  it('says that the pair is wrong without saying which half', async () => {
    answer('POST /api/auth/sign-in', problem('wrong-credentials', 'E-mail or password is not right.'));
    const { user } = renderApp('/sign-in', null);
    await fillIn(user, 'wrong');
    expect(await screen.findByRole('alert')).toHaveTextContent('E-mail or password is not right.');
    expect(screen.getByLabelText('Password')).toHaveFocus();
  });

  it('says when to try again after too many tries', async () => {
    answer('POST /api/auth/sign-in', problem('too-many-requests', 'Too many tries.'));
    const { user } = renderApp('/sign-in', null);
    await fillIn(user);
    expect(await screen.findByRole('alert')).toHaveTextContent('Too many tries. Try again in 2 minutes.');
  });

  it('says that nothing was lost when the server cannot be reached', async () => {
    answer('POST /api/auth/sign-in', 'unreachable');
    const { user } = renderApp('/sign-in', null);
    await fillIn(user);
    expect(await screen.findByRole('alert')).toHaveTextContent('Could not reach the server. Nothing was lost.');
  });
});
