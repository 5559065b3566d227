import { screen, waitFor, within } from '@testing-library/react';
import { http, HttpResponse } from 'msw';
import { beforeEach, describe, expect, it } from 'vitest';
import { answer } from '../../testing/answer';
import { coordinator, createdPatient, listed } from '../../testing/people';
import { problem } from '../../testing/problem';
import { renderApp } from '../../testing/render-app';
import { server } from '../../testing/server';

const id = '00000000-0000-4000-8000-000000000777';

const fillIn = async (user: ReturnType<typeof renderApp>['user']): Promise<void> => {
  await user.type(await screen.findByLabelText('Given name'), 'Ruth');
  await user.type(screen.getByLabelText('Family name'), ' Valdane ');
  await user.type(screen.getByLabelText('Date of birth'), '1961-05-17');
  await user.click(screen.getByRole('radio', { name: 'Female' }));
  await user.selectOptions(screen.getByLabelText('Diagnosis group'), 'COPD');
};

beforeEach(() => {
  answer('GET /api/patients', { items: [listed(1)], nextCursor: null });
  answer('POST /api/patients/duplicate-check', { items: [] });
  // The record that opens after saving has tests of its own.
  answer('GET /api/patients/:id', problem('not-found', 'There is nothing at this address.'));
});

describe('new patient', () => {
  it('saves once, with an id of its own, and opens the record', async () => {
    const seen = answer('POST /api/patients', { patient: createdPatient(id) });
    const { user, address } = renderApp('/patients/new', coordinator);
    await fillIn(user);
    await user.click(screen.getByRole('button', { name: 'Save patient' }));
    await waitFor(() => expect(address()).toMatch(`/patients/${id}`));
    expect(seen).toHaveLength(1);
    expect(seen[0]?.body).toEqual({
      id: expect.stringMatching(/^[0-9a-f-]{36}$/) as string,
      givenName: 'Ruth',
      familyName: 'Valdane',
      birthDate: '1961-05-17',
      sexForPrediction: 'female',
      diagnosisGroup: 'copd',
      recordNumber: null,
      email: null,
      phone: null,
    });
  });

  it('names every field that is missing and sends nothing', async () => {
    const seen = answer('POST /api/patients', { patient: createdPatient(id) });
    const { user } = renderApp('/patients/new', coordinator);
    await user.click(await screen.findByRole('button', { name: 'Save patient' }));
    expect(await screen.findByText('The given name is missing')).toBeVisible();
    for (const words of [
      'The family name is missing',
      'Enter the date of birth',
      'Choose the sex used in prediction equations',
      'Choose a diagnosis group',
    ])
      expect(screen.getAllByText(words).at(-1)).toBeVisible();
    expect(screen.getByLabelText('Given name')).toHaveFocus();
    expect(seen).toHaveLength(0);
  });

  it('brings the reader to the first field in error, in the order of the form', async () => {
    const { user } = renderApp('/patients/new', coordinator);
    await user.type(await screen.findByLabelText('Given name'), 'Ruth');
    await user.type(screen.getByLabelText('Family name'), 'Valdane');
    await user.type(screen.getByLabelText('Date of birth'), '1961-05-17');
    await user.click(screen.getByRole('button', { name: 'Save patient' }));
    await waitFor(() => expect(screen.getByRole('radio', { name: 'Female' })).toHaveFocus());
  });

  it('goes to the open question instead of saving; someone else lets it through', async () => {
    const known = { ...createdPatient(id), id: listed(5).id, recordNumber: 'A-5' };
    const checks = answer('POST /api/patients/duplicate-check', { items: [known] });
    const seen = answer('POST /api/patients', { patient: createdPatient(id) });
    const { user, address } = renderApp('/patients/new', coordinator);
    await fillIn(user);
    expect(await screen.findByText('Is this Ruth Valdane, born May 17, 1961, record A-5?')).toBeVisible();
    expect(checks.at(-1)?.body).toEqual({ givenName: 'Ruth', familyName: 'Valdane', birthDate: '1961-05-17' });
    await user.click(screen.getByRole('button', { name: 'Save patient' }));
    const question = screen.getByRole('group', { name: 'A patient with this name and birth date' });
    await waitFor(() => expect(question).toHaveFocus());
    expect(seen).toHaveLength(0);
    await user.click(within(question).getByRole('button', { name: 'Someone else' }));
    expect(screen.queryByText(/Is this Ruth/)).not.toBeInTheDocument();
    expect(screen.getByLabelText('Diagnosis group')).toHaveFocus();
    await user.click(screen.getByRole('button', { name: 'Save patient' }));
    await waitFor(() => expect(address()).toMatch(`/patients/${id}`));
    expect(seen).toHaveLength(1);
  });

  it('waits for a check that has not answered yet', async () => {
    const known = { ...createdPatient(id), id: listed(5).id };
    const checks: Promise<unknown>[] = [];
    let letAnswer = (): void => undefined;
    const held = new Promise<void>((resolve) => (letAnswer = resolve));
    server.use(
      http.post('*/api/patients/duplicate-check', async () => {
        checks.push(held);
        await held;
        return HttpResponse.json({ items: [known] });
      }),
    );
    const seen = answer('POST /api/patients', { patient: createdPatient(id) });
    const { user } = renderApp('/patients/new', coordinator);
    await fillIn(user);
    await user.click(screen.getByRole('button', { name: 'Save patient' }));
    expect(await screen.findByRole('button', { name: 'Saving' })).toBeVisible();
    expect(checks.length).toBeGreaterThan(0);
    expect(seen).toHaveLength(0);
    letAnswer();
    const question = await screen.findByRole('group', { name: 'A patient with this name and birth date' });
    await waitFor(() => expect(question).toHaveFocus());
    expect(screen.getByRole('button', { name: 'Save patient' })).toBeVisible();
    expect(seen).toHaveLength(0);
  });

  it('saves when the check fails', async () => {
    answer('POST /api/patients/duplicate-check', 'unreachable');
    const seen = answer('POST /api/patients', { patient: createdPatient(id) });
    const { user } = renderApp('/patients/new', coordinator);
    await fillIn(user);
    await user.click(screen.getByRole('button', { name: 'Save patient' }));
    await waitFor(() => expect(seen).toHaveLength(1));
  });

  it("puts the server's messages at their fields", async () => {
    answer(
      'POST /api/patients',
      problem('invalid-input', 'Nothing was stored.', [
        { path: 'birthDate', message: 'The patient must be 18 or older' },
        { path: 'recordNumber', message: 'Record A-1 belongs to another patient' },
      ]),
    );
    const { user } = renderApp('/patients/new', coordinator);
    await fillIn(user);
    await user.click(screen.getByRole('button', { name: 'Save patient' }));
    await waitFor(() =>
      expect(screen.getByLabelText('Date of birth')).toHaveAccessibleDescription('The patient must be 18 or older'),
    );
    expect(screen.getByLabelText(/Record number/)).toHaveAccessibleDescription('Record A-1 belongs to another patient');
    expect(screen.getByLabelText('Given name')).toHaveValue('Ruth');
  });

  it('keeps what was typed when the server cannot be reached', async () => {
    answer('POST /api/patients', 'unreachable');
    const { user } = renderApp('/patients/new', coordinator);
    await fillIn(user);
    await user.click(screen.getByRole('button', { name: 'Save patient' }));
    expect(
      await screen.findByText(/Not saved: the server could not be reached. What you typed is here./),
    ).toBeVisible();
    expect(screen.getByLabelText('Given name')).toHaveValue('Ruth');
  });

  it('asks once before unsaved work is left', async () => {
    const { user, address } = renderApp('/patients/new', coordinator);
    await user.type(await screen.findByLabelText('Given name'), 'Ruth');
    await user.keyboard('{Escape}');
    const question = await screen.findByRole('dialog', { name: 'Leave without saving?' });
    await user.click(within(question).getByRole('button', { name: 'Keep working' }));
    expect(screen.getByLabelText('Given name')).toHaveValue('Ruth');
    expect(address()).toBe('/patients/new');
    await user.click(screen.getByRole('button', { name: 'Close' }));
    await user.click(await screen.findByRole('button', { name: 'Leave' }));
    await waitFor(() => expect(address()).toBe('/patients'));
    expect(screen.queryByRole('dialog')).not.toBeInTheDocument();
  });

  it('closes without a question when nothing was typed', async () => {
    const { user, address } = renderApp('/patients/new?list=all', coordinator);
    await user.click(await screen.findByRole('button', { name: 'Close' }));
    await waitFor(() => expect(address()).toBe('/patients?list=all'));
  });
});
