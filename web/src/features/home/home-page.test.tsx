import { screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { answer } from '../../testing/answer';
import { patientUser } from '../../testing/people';
import { problem } from '../../testing/problem';
import { renderApp } from '../../testing/render-app';

const home = {
  givenName: 'Leland',
  clinic: { name: 'Alder Falls', phone: '555-0142' },
  program: { name: 'Standard course', startOn: '2026-09-14', plannedSessions: 24, weeks: 12 },
};
const emergency = 'Chest pain, or much shorter of breath than usual?';

describe('patient home', () => {
  it('greets by the clinic clock and says what is so', async () => {
    vi.useFakeTimers({ toFake: ['Date'], now: new Date('2026-10-14T19:00:00Z') });
    answer('GET /api/me/home', home);
    renderApp('/home', patientUser);
    // 19:00 UTC is 1 pm in the clinic's zone.
    expect(await screen.findByRole('heading', { name: 'Good afternoon, Leland' })).toBeVisible();
    expect(screen.getByText('Standard course')).toBeVisible();
    expect(screen.getByText('24 sessions in 12 weeks')).toBeVisible();
    expect(screen.getByText('Started Monday, September 14')).toBeVisible();
    expect(screen.getByRole('link', { name: 'Call 555-0142' })).toHaveAttribute('href', 'tel:5550142');
    expect(screen.getByText(emergency)).toBeVisible();
  });

  it('keeps the emergency words when the rest cannot be loaded', async () => {
    answer('GET /api/me/home', problem('forbidden', 'You may not see this.'));
    renderApp('/home', patientUser);
    expect(await screen.findByRole('alert')).toHaveTextContent('This page could not be loaded.');
    expect(screen.getByText(emergency)).toBeVisible();
  });

  it('shows a patient nothing of the staff areas', async () => {
    renderApp('/patients', patientUser);
    expect(await screen.findByRole('heading', { name: 'Nothing at this address' })).toBeVisible();
  });
});
