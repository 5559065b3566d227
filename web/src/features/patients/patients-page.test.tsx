import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { answer } from '../../testing/answer';
import { coordinator, listed, reader } from '../../testing/people';
import { problem } from '../../testing/problem';
import { renderApp } from '../../testing/render-app';

const page = (items: ReturnType<typeof listed>[], nextCursor: string | null = null) => ({ items, nextCursor });

describe('patients page', () => {
  it('lists current patients with what a coordinator looks for', async () => {
    const seen = answer(
      'GET /api/patients',
      page([listed(1, { openFlags: 2 }), listed(2, { enrollment: null, pattern: null, lastTestOn: null })]),
    );
    renderApp('/patients', coordinator);
    const row = (await screen.findByRole('link', { name: 'Brask 1, Leland' })).closest('tr');
    for (const words of ['67', 'A-1', 'COPD', 'Since Sep 14, 2026', 'Obstructive, severe', 'Oct 12, 2026', '2 flags'])
      expect(within(row as HTMLElement).getByText(words)).toBeInTheDocument();
    expect(within(row as HTMLElement).getByText(/Mar 2, 1959/)).toBeInTheDocument();
    expect(screen.getByText('Not enrolled')).toBeInTheDocument();
    expect(screen.getByText('No spirometry')).toBeInTheDocument();
    expect(screen.getByText('2 patients')).toBeInTheDocument();
    expect(seen.map(({ url }) => url.search)).toEqual(['?list=current&limit=50']);
  });

  it('links each name to its record', async () => {
    answer('GET /api/patients', page([listed(1)]));
    renderApp('/patients', coordinator);
    expect(await screen.findByRole('link', { name: 'Brask 1, Leland' })).toHaveAttribute(
      'href',
      `/patients/${listed(1).id}`,
    );
  });

  it('searches once typing rests, for the whole of what was typed', async () => {
    const seen = answer('GET /api/patients', page([listed(1), listed(2)]), page([listed(2)]));
    const { user } = renderApp('/patients', coordinator);
    await screen.findByRole('link', { name: 'Brask 1, Leland' });
    await user.keyboard('/');
    expect(screen.getByRole('searchbox', { name: 'Find a patient' })).toHaveFocus();
    await user.keyboard('brask 2');
    await waitFor(() => expect(screen.queryByRole('link', { name: 'Brask 1, Leland' })).not.toBeInTheDocument());
    expect(seen.map(({ url }) => url.searchParams.get('search'))).toEqual([null, 'brask 2']);
    await user.keyboard('{ArrowDown}');
    expect(screen.getByRole('link', { name: 'Brask 2, Leland' })).toHaveFocus();
  });

  it('moves from name to name with the arrow keys', async () => {
    answer('GET /api/patients', page([listed(1), listed(2)]));
    const { user } = renderApp('/patients', coordinator);
    (await screen.findByRole('link', { name: 'Brask 1, Leland' })).focus();
    await user.keyboard('{ArrowDown}');
    expect(screen.getByRole('link', { name: 'Brask 2, Leland' })).toHaveFocus();
    await user.keyboard('{ArrowUp}{ArrowUp}');
    expect(screen.getByRole('link', { name: 'Brask 1, Leland' })).toHaveFocus();
  });

  it('adds the next page below, by the cursor', async () => {
    const seen = answer('GET /api/patients', page([listed(1)], 'after-1'), page([listed(2)]));
    const { user } = renderApp('/patients', coordinator);
    await user.click(await screen.findByRole('button', { name: 'Show more' }));
    expect(await screen.findByRole('link', { name: 'Brask 2, Leland' })).toBeVisible();
    expect(screen.getByRole('link', { name: 'Brask 1, Leland' })).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Show more' })).not.toBeInTheDocument();
    expect(seen[1]?.url.searchParams.get('cursor')).toBe('after-1');
  });

  it('changes the list in the address', async () => {
    const seen = answer('GET /api/patients', page([listed(1)]), page([]));
    const { user, address } = renderApp('/patients', coordinator);
    await user.click(await screen.findByRole('link', { name: 'Finished' }));
    expect(await screen.findByText('No one has finished a program yet.')).toBeVisible();
    expect(address()).toBe('/patients?list=finished');
    expect(seen.at(-1)?.url.searchParams.get('list')).toBe('finished');
  });

  it('offers the first patient in the empty page, once', async () => {
    answer('GET /api/patients', page([]));
    renderApp('/patients?list=all', coordinator);
    expect(await screen.findByText('There are no patients yet.')).toBeVisible();
    expect(screen.getAllByRole('link', { name: 'New patient' })).toHaveLength(1);
  });

  it('says what happened when the list cannot be loaded, and tries again', async () => {
    answer(
      'GET /api/patients',
      problem('unavailable', 'The server is busy or restarting. Nothing was lost.'),
      page([listed(1)]),
    );
    const { user } = renderApp('/patients', coordinator);
    expect(await screen.findByRole('alert')).toHaveTextContent('The list could not be loaded. The server is busy');
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByRole('link', { name: 'Brask 1, Leland' })).toBeVisible();
  });

  it('offers a new patient only to who may add one', async () => {
    answer('GET /api/patients', page([listed(1)]));
    renderApp('/patients', reader);
    await screen.findByRole('link', { name: 'Brask 1, Leland' });
    expect(screen.queryByRole('link', { name: 'New patient' })).not.toBeInTheDocument();
  });

  it('shows nothing of an area the person does not have', async () => {
    renderApp('/clinic/users', coordinator);
    expect(await screen.findByRole('heading', { name: 'Nothing at this address' })).toBeVisible();
  });
});
