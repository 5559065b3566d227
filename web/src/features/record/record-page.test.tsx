import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aTrendResponse } from '../../charts/testing/trend-fixture';
import { problem } from '../../testing/problem';
import { courseWords } from './record-words';
import { aFlag, aPatient } from './testing/record-fixture';
import { renderRecord } from './testing/render-record';

const patient = aPatient();
const details = `/patients/${patient.id}/details`;
const program = {
  id: '00000000-0000-4000-8000-000000000050',
  name: 'Standard course',
  plannedSessions: 24,
  weeks: 12,
  sessionsPerDay: 1,
  sessionsPerWeek: 2,
  sessionKinds: ['exercise' as const],
  retired: false,
  version: 1,
};

describe('standing header', () => {
  it('says who this is, the course, the oxygen and the sections', async () => {
    renderRecord(details, { patient });
    expect(await screen.findByRole('heading', { level: 1, name: 'Leland Brask' })).toBeVisible();
    const header = screen.getByRole('banner');
    expect(header).toHaveTextContent('67, born Mar 2, 1959');
    expect(header).toHaveTextContent('COPD');
    expect(header).toHaveTextContent('Since Sep 14, 24 sessions');
    expect(header).toHaveTextContent('2 L/min when walking');
    const sections = within(screen.getByRole('navigation', { name: 'Sections of the record' }));
    expect(sections.getAllByRole('link').map((link) => link.textContent)).toEqual([
      'Summary',
      'Tests7',
      'File4',
      'Details',
    ]);
    expect(sections.getByRole('link', { name: 'Details' })).toHaveAttribute('aria-current', 'page');
  });

  it('offers Record only to whoever may record', async () => {
    renderRecord(details, { patient: aPatient({ abilities: [] }) });
    await screen.findByRole('heading', { level: 1 });
    expect(screen.queryByRole('button', { name: 'Record' })).toBeNull();
    expect(screen.queryByRole('button', { name: 'Edit patient' })).toBeNull();
    expect(screen.queryByRole('button', { name: 'Change enrollment' })).toBeNull();
  });

  it('opens a flag and resolves it only with a note', async () => {
    const flag = aFlag(1);
    const { user, seen } = renderRecord(details, { patient, writes: { [`/api/flags/${flag.id}/resolve`]: { flag } } });
    await user.click(await screen.findByRole('button', { name: flag.label }));
    const card = within(screen.getByRole('dialog', { name: flag.label }));
    expect(card.getByText(flag.detail)).toBeVisible();
    await user.click(card.getByRole('button', { name: 'Resolve flag' }));
    expect(card.getByText('Write what was done before resolving it')).toBeVisible();
    expect(seen.some((entry) => entry.method === 'POST')).toBe(false);
    await user.type(card.getByRole('textbox', { name: 'What was done' }), 'Spoke with him, safe plan agreed');
    await user.click(card.getByRole('button', { name: 'Resolve flag' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).toBeNull());
    expect(seen.find((entry) => entry.method === 'POST')?.body).toEqual({
      version: 1,
      note: 'Spoke with him, safe plan agreed',
    });
  });

  it('gives the focus to the name when the resolved flag is gone', async () => {
    const flag = aFlag(1);
    const world = { patient, writes: { [`/api/flags/${flag.id}/resolve`]: { flag } } };
    const { user } = renderRecord(details, world);
    await user.click(await screen.findByRole('button', { name: flag.label }));
    const card = within(screen.getByRole('dialog', { name: flag.label }));
    await user.type(card.getByRole('textbox', { name: 'What was done' }), 'Spoke with him');
    world.patient = aPatient({ openFlags: [] });
    await user.click(card.getByRole('button', { name: 'Resolve flag' }));
    await waitFor(() => expect(screen.queryByRole('button', { name: flag.label })).toBeNull());
    await waitFor(() => expect(screen.getByRole('heading', { level: 1, name: 'Leland Brask' })).toHaveFocus());
  });

  it('shows an open safety hold, also without the flags, and leads to the file', async () => {
    const { unmount } = renderRecord(details, { patient: aPatient({ openHolds: 1, openFlags: [] }) });
    const hold = await screen.findByRole('link', { name: 'Exercise on hold' });
    expect(hold).toHaveAttribute('href', `/patients/${patient.id}/file`);
    unmount();
    renderRecord(details, { patient });
    await screen.findByRole('heading', { level: 1 });
    expect(screen.queryByRole('link', { name: 'Exercise on hold' })).toBeNull();
  });

  it('leads from "Not enrolled" to the button that enrolls, for those who may', async () => {
    const { user, unmount } = renderRecord(`/patients/${patient.id}/summary`, {
      patient: aPatient({ enrollment: null }),
      trends: [aTrendResponse()],
    });
    await user.click(await screen.findByRole('link', { name: 'Not enrolled' }));
    await waitFor(() => expect(screen.getByRole('button', { name: 'Enroll in a program' })).toHaveFocus());
    unmount();
    renderRecord(details, { patient: aPatient({ enrollment: null, abilities: [] }) });
    expect(await screen.findByText('Not enrolled')).toBeVisible();
    expect(screen.queryByRole('link', { name: 'Not enrolled' })).toBeNull();
  });

  it('does not say that a planned course starts on a day that has passed', () => {
    const { enrollment } = patient;
    const planned = enrollment && { ...enrollment, status: 'planned' as const, startOn: '2026-06-04' };
    expect(courseWords(planned, '2026-06-04')).toBe('Starts Jun 4, 24 sessions');
    expect(courseWords(planned, '2026-06-05')).toBe('Planned, Jun 4, 24 sessions');
  });

  it('folds more than three flags, safety first, and lets nobody resolve without the ability', async () => {
    const openFlags = [4, 5, 1, 2].map((number) =>
      aFlag(
        number,
        number > 3 ? { severity: 'attention', label: `Height changed ${number}` } : { label: `Safety ${number}` },
      ),
    );
    const { user } = renderRecord(details, { patient: aPatient({ openFlags, abilities: [] }) });
    const list = within(await screen.findByRole('list', { name: 'Open flags' }));
    expect(list.getAllByRole('button').map((chip) => chip.textContent)).toEqual(['Safety 1', 'Safety 2', '2 more']);
    await user.click(list.getByRole('button', { name: '2 more' }));
    expect(screen.getByText('Height changed 5')).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Resolve flag' })).toBeNull();
  });

  it('says that there is no such record', async () => {
    renderRecord(details, { patient: problem('not-found', 'This patient was not found.') });
    expect(await screen.findByRole('heading', { name: 'There is no such record' })).toBeVisible();
    expect(screen.getByRole('link', { name: 'Go to Patients' })).toHaveAttribute('href', '/patients');
  });
});

describe('details', () => {
  it('enrolls in a program', async () => {
    const notEnrolled = aPatient({ enrollment: null });
    const path = `/api/patients/${patient.id}/enrollments`;
    const world = {
      patient: notEnrolled,
      programs: [
        program,
        { ...program, id: '00000000-0000-4000-8000-000000000051', name: 'Old course', retired: true },
      ],
      writes: { [path]: { enrollment: aPatient().enrollment } },
    };
    const { user, seen } = renderRecord(details, world);
    expect(await screen.findByText('Not enrolled in a program yet.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Enroll in a program' }));
    const drawer = within(await screen.findByRole('dialog', { name: 'Enroll in a program' }));
    await drawer.findByRole('option', { name: 'Standard course' });
    expect(drawer.queryByRole('option', { name: 'Old course' })).toBeNull();
    await user.click(drawer.getByRole('button', { name: 'Enroll' }));
    expect(await drawer.findByText('Choose a program')).toBeVisible();
    await user.selectOptions(drawer.getByRole('combobox', { name: 'Program' }), 'Standard course');
    world.patient = aPatient();
    await user.click(drawer.getByRole('button', { name: 'Enroll' }));
    expect(await screen.findByText('Enrolled in Standard course')).toBeVisible();
    // Its button is gone, so the focus is on the section's heading.
    await waitFor(() => expect(screen.getByRole('heading', { name: 'Enrollment' })).toHaveFocus());
    const sent = seen.find((entry) => entry.path === path)?.body as Record<string, unknown>;
    expect(sent).toMatchObject({ programId: program.id, consentOn: null });
    expect(sent.id).toMatch(/^[0-9a-f-]{36}$/);
    expect(sent.startOn).toMatch(/^\d{4}-\d{2}-\d{2}$/);
  });

  it('asks why an enrollment is paused', async () => {
    const path = `/api/enrollments/${patient.enrollment?.id}`;
    const { user, seen } = renderRecord(details, { patient, writes: { [path]: { enrollment: patient.enrollment } } });
    await user.click(await screen.findByRole('button', { name: 'Change enrollment' }));
    const drawer = within(await screen.findByRole('dialog', { name: 'Change enrollment' }));
    await user.click(drawer.getByRole('radio', { name: 'Paused' }));
    await user.click(drawer.getByRole('button', { name: 'Save changes' }));
    expect(await drawer.findByText('Say why in a few words')).toBeVisible();
    expect(seen.some((entry) => entry.method === 'PATCH')).toBe(false);
    await user.type(drawer.getByRole('textbox', { name: 'Reason' }), 'Chest infection');
    await user.click(drawer.getByRole('button', { name: 'Save changes' }));
    expect(await screen.findByText('Enrollment changed')).toBeVisible();
    await waitFor(() => expect(screen.getByRole('button', { name: 'Change enrollment' })).toHaveFocus());
    expect(seen.find((entry) => entry.path === path)?.body).toMatchObject({
      version: 2,
      status: 'paused',
      reason: 'Chest infection',
    });
  });

  it('keeps what was typed when someone else changed the patient', async () => {
    const path = `/api/patients/${patient.id}`;
    const { user, seen } = renderRecord(details, {
      patient,
      writes: { [path]: { ...problem('stale-version', 'Someone changed this since you opened it.') } },
    });
    await user.click(await screen.findByRole('button', { name: 'Edit patient' }));
    const drawer = within(await screen.findByRole('dialog', { name: 'Edit patient' }));
    const phone = drawer.getByRole('textbox', { name: 'Phone optional' });
    await user.clear(phone);
    await user.type(phone, '555-0199');
    await user.click(drawer.getByRole('button', { name: 'Save changes' }));
    expect(await drawer.findByText(/Not saved: someone changed this since you opened it/)).toBeVisible();
    expect(phone).toHaveValue('555-0199');
    expect(seen.find((entry) => entry.method === 'PATCH')?.body).toMatchObject({ version: 3, phone: '555-0199' });
  });
});

describe('trends and header together', () => {
  it('opens the summary beside the header', async () => {
    renderRecord(`/patients/${patient.id}/summary`, { patient, trends: [aTrendResponse()] });
    expect(await screen.findByRole('heading', { name: 'Obstructive pattern, severe' })).toBeVisible();
    expect(screen.getByRole('heading', { level: 1, name: 'Leland Brask' })).toBeVisible();
  });
});
