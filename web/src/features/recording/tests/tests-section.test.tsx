import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { problem } from '../../../testing/problem';
import { Component as TestDetailPage } from '../test-detail-page';
import { Component as TestsPage } from '../tests-page';
import { plan } from '../testing/record-api';
import { idOf, listedTest, ruth, spirometry } from '../testing/record-data';
import { planQuietRecord, renderRecord } from '../testing/render-record';

const detailPath = '/patients/:patientId/tests/:kind/:testId';
const at = `/patients/${ruth.id}/tests/spirometry-test/${idOf(203)}`;
const mira = { id: idOf(2), displayName: 'Mira Solberg' };

const amended = spirometry(203, { version: 2 });
const earlier = spirometry(203, { heightCm: 156 });
const revision = {
  version: 1,
  changedAt: '2026-08-25T15:00:00Z',
  changedBy: mira,
  reason: 'Height was read wrong',
  before: { ...earlier },
};

const openDetail = async () => {
  planQuietRecord();
  plan('GET /api/patients/:id', { patient: ruth });
  const { user } = renderRecord(<TestDetailPage />, detailPath, at);
  await screen.findByRole('heading', { name: 'Spirometry' });
  return user;
};

describe('the Tests section', () => {
  it('lists tests in words and names what was voided', async () => {
    plan('GET /api/patients/:id', { patient: ruth });
    plan('GET /api/patients/:id/tests', {
      items: [
        listedTest(1),
        listedTest(2, { kind: 'measurement', measure: 'cat', state: null, values: { cat: 18 }, voided: true }),
        listedTest(3, { kind: 'body-size', state: null, values: { weight: 61.5 } }),
      ],
      nextCursor: null,
    });
    renderRecord(<TestsPage />, '/patients/:patientId/tests', `/patients/${ruth.id}/tests`);
    const link = await screen.findByRole('link', { name: 'Spirometry' });
    expect(link).toHaveAttribute('href', `/patients/${ruth.id}/tests/spirometry-test/${idOf(1)}`);
    expect(screen.getByText('FEV1 1.43 L, FVC 2.40 L, after bronchodilator')).toBeVisible();
    expect(screen.getByText('165.0 cm, 61.5 kg')).toBeVisible();
    const voided = screen.getByRole('row', { name: /COPD Assessment Test/ });
    expect(within(voided).getByText('18 of 40').tagName).toBe('DEL');
    expect(within(voided).getByText('Voided')).toBeVisible();
  });

  it('gets further pages on request', async () => {
    plan('GET /api/patients/:id', { patient: ruth });
    plan(
      'GET /api/patients/:id/tests',
      { items: [listedTest(1)], nextCursor: 'next' },
      { items: [listedTest(2, { kind: 'measurement', measure: 'cat', values: { cat: 20 } })], nextCursor: null },
    );
    const { user } = renderRecord(<TestsPage />, '/patients/:patientId/tests', `/patients/${ruth.id}/tests`);
    await user.click(await screen.findByRole('button', { name: 'Show more' }));
    expect(await screen.findByText('20 of 40')).toBeVisible();
    expect(screen.queryByRole('button', { name: 'Show more' })).not.toBeInTheDocument();
  });

  it('shows the earlier values with who, when and why', async () => {
    plan('GET /api/spirometry-tests/:id', { test: amended, history: [revision], abilities: [] });
    await openDetail();
    const history = screen.getByRole('region', { name: 'History' });
    expect(within(history).getByText('Height was read wrong')).toBeVisible();
    expect(within(history).getByText('156.0 cm, measured').tagName).toBe('DEL');
    expect(history).toHaveTextContent('now 165.0 cm, measured');
    expect(history).toHaveTextContent('by Mira Solberg');
    expect(screen.queryByRole('button', { name: 'Void' })).not.toBeInTheDocument();
  });

  it('voids with a reason; other needs words', async () => {
    plan('GET /api/spirometry-tests/:id', { test: amended, history: [], abilities: ['amend', 'void'] });
    const sent = plan('POST /api/spirometry-tests/:id/void', { test: amended, history: [], abilities: [] });
    const user = await openDetail();
    await user.click(screen.getByRole('button', { name: 'Void' }));
    const dialog = screen.getByRole('dialog', { name: 'Void this spirometry test?' });
    await user.click(within(dialog).getByRole('button', { name: 'Void it' }));
    expect(await within(dialog).findByText('Choose a reason')).toBeVisible();
    await user.click(within(dialog).getByRole('radio', { name: 'Other' }));
    await user.click(within(dialog).getByRole('button', { name: 'Void it' }));
    expect(await within(dialog).findByText('Say why in a few words')).toBeVisible();
    expect(sent).toHaveLength(0);
    await user.type(within(dialog).getByLabelText(/In words/), 'Leak at the mouthpiece');
    await user.click(within(dialog).getByRole('button', { name: 'Void it' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
    expect(sent[0]?.body).toEqual({ version: 2, reason: 'other', text: 'Leak at the mouthpiece' });
  });

  it('amends on the version that was opened; after a conflict it shows the newest and keeps what is typed', async () => {
    const newest = spirometry(203, { version: 3, weightKg: 64 });
    plan(
      'GET /api/spirometry-tests/:id',
      { test: amended, history: [], abilities: ['amend'] },
      { test: newest, history: [], abilities: ['amend'] },
    );
    const sent = plan(
      'POST /api/spirometry-tests/:id/amend',
      problem('stale-version', 'Someone changed this since you opened it.'),
      { test: newest, history: [], abilities: [] },
    );
    const user = await openDetail();
    await user.click(screen.getByRole('button', { name: 'Amend' }));
    const reason = await screen.findByLabelText('Why it is amended');
    await user.click(screen.getByRole('button', { name: 'Save amendment' }));
    expect(await screen.findByText('Say why in a few words')).toBeVisible();
    expect(sent).toHaveLength(0);
    await user.click(reason);
    await user.paste('FVC was misread');
    const fvc = screen.getByLabelText('Maneuver 1, FVC in L');
    await user.clear(fvc);
    await user.type(fvc, '2.50');
    await user.click(screen.getByRole('button', { name: 'Save amendment' }));
    expect(await screen.findByText(/Newest in the record/)).toBeVisible();
    expect(screen.getByText(/now 64\.0 kg/)).toBeVisible();
    expect(fvc).toHaveValue('2.50');
    await user.click(screen.getByRole('button', { name: 'Save amendment' }));
    await waitFor(() => expect(sent).toHaveLength(2));
    expect(sent.map(({ body }) => body?.version)).toEqual([2, 3]);
    expect(sent[1]?.body).toMatchObject({ reason: 'FVC was misread', maneuvers: [{ fev1: 1.43, fvc: 2.5 }] });
    expect(sent[1]?.body).not.toHaveProperty('best');
  });
});
