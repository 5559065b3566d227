import { screen, waitFor } from '@testing-library/react';
import { Link } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { RecordMenu } from './record-menu';
import { plan } from './testing/record-api';
import { draftOf, idOf, ruth } from './testing/record-data';
import { planQuietRecord, renderRecord } from './testing/render-record';

const menu = (
  <>
    <RecordMenu patient={ruth} />
    <Link to="?view=table">Another view</Link>
  </>
);

const openBodySize = async () => {
  const { user } = renderRecord(menu);
  await user.click(screen.getByRole('button', { name: 'Record' }));
  await user.click(await screen.findByRole('menuitem', { name: /Body size/ }));
  await user.type(await screen.findByLabelText(/^Weight/), '61.5');
  return user;
};

describe('what the record menu says afterward', () => {
  it('tells that a draft was kept, and when', async () => {
    planQuietRecord();
    plan('PUT /api/drafts/:form/:id', { draft: draftOf({}) });
    const user = await openBodySize();
    await user.click(screen.getByRole('button', { name: 'Keep as draft' }));
    await waitFor(() => expect(screen.queryByRole('dialog')).not.toBeInTheDocument());
    expect(screen.getByText('Draft kept 10:26 am.')).toBeVisible();
    expect(screen.getByText('Not in the record yet.')).toBeVisible();
    await waitFor(() => expect(screen.getByRole('button', { name: 'Record' })).toHaveFocus());
  });

  it('says where a saved entry went until the next page', async () => {
    planQuietRecord();
    plan('POST /api/patients/:id/body-sizes', {
      bodySize: {
        id: idOf(501),
        patientId: ruth.id,
        takenAt: '2026-10-14T16:26:00Z',
        takenOn: '2026-10-14',
        bmi: null,
        heightCm: null,
        heightMethod: null,
        weightKg: 61.5,
        note: null,
        recordedBy: { id: idOf(1), displayName: 'Jo Ferris' },
        recordedAt: '2026-10-14T16:27:00Z',
        version: 1,
        voided: null,
      },
    });
    const user = await openBodySize();
    await user.click(screen.getByRole('button', { name: 'Save body size' }));
    expect(await screen.findByText(/Saved\. Body size is in Tests\./)).toBeVisible();
    expect(screen.getByRole('link', { name: 'Show it' })).toBeVisible();
    await user.click(screen.getByRole('link', { name: 'Another view' }));
    expect(screen.queryByText(/Saved\./)).not.toBeInTheDocument();
  });
});
