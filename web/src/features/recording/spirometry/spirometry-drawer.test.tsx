import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { problem } from '../../../testing/problem';
import { plan } from '../testing/record-api';
import { draftOf, idOf, listedTest, ruth, spirometry } from '../testing/record-data';
import { planQuietRecord, renderRecord } from '../testing/render-record';
import { SpirometryDrawer } from './spirometry-drawer';
import { emptySpirometryForm } from './spirometry-form';

const open = async () => {
  const onSaved = vi.fn();
  const onClose = vi.fn();
  const { user } = renderRecord(<SpirometryDrawer patient={ruth} onSaved={onSaved} onClose={onClose} />);
  const height = await screen.findByLabelText('Height');
  const cell = (row: number, name: string) => screen.getByLabelText(`Maneuver ${row}, ${name}`);
  const put = async (field: HTMLElement, text: string) => {
    await user.click(field);
    await user.paste(text);
  };
  const blow = async (row: number, fev1: string, fvc: string) => {
    await put(cell(row, 'FEV1 in L'), fev1);
    await put(cell(row, 'FVC in L'), fvc);
  };
  const save = () => user.click(screen.getByRole('button', { name: /Save test|Try again/ }));
  return { user, onSaved, onClose, height, cell, put, blow, save };
};

const pairAnswer = {
  tests: [spirometry(601, { bronchodilator: 'before' }), spirometry(602)] as [
    ReturnType<typeof spirometry>,
    ReturnType<typeof spirometry>,
  ],
};

