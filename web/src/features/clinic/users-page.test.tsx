import type { StaffUser } from '@slighthill/shared/contracts/clinic';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { answer } from '../../testing/answer';
import { administrator } from '../../testing/people';
import { problem } from '../../testing/problem';
import { renderApp } from '../../testing/render-app';

const therapist: StaffUser = {
  id: '00000000-0000-4000-8000-000000000021',
  displayName: 'Jo Ferris',
  credential: 'RRT',
  email: 'jo@clinic.test',
  roles: ['therapist'],
  state: 'active',
  version: 3,
};
const gone: StaffUser = {
  ...therapist,
  id: therapist.id.replace(/1$/, '3'),
  displayName: 'Ana Brill',
  state: 'disabled',
};
const invited: StaffUser = {
  ...therapist,
  id: therapist.id.replace(/1$/, '2'),
  displayName: 'Theo Kessel',
  credential: null,
  email: 'theo@clinic.test',
  state: 'invited',
};
const invitation = { path: '/welcome#one-time-token', expiresAt: '2026-10-21T12:00:00Z' };

const openForm = async () => {
  answer('GET /api/users', { items: [therapist], nextCursor: null }, { items: [therapist, invited], nextCursor: null });
  const app = renderApp('/clinic', administrator);
  await app.user.click(await screen.findByRole('button', { name: 'New user' }));
  return app;
};

describe('users page', () => {
  it('lists users with their roles and state, and a new link only where it would work', async () => {
    answer('GET /api/users', { items: [therapist, invited, gone], nextCursor: null });
    renderApp('/clinic/users', administrator);
    const row = (await screen.findByText('Jo Ferris')).closest('tr') as HTMLElement;
    expect(within(row).getByText('Therapist')).toBeVisible();
    expect(within(row).getByText('Active')).toBeVisible();
    expect(screen.queryByRole('button', { name: 'New link for Ana Brill' })).not.toBeInTheDocument();
    expect(screen.getByRole('button', { name: 'New link for Theo Kessel' })).toBeVisible();
  });

  it('creates a user and shows the invitation link once', async () => {
    const { user } = await openForm();
    const seen = answer('POST /api/users', { user: invited, invitation });
    const form = within(screen.getByRole('dialog', { name: 'New user' }));
    await user.type(form.getByLabelText('Name'), 'Theo Kessel');
    await user.type(form.getByLabelText('E-mail'), 'theo@clinic.test');
    await user.click(form.getByRole('checkbox', { name: 'Therapist' }));
    await user.click(form.getByRole('button', { name: 'Save user' }));
    const link = await screen.findByLabelText('Invitation link for Theo Kessel');
    expect(link).toHaveValue(`${window.location.origin}/welcome#one-time-token`);
    expect(seen[0]?.body).toMatchObject({
      displayName: 'Theo Kessel',
      credential: null,
      email: 'theo@clinic.test',
      roles: ['therapist'],
    });
    expect(await screen.findByRole('button', { name: 'New link for Theo Kessel' })).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Done' }));
    expect(screen.queryByDisplayValue(/one-time-token/)).not.toBeInTheDocument();
  });

  it('asks for at least one role', async () => {
    const { user } = await openForm();
    const form = within(screen.getByRole('dialog', { name: 'New user' }));
    await user.type(form.getByLabelText('Name'), 'Theo Kessel');
    await user.type(form.getByLabelText('E-mail'), 'theo@clinic.test');
    await user.click(form.getByRole('button', { name: 'Save user' }));
    expect(await form.findByText('Choose at least one role')).toBeVisible();
  });

  it('says so when the e-mail is taken, and keeps what was typed', async () => {
    const { user } = await openForm();
    answer('POST /api/users', problem('already-exists', 'Another user has this e-mail address. Nothing was stored.'));
    const form = within(screen.getByRole('dialog', { name: 'New user' }));
    await user.type(form.getByLabelText('Name'), 'Theo Kessel');
    await user.type(form.getByLabelText('E-mail'), 'jo@clinic.test');
    await user.click(form.getByRole('checkbox', { name: 'Therapist' }));
    await user.click(form.getByRole('button', { name: 'Save user' }));
    await waitFor(() =>
      expect(form.getByRole('alert')).toHaveTextContent('Not saved. Another user has this e-mail address.'),
    );
    expect(form.getByLabelText('Name')).toHaveValue('Theo Kessel');
  });
});
