import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { answer } from '../testing/answer';
import { coordinator, listed } from '../testing/people';
import { problem } from '../testing/problem';
import { renderApp } from '../testing/render-app';

const openList = async () => {
  answer('GET /api/patients', { items: [listed(1)], nextCursor: null });
  answer('GET /api/patients/:id', problem('not-found', 'There is nothing at this address.'));
  const app = renderApp('/patients', coordinator);
  await screen.findByRole('table');
  return app;
};

describe('the focus when the page changes', () => {
  it('stays where the browser starts on the first page', async () => {
    await openList();
    expect(document.body).toHaveFocus();
  });

  it("goes to the next page's heading, also when that comes later", async () => {
    const { user } = await openList();
    await user.click(document.querySelector('[data-row-link]')!);
    const heading = await screen.findByRole('heading', { level: 1, name: 'There is no such record' });
    await waitFor(() => expect(heading).toHaveFocus());
    expect(heading).toHaveAttribute('tabindex', '-1');
  });

  it('leaves a drawer its own focus and lets it give it back', async () => {
    const { user, address } = await openList();
    await user.click(screen.getByRole('link', { name: 'New patient' }));
    await waitFor(async () => expect(await screen.findByLabelText('Given name')).toHaveFocus());
    await user.keyboard('{Escape}');
    await waitFor(() => expect(address()).toBe('/patients'));
    await waitFor(() => expect(screen.getByRole('link', { name: 'New patient' })).toHaveFocus());
  });
});
