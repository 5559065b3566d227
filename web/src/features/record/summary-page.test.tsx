import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { aPoint, aSeries, aTrendResponse, fev1Series, walkSeries } from '../../charts/testing/trend-fixture';
import { problem } from '../../testing/problem';
import { aPatient } from './testing/record-fixture';
import { renderRecord } from './testing/render-record';

const patient = aPatient();
const summary = `/patients/${patient.id}/summary`;
const chart = (name: RegExp) => screen.findByRole('application', { name });

describe('summary', () => {
  it('says the pattern, the numbers and the rules that produced them', async () => {
    renderRecord(summary, { patient, trends: [aTrendResponse()] });
    expect(await screen.findByRole('heading', { level: 2, name: 'Obstructive pattern, severe' })).toBeVisible();
    const section = screen.getByRole('region', { name: 'Pattern' });
    expect(section).toHaveTextContent(
      'FEV1/FVC 0.48 is below 0.70 and below the LLN, 0.64. FEV1 is 46% of predicted. TLC is 112%, so no restriction.',
    );
    expect(section).toHaveTextContent(
      'Pattern by fixed ratio 0.70, LLN agrees. Severity by ATS/ERS 2005, FEV1 % predicted, severe is 35 to under 50. ' +
        'Test of Oct 12, 2026, after bronchodilator, GLI Global 2022.',
    );
    expect(screen.getByText(/It supports your judgment and does not diagnose/)).toBeVisible();
  });

  it('says that restriction cannot be judged without a TLC, and where the ratio rules disagree', async () => {
    const { pattern } = aTrendResponse();
    if (!pattern) throw new Error('the fixture has a pattern');
    const trends = aTrendResponse({
      pattern: {
        ...pattern,
        heading: 'Obstructive by fixed ratio, not by LLN',
        lowByLln: false,
        tlcMeasurementId: null,
        notes: ['No TLC, so restriction cannot be judged.'],
        values: { ...pattern.values, ratio: 0.6985, tlcPercentPredicted: null },
      },
    });
    renderRecord(summary, { patient, trends: [trends] });
    const section = await screen.findByRole('region', { name: 'Pattern' });
    expect(section).toHaveTextContent('No TLC, so restriction cannot be judged.');
    expect(section).toHaveTextContent('FEV1/FVC 0.699 is below 0.70 but not below the LLN, 0.64.');
    expect(section).toHaveTextContent('Pattern by fixed ratio 0.70, LLN does not agree.');
    expect(section).not.toHaveTextContent('TLC is');
  });

  it('opens on the walk test first, then on the measure last viewed', async () => {
    const first = renderRecord(summary, { patient, trends: [aTrendResponse()] });
    await chart(/^6-minute walk distance, meters: baseline 310 m/);
    await first.user.click(screen.getByRole('button', { name: /^CAT/ }));
    await chart(/^COPD Assessment Test: baseline 22/);
    expect(first.address()).toContain('measure=cat');
    expect(screen.getByRole('heading', { name: 'COPD Assessment Test' })).toHaveFocus();
    first.unmount();
    renderRecord(summary, { patient, trends: [aTrendResponse()] });
    expect(await chart(/^COPD Assessment Test: baseline 22/)).toBeVisible();
  });

  it('moves the reader by keys, announces the point and opens its test', async () => {
    const { user, address } = renderRecord(`${summary}?measure=fev1`, { patient, trends: [aTrendResponse()] });
    const plot = await chart(/^FEV1, percent predicted: baseline 44%/);
    plot.focus();
    expect(plot).toHaveAccessibleDescription(/^7 points\. Arrow keys move the reader/);
    await user.keyboard('{End}');
    expect(screen.getByText(/^Oct 12, 2026, latest\. FEV1 1\.38 L, 46% of 3\.00 L/)).toBeInTheDocument();
    await user.keyboard('{Home}{ArrowRight}{ArrowRight}{ArrowRight}');
    expect(plot).toHaveAccessibleDescription(/^Point 4 of 7\./);
    expect(screen.getByText(/^Aug 31, 2026, baseline\./)).toBeInTheDocument();
    await user.keyboard('{Escape}');
    expect(plot).toHaveAccessibleDescription(/^7 points\./);
    await user.keyboard('{End}{Enter}');
    expect(await screen.findByText('The test itself')).toBeVisible();
    expect(address()).toBe(`/patients/${patient.id}/tests/spirometry-test/${fev1Series.latest?.sourceId}`);
  });

  it('draws bands only for an abnormal pattern', async () => {
    const { pattern } = aTrendResponse();
    renderRecord(`${summary}?measure=fev1`, { patient, trends: [aTrendResponse()] });
    const plot = await chart(/^FEV1/);
    expect(plot.querySelectorAll('[data-band]')).toHaveLength(5);
    const normal = aTrendResponse({
      pattern: pattern && { ...pattern, id: 'normal', heading: 'Normal', severity: null },
    });
    renderRecord(`${summary}?measure=fev1`, { patient, trends: [normal] });
    await screen.findByRole('heading', { level: 2, name: 'Normal' });
    const second = (await screen.findAllByRole('application')).at(-1);
    expect(second?.querySelectorAll('[data-mark]')).toHaveLength(7);
    expect(second?.querySelectorAll('[data-band]')).toHaveLength(0);
  });

  it('shows the same points as a table, each with its reason, sorted by date', async () => {
    const { user, address } = renderRecord(`${summary}?measure=fev1`, { patient, trends: [aTrendResponse()] });
    await chart(/^FEV1/);
    await user.click(screen.getByRole('button', { name: 'Show as table' }));
    expect(address()).toContain('table=1');
    const table = await screen.findByRole('table', { name: /^FEV1, percent predicted: baseline 44%/ });
    const dates = () =>
      within(table)
        .getAllByRole('rowheader')
        .map((cell) => cell.textContent);
    expect(dates()).toHaveLength(fev1Series.points.length);
    expect(dates()[0]).toContain('Feb 24, 2026');
    const rows = within(table).getAllByRole('row').slice(1);
    expect(rows[0]).toHaveTextContent('1.24 L');
    expect(rows[0]).toHaveTextContent('Not compared: taken before bronchodilator');
    expect(rows[3]).toHaveTextContent('Baseline');
    expect(rows[6]).toHaveTextContent('Latest');
    await user.click(within(table).getByRole('button', { name: 'Date' }));
    expect(dates()[0]).toContain('Oct 12, 2026');
  });

  it('switches the scale', async () => {
    const { user } = renderRecord(`${summary}?measure=fev1`, { patient, trends: [aTrendResponse()] });
    await chart(/^FEV1, percent predicted/);
    await user.click(screen.getByRole('radio', { name: 'z-score' }));
    expect(await chart(/^FEV1, z-score: baseline \u22123\.30/)).toBeVisible();
  });

  it('looks by another rule in the address only, and asks the group of a legacy set', async () => {
    const usual = aTrendResponse();
    const legacy = aTrendResponse({
      pattern: usual.pattern && { ...usual.pattern, values: { ...usual.pattern.values, referenceSet: 'gli-2012' } },
    });
    const { user, seen, address } = renderRecord(summary, { patient, trends: [usual, legacy, usual] });
    await user.click(await screen.findByRole('button', { name: 'Change rule' }));
    await user.selectOptions(await screen.findByRole('combobox', { name: 'Reference set for spirometry' }), 'gli-2012');
    await user.click(screen.getByRole('button', { name: 'Show' }));
    expect(screen.getByText('This set needs a group')).toBeVisible();
    expect(address()).toBe(summary);
    await user.click(screen.getByRole('radio', { name: 'Other or mixed' }));
    await user.click(screen.getByRole('radio', { name: /^GOLD/ }));
    await user.click(screen.getByRole('button', { name: 'Show' }));
    expect(await screen.findByText(/These are not your clinic’s rules/)).toBeVisible();
    await waitFor(() => expect(screen.getByRole('button', { name: 'Change rule' })).toHaveFocus());
    expect(seen.filter((entry) => entry.path.endsWith('/trends')).at(-1)?.query).toEqual({
      referenceSet: 'gli-2012',
      group: 'other',
      gradingRule: 'gold',
    });
    expect(await screen.findByText(/after bronchodilator, GLI 2012, group Other or mixed\./)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Back to the clinic’s rules' }));
    expect(screen.getByRole('button', { name: 'Change rule' })).toHaveFocus();
    expect(address()).toBe(summary);
  });

  it('says on a line what stands for a measure without a change: its baseline and state', async () => {
    const points = [
      aPoint('2026-08-31', 3.1, { state: 'after', role: 'baseline' }),
      aPoint('2026-10-12', 2.9, { state: 'before', compared: false, reason: 'taken before bronchodilator' }),
    ];
    const fvc = aSeries('fvc', points, { unit: 'L', state: 'after' });
    renderRecord(summary, { patient, trends: [aTrendResponse({ series: [walkSeries, fvc] })] });
    const line = within(await screen.findByRole('region', { name: 'Also on record' })).getByRole('button');
    expect(line).toHaveTextContent('3.10 L');
    expect(line).toHaveTextContent('after bronchodilator, Aug 31');
  });

  it('starts empty with one button', async () => {
    renderRecord(summary, { patient: aPatient({ counts: { tests: 0, file: 0 }, openFlags: [] }) });
    expect(await screen.findByText('No tests yet. The summary starts with the first one.')).toBeVisible();
    expect(screen.getAllByRole('button', { name: 'Record' })).toHaveLength(2);
  });

  it('says that one test cannot be compared', async () => {
    const only = aPoint('2026-08-31', 310, { role: 'baseline' });
    const one = aSeries('sixMinuteWalkDistance', [only], { unit: 'm' });
    renderRecord(summary, { patient, trends: [aTrendResponse({ pattern: null, series: [one] })] });
    expect(await screen.findByText('One test so far, nothing to compare yet.')).toBeVisible();
    expect(screen.getByRole('heading', { name: 'No pattern yet' })).toBeVisible();
  });

  it('says what failed and tries again', async () => {
    const failed = problem('unavailable', 'The server is busy or restarting. Nothing was lost.');
    const { user } = renderRecord(summary, { patient, trends: [failed, aTrendResponse()] });
    expect(await screen.findByRole('alert')).toHaveTextContent('The summary could not be loaded.');
    await user.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await chart(/^6-minute walk/)).toBeVisible();
    expect(screen.queryByRole('alert')).toBeNull();
  });

  it('keeps what was loaded when another view of it fails', async () => {
    const failed = problem('unavailable', 'The server is busy or restarting.');
    const { user } = renderRecord(summary, { patient, trends: [aTrendResponse(), failed] });
    await user.click(await screen.findByRole('button', { name: 'Change rule' }));
    await user.click(await screen.findByRole('radio', { name: /^LLN/ }));
    await user.click(screen.getByRole('button', { name: 'Show' }));
    expect(await screen.findByRole('alert')).toHaveTextContent('What was loaded stays here.');
    expect(
      screen.getByRole('application', { name: new RegExp(`baseline ${walkSeries.baseline?.value} m`) }),
    ).toBeVisible();
  });
});
