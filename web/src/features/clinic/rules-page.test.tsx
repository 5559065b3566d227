import type { Clinic } from '@slighthill/shared/contracts/clinic';
import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { answer } from '../../testing/answer';
import { administrator } from '../../testing/people';
import { problem } from '../../testing/problem';
import { renderApp } from '../../testing/render-app';

const clinic: Clinic = { ...administrator.clinic, version: 4 };

describe('rules page', () => {
  it('saves the changed rules with the version they were read at, and says so', async () => {
    answer('GET /api/clinic', { clinic }, { clinic: { ...clinic, ratioRule: 'lln', version: 5 } });
    const seen = answer('PATCH /api/clinic', { clinic: { ...clinic, ratioRule: 'lln', version: 5 } });
    const { user } = renderApp('/clinic/rules', administrator);
    await user.click(await screen.findByRole('radio', { name: /^LLN/ }));
    await user.clear(screen.getByLabelText('TLC counts with spirometry within'));
    await user.type(screen.getByLabelText('TLC counts with spirometry within'), '90');
    await user.click(screen.getByRole('button', { name: 'Save rules' }));
    expect(await screen.findByText('Saved. Grades shown from now on follow these rules.')).toBeVisible();
    expect(seen[0]?.body).toEqual({
      version: 4,
      name: 'Alder Falls',
      timeZone: 'America/Denver',
      phone: '555-0142',
      ratioRule: 'lln',
      fev1SeverityRule: 'ats-ers-2005',
      tlcSeverityRule: 'tlc-percent',
      tlcWindowDays: 90,
    });
  });

  it('does not turn an emptied field into 0', async () => {
    answer('GET /api/clinic', { clinic });
    const seen = answer('PATCH /api/clinic', { clinic });
    const { user } = renderApp('/clinic/rules', administrator);
    await user.clear(await screen.findByLabelText('TLC counts with spirometry within'));
    await user.click(screen.getByRole('button', { name: 'Save rules' }));
    await waitFor(() => expect(screen.getByLabelText('TLC counts with spirometry within')).toBeInvalid());
    expect(seen).toHaveLength(0);
  });

  it('says that someone else changed the rules, and keeps what was chosen', async () => {
    answer('GET /api/clinic', { clinic });
    answer(
      'PATCH /api/clinic',
      problem('stale-version', 'Someone changed this since you opened it. Nothing was stored.'),
    );
    const { user } = renderApp('/clinic/rules', administrator);
    await user.click(await screen.findByRole('radio', { name: /^LLN/ }));
    await user.click(screen.getByRole('button', { name: 'Save rules' }));
    expect(await screen.findByText(/Not saved. Someone changed this since you opened it/)).toBeVisible();
    expect(screen.getByRole('radio', { name: /^LLN/ })).toBeChecked();
  });
});
