import type { FileEntry } from '@slighthill/shared/contracts/file-entry';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { Component as FilePage } from '../file-page';
import { plan } from '../testing/record-api';
import { idOf, ruth } from '../testing/record-data';
import { planQuietRecord, renderRecord } from '../testing/render-record';
import { FileEntryDrawer } from './file-entry-drawer';
import { emptyFileForm, checkFileEntry, type FileForm } from './file-form';
import { formOfEntry } from './form-of-entry';

const zone = 'America/Denver';

const entryOf = (changes: Partial<FileEntry>): FileEntry => ({
  id: idOf(401),
  patientId: ruth.id,
  kind: 'safety-hold',
  on: '2026-10-01',
  details: { item: 'rest-heart-rate' },
  note: null,
  recordedBy: { id: idOf(1), displayName: 'Jo Ferris' },
  recordedAt: '2026-10-01T17:00:00Z',
  version: 1,
  voided: null,
  released: null,
  ...changes,
});

const filled: Partial<FileForm>[] = [
  { kind: 'diagnosis', diagnosisGroup: 'copd', confirmedBy: 'Dr. Farrow' },
  { kind: 'exacerbation', steroid: true },
  { kind: 'oxygen-order', walkingLpm: '2', device: 'cylinder', prescriber: 'Dr. Lund', outside: true },
  { kind: 'medicine', name: 'Tiotropium', medicineClass: 'long-acting-antimuscarinic', lastDoseAt: '2026-10-14T08:00' },
  { kind: 'heart-rhythm', atrialFibrillation: 'no' },
  { kind: 'smoking', status: 'former', packYears: '30', quitOn: '2015-03-01' },
  { kind: 'safety-hold', item: 'acute-illness' },
];

describe('the form of a file entry', () => {
  it.each(filled.map((form) => [form.kind, form] as const))(
    '%s is sent by its contract and read back',
    (_kind, form) => {
      const typed = { ...emptyFileForm('2026-10-14', idOf(9), '', false), ...form };
      const { issues, body } = checkFileEntry(typed, zone);
      expect(issues).toEqual([]);
      const stored = entryOf({ id: idOf(9), kind: body!.kind, on: body!.on, details: body!.details });
      expect(formOfEntry(stored, zone)).toEqual(typed);
    },
  );

  it('wants what a kind needs', () => {
    const empty = emptyFileForm('2026-10-14', idOf(9), '', true);
    const paths = (kind: FileForm['kind']) => checkFileEntry({ ...empty, kind }, zone).issues.map(({ path }) => path);
    expect(paths('')).toEqual(['kind']);
    expect(paths('oxygen-order')).toEqual(['restLpm', 'device', 'prescriber']);
    expect(paths('heart-rhythm')).toEqual(['atrialFibrillation']);
    expect(paths('safety-hold')).toEqual(['item']);
  });
});

describe('the File section', () => {
  it('records an outside oxygen order where the person may not order', async () => {
    planQuietRecord();
    const sent = plan('POST /api/patients/:id/file-entries', { entry: entryOf({ kind: 'oxygen-order' }) });
    const onSaved = vi.fn();
    const { user } = renderRecord(<FileEntryDrawer patient={ruth} onSaved={onSaved} onClose={vi.fn()} />);
    await user.selectOptions(await screen.findByLabelText('What to enter'), 'oxygen-order');
    expect(screen.getByText(/Only a pulmonologist orders oxygen here/)).toBeVisible();
    await user.type(screen.getByLabelText('Walking'), '2');
    await user.selectOptions(screen.getByLabelText('Device'), 'cylinder');
    await user.type(screen.getByLabelText('Prescriber'), 'Dr. Lund');
    await user.click(screen.getByRole('button', { name: 'Save entry' }));
    await waitFor(() => expect(onSaved).toHaveBeenCalledOnce());
    expect(sent[0]?.body).toMatchObject({
      kind: 'oxygen-order',
      details: { walkingLpm: 2, restLpm: null, device: 'cylinder', prescriber: 'Dr. Lund', outside: true },
    });
  });

  it('groups entries, holds first, and releases one with a reason', async () => {
    const hold = entryOf({});
    const smoking = entryOf({
      id: idOf(402),
      kind: 'smoking',
      details: { status: 'never', packYears: null, quitOn: null },
    });
    const released = {
      at: '2026-10-14T16:26:00Z',
      by: { id: idOf(2), displayName: 'Dr. Lund' },
      reason: 'Rate 92 today',
    };
    plan('GET /api/patients/:id', { patient: { ...ruth, abilities: ['release-hold'] } });
    plan(
      'GET /api/patients/:id/file-entries',
      { items: [smoking, hold], nextCursor: null },
      { items: [smoking, entryOf({ released })], nextCursor: null },
    );
    const sent = plan('POST /api/file-entries/:id/release', { entry: hold });
    const { user } = renderRecord(<FilePage />, '/patients/:patientId/file', `/patients/${ruth.id}/file`);
    await screen.findByRole('heading', { name: 'Safety hold' });
    expect(screen.getAllByRole('heading', { level: 3 }).map((heading) => heading.textContent)).toEqual([
      'Safety hold',
      'Smoking',
    ]);
    expect(screen.getByText('On hold')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Release Resting heart rate over 120 per minute' }));
    const dialog = screen.getByRole('dialog', { name: 'Release this hold?' });
    await user.click(within(dialog).getByRole('button', { name: 'Release it' }));
    expect(await within(dialog).findByText('The reason is missing')).toBeVisible();
    await user.type(within(dialog).getByLabelText('Why it is released'), 'Rate 92 today');
    await user.click(within(dialog).getByRole('button', { name: 'Release it' }));
    await waitFor(() => expect(sent).toHaveLength(1));
    expect(sent[0]?.body).toEqual({ version: 1, reason: 'Rate 92 today' });
    expect(await screen.findByText(/^Released .* by Dr\. Lund: Rate 92 today$/)).toBeVisible();
    expect(screen.queryByRole('button', { name: /^Release / })).not.toBeInTheDocument();
    await waitFor(() => expect(screen.getByRole('button', { name: /^History of Resting heart rate/ })).toHaveFocus());
  });

  it('offers no release to others', async () => {
    plan('GET /api/patients/:id', { patient: ruth });
    plan('GET /api/patients/:id/file-entries', { items: [entryOf({})], nextCursor: null });
    renderRecord(<FilePage />, '/patients/:patientId/file', `/patients/${ruth.id}/file`);
    expect(await screen.findByText('On hold')).toBeVisible();
    expect(screen.queryByRole('button', { name: /^Release/ })).not.toBeInTheDocument();
  });
});
