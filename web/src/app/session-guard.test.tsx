import { act, fireEvent, screen, waitFor, within } from '@testing-library/react';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { answer } from '../testing/answer';
import { coordinator, listed } from '../testing/people';
import { problem } from '../testing/problem';
import { renderApp } from '../testing/render-app';

const minuteMs = 60_000;
const page = { items: [listed(1)], nextCursor: null };

const pass = (minutes: number): Promise<void> =>
  act(async () => {
    await vi.advanceTimersByTimeAsync(minutes * minuteMs);
  });

const halfFilledForm = async () => {
  answer('GET /api/patients', page);
  const app = renderApp('/patients/new', coordinator);
  await app.user.type(await screen.findByLabelText('Given name'), 'Ruth');
  return app;
};

const giveThePassword = async (user: Awaited<ReturnType<typeof halfFilledForm>>['user']): Promise<void> => {
  const cover = screen.getByRole('dialog', { name: 'Continue with your password' });
  await user.type(within(cover).getByLabelText('Password'), 'long enough words');
  await user.click(within(cover).getByRole('button', { name: 'Continue' }));
};

beforeEach(() => {
  // Only the clock and the idle check are moved by hand; the page's own waiting stays real.
  vi.useFakeTimers({ toFake: ['Date', 'setInterval', 'clearInterval'] });
});

describe('idle cover', () => {
  it('warns one minute before, and a press on the button is enough', async () => {
    const { user } = await halfFilledForm();
    await pass(13.9);
    expect(screen.queryByText('Still there?')).not.toBeInTheDocument();
    await pass(0.2);
    expect(screen.getByText('Still there?')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Stay signed in' }));
    expect(screen.queryByText('Still there?')).not.toBeInTheDocument();
    await pass(5);
    expect(screen.queryByText('Continue with your password')).not.toBeInTheDocument();
    expect(screen.getByLabelText('Given name')).toHaveValue('Ruth');
  });

  it('covers at the limit: nothing readable, title changed; the password brings the form back as it was', async () => {
    const { user } = await halfFilledForm();
    expect(document.title).toBe('New patient · Slighthill');
    await pass(15.1);
    expect(document.title).toBe('Password needed · Slighthill');
    expect(screen.queryByRole('textbox', { name: 'Given name' })).not.toBeInTheDocument();
    expect(screen.queryByRole('link', { name: /Brask/ })).not.toBeInTheDocument();
    const hidden = document.querySelector('[data-covered]');
    expect(hidden).toHaveAttribute('inert');
    expect(hidden).toHaveAttribute('aria-hidden', 'true');
    expect(hidden).toHaveClass('invisible');
    expect(hidden).toContainElement(screen.getByDisplayValue('Ruth'));
    expect(screen.getByLabelText('Password')).toHaveFocus();

    const seen = answer('POST /api/auth/sign-in', { user: coordinator });
    await giveThePassword(user);
    await waitFor(() => expect(screen.queryByText('Continue with your password')).not.toBeInTheDocument());
    expect(seen[0]?.body).toEqual({ email: 'mira@clinic.test', password: 'long enough words' });
    expect(screen.getByRole('textbox', { name: 'Given name' })).toHaveValue('Ruth');
    await waitFor(() => expect(screen.getByRole('textbox', { name: 'Given name' })).toHaveFocus());
    expect(document.title).toBe('New patient · Slighthill');
  });

  it('stays after a wrong password and does not open by Escape or a touch', async () => {
    const { user } = await halfFilledForm();
    await pass(15.1);
    answer('POST /api/auth/sign-in', problem('wrong-credentials', 'Wrong.'));
    await giveThePassword(user);
    expect(await screen.findByText('This password is not right. Try it again.')).toBeVisible();
    await user.keyboard('{Escape}');
    fireEvent.pointerDown(document.body);
    expect(screen.getByRole('dialog', { name: 'Continue with your password' })).toBeVisible();
  });

  it('covers a computer that slept, even when the first thing after waking is a touch', async () => {
    const { user } = await halfFilledForm();
    vi.setSystemTime(Date.now() + 60 * minuteMs);
    await user.keyboard('x');
    expect(screen.getByRole('dialog', { name: 'Continue with your password' })).toBeVisible();
  });

  it('counts a touch in another tab', async () => {
    await halfFilledForm();
    await pass(10);
    window.localStorage.setItem('slighthill.last-active', String(Date.now()));
    await pass(10);
    expect(screen.queryByText('Continue with your password')).not.toBeInTheDocument();
    await pass(5.1);
    expect(screen.getByText('Continue with your password')).toBeVisible();
  });

  it('keeps the server informed of touches at most every 30 s, and never without one', async () => {
    const { user, activity } = await halfFilledForm();
    const before = activity.length;
    await pass(10);
    expect(activity).toHaveLength(before);
    await user.keyboard('abc');
    await waitFor(() => expect(activity).toHaveLength(before + 1));
    await pass(0.6);
    await user.keyboard('d');
    await waitFor(() => expect(activity).toHaveLength(before + 2));
  });

  it('forgets everything when someone else wants to sign in', async () => {
    const { user } = await halfFilledForm();
    await pass(15.1);
    const out = answer('POST /api/auth/sign-out', null);
    const leave = vi.spyOn(window.location, 'assign').mockImplementation(() => undefined);
    await user.click(screen.getByRole('button', { name: 'Sign in as someone else' }));
    await waitFor(() => expect(leave).toHaveBeenCalledWith('/sign-in'));
    expect(out).toHaveLength(1);
  });
});

describe('a session the server ended', () => {
  it('covers the page in the same way, so that a form is not lost', async () => {
    const { user } = await halfFilledForm();
    answer('POST /api/patients/duplicate-check', problem('session-idle', 'You were signed out.'));
    await user.type(screen.getByLabelText('Family name'), 'Valdane');
    await user.type(screen.getByLabelText('Date of birth'), '1961-05-17');
    expect(await screen.findByRole('dialog', { name: 'Continue with your password' })).toBeVisible();
    answer('POST /api/auth/sign-in', { user: coordinator });
    answer('POST /api/patients/duplicate-check', { items: [] });
    await giveThePassword(user);
    await waitFor(() => expect(screen.getByRole('textbox', { name: 'Family name' })).toHaveValue('Valdane'));
    expect(screen.getByRole('textbox', { name: 'Given name' })).toHaveValue('Ruth');
  });
});