describe('the spirometry drawer', () => {
  it('asks whether 65 cm was inches, uses the earlier height meanwhile and takes the offered answer', async () => {
    const { predicted } = planQuietRecord();
    const { user, height, blow } = await open();
    await user.type(height, '65');
    expect(await screen.findByText('65 cm. Did you mean 65 inches (165.1 cm)?')).toBeVisible();
    expect(screen.getByText('Until you answer, percent predicted uses 165.0 cm from Aug 24.')).toBeVisible();
    expect(screen.getByText('1 question open')).toBeVisible();
    await blow(1, '1.38', '2.36');
    await waitFor(() =>
      expect(predicted.at(-1)?.body).toMatchObject({ heightCm: 165, values: { fev1: 1.38, fvc: 2.36 } }),
    );
    await user.click(screen.getByRole('button', { name: 'Yes, 165.1 cm' }));
    expect(height).toHaveValue('165.1');
    expect(height).toHaveFocus();
    await waitFor(() => expect(predicted.at(-1)?.body).toMatchObject({ heightCm: 165.1 }));
    expect(screen.queryByText(/Did you mean/)).not.toBeInTheDocument();
  });

  it('does not save while a question is open: it goes to its field', async () => {
    planQuietRecord();
    const sent = plan('POST /api/patients/:id/spirometry-tests', { test: spirometry(601) });
    const { user, put, height, blow, save, onSaved } = await open();
    await put(height, '165');
    await blow(1, '2.40', '2.40');
    expect(await screen.findByText('Before, maneuver 1: FEV1 equals FVC (2.40 L). Is that right?')).toBeVisible();
    await save();
    expect(screen.getByLabelText('Maneuver 1, FVC in L')).toHaveFocus();
    expect(sent).toHaveLength(0);
    await user.click(screen.getByRole('button', { name: 'Yes, it is right' }));
    await save();
    await waitFor(() => expect(onSaved).toHaveBeenCalledOnce());
    expect(sent[0]?.body).toMatchObject({ bronchodilator: 'before', maneuvers: [{ fev1: 2.4, fvc: 2.4 }] });
  });

  it('refuses an FEV1 above its FVC in words', async () => {
    planQuietRecord();
    const { user, put, height, blow, cell, save } = await open();
    await put(height, '165');
    await blow(1, '3.24', '3.10');
    await user.tab();
    expect(await screen.findByText('Maneuver 1: FEV1 cannot be more than FVC (3.10 L)')).toBeVisible();
    expect(cell(1, 'FEV1 in L')).toBeInvalid();
    await save();
    expect(cell(1, 'FEV1 in L')).toHaveFocus();
  });

  it('sends both sets as one pair and says where they went', async () => {
    planQuietRecord();
    const sent = plan('POST /api/patients/:id/spirometry-tests', pairAnswer);
    const { user, put, height, blow, save, onSaved } = await open();
    await put(height, '165');
    await put(screen.getByLabelText('Drug'), 'Albuterol');
    await blow(1, '1.38', '2.36');
    await user.click(screen.getByRole('tab', { name: /After bronchodilator/ }));
    await blow(1, '1.46', '2.41');
    await blow(2, '1.41', '2.47');
    await save();
    await waitFor(() => expect(onSaved).toHaveBeenCalledOnce());
    const { tests } = sent[0]?.body as { tests: Record<string, unknown>[] };
    expect(tests.map((test) => [test.bronchodilator, test.drug])).toEqual([
      ['before', null],
      ['after', 'Albuterol'],
    ]);
    expect(tests[0]?.visitId).toBe(tests[1]?.visitId);
    expect(tests[1]?.maneuvers).toHaveLength(2);
    expect(onSaved).toHaveBeenCalledWith({
      words: 'Spirometry before and after is in Tests',
      to: `/patients/${ruth.id}/tests`,
    });
  });

  it('works the result out while typing, and never gives the ratio a percent predicted', async () => {
    planQuietRecord();
    const { put, height, blow } = await open();
    await put(height, '165');
    await blow(1, '1.46', '2.47');
    const panel = screen.getByRole('region', { name: 'Best of this test' });
    expect(await within(panel).findByText('63%')).toBeVisible();
    expect(within(panel).getByText('Moderate, 60 to under 70')).toBeVisible();
    expect(within(panel).getByText('ATS/ERS 2005')).toBeVisible();
    const ratio = within(panel).getByRole('row', { name: /FEV1\/FVC/ });
    expect(ratio).toHaveTextContent('0.59');
    expect(ratio).not.toHaveTextContent('%');
    expect(within(panel).getByText(/GLI Global 2022, age 65\.\d, 165\.0 cm\./)).toBeVisible();
  });

  it('strikes through a value that is not used and takes the next best', async () => {
    planQuietRecord();
    const { user, put, height, blow, cell } = await open();
    await put(height, '165');
    await blow(1, '1.44', '2.44');
    await blow(2, '1.49', '2.39');
    expect(cell(2, 'FEV1 in L')).toHaveClass('bg-tarn-wash');
    await user.click(cell(2, 'FEV1 used'));
    expect(cell(2, 'FEV1 in L')).toHaveClass('line-through');
    expect(cell(1, 'FEV1 in L')).toHaveClass('bg-tarn-wash');
  });

  it('goes down a column with Enter and across with Tab', async () => {
    planQuietRecord();
    const { user, cell } = await open();
    await user.click(cell(1, 'FEV1 in L'));
    await user.keyboard('{Enter}');
    expect(cell(2, 'FEV1 in L')).toHaveFocus();
    await user.tab();
    expect(cell(2, 'FVC in L')).toHaveFocus();
  });

  it('asks when a result is far from the last one', async () => {
    planQuietRecord();
    plan('GET /api/patients/:id/tests', {
      items: [listedTest(7, { voided: true, values: { fev1: 1 } }), listedTest(8)],
      nextCursor: null,
    });
    const { put, height, blow } = await open();
    await put(height, '165');
    await blow(1, '1.90', '2.60');
    expect(await screen.findByText('FEV1 1.90 L is 33% above the last, 1.43 L on Aug 24. Is it right?')).toBeVisible();
  });

  it('keeps a draft, and gives it back when it is opened again', async () => {
    const { kept } = planQuietRecord();
    const first = await open();
    await first.put(first.height, '165');
    await first.user.click(screen.getByRole('button', { name: 'Keep as draft' }));
    await waitFor(() => expect(first.onClose).toHaveBeenCalledOnce());
    expect(kept.at(-1)?.body).toMatchObject({ content: { heightCm: '165' } });
  });

  it('restores a kept draft and starts over on request', async () => {
    const { discarded } = planQuietRecord();
    const draft = emptySpirometryForm('2026-10-14T10:20', () => idOf(900));
    draft.before.rows[0]!.fev1 = '1.4';
    plan('GET /api/drafts/:form/:id', { draft: draftOf({ ...draft, heightCm: '164' }) });
    const { user, height, cell } = await open();
    expect(height).toHaveValue('164');
    expect(cell(1, 'FEV1 in L')).toHaveValue('1.4');
    expect(screen.getByText('Draft kept 10:26 am.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Start over' }));
    await waitFor(() => expect(screen.getByLabelText('Height')).toHaveValue(''));
    expect(discarded).toHaveLength(1);
  });

  it('keeps the numbers and the id when saving fails, and takes the draft away once it is saved', async () => {
    const { discarded } = planQuietRecord();
    const sent = plan('POST /api/patients/:id/spirometry-tests', 'unreachable', { test: spirometry(601) });
    const { put, height, blow, cell, save, onSaved } = await open();
    await put(height, '165');
    await blow(1, '1.38', '2.36');
    await save();
    expect(
      await screen.findByText('Not saved. Your numbers are here. The server could not be reached. Try again.'),
    ).toBeVisible();
    expect(cell(1, 'FEV1 in L')).toHaveValue('1.38');
    expect(screen.getByRole('button', { name: 'Try again' })).toBeVisible();
    await save();
    await waitFor(() => expect(onSaved).toHaveBeenCalledOnce());
    expect(sent[1]?.body?.id).toBe(sent[0]?.body?.id);
    expect(sent[1]?.body).toEqual(sent[0]?.body);
    await waitFor(() => expect(discarded).toHaveLength(1));
  });

  it('puts what the server refuses at its row, although empty rows were left out', async () => {
    planQuietRecord();
    plan(
      'POST /api/patients/:id/spirometry-tests',
      problem('invalid-input', 'Some fields need another look.', [
        { path: 'maneuvers.1.fvc', message: 'Too far from the others' },
      ]),
    );
    const { user, put, height, blow, cell, save } = await open();
    await put(height, '165');
    await blow(1, '1.38', '2.36');
    await blow(3, '1.39', '2.30');
    await save();
    expect(await screen.findByText('Maneuver 3: Too far from the others')).toBeVisible();
    expect(screen.getByText('Not saved. Your numbers are here. See the marked fields.')).toBeVisible();
    expect(cell(3, 'FVC in L')).toHaveFocus();
    // A field must change first, so trying the same again is not what the button offers.
    expect(screen.getByRole('button', { name: 'Save test' })).toBeVisible();
    await user.keyboard('{End}5');
    await waitFor(() => expect(screen.queryByText('Maneuver 3: Too far from the others')).not.toBeInTheDocument());
  });
});
