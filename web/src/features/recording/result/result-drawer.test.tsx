import { screen, waitFor } from '@testing-library/react';
import { getMeasure, type MeasureId } from '@slighthill/shared/measures';
import { FormProvider } from 'react-hook-form';
import { describe, expect, it, vi } from 'vitest';
import { plan } from '../testing/record-api';
import { measurementOf, ruth } from '../testing/record-data';
import { planQuietRecord, renderRecord } from '../testing/render-record';
import { findMeasures } from './measure-picker';
import { useRecordForm } from '../forms/use-record-form';
import { ResultDrawer } from './result-drawer';
import { ResultFields } from './result-fields';
import { emptyResultForm, enterableMeasures, usualConditions, type ResultForm } from './result-form';
import { resultQuestions } from './result-questions';
import { checkResult } from './result-request';
import { isFlagged } from './safety-item-field';
import { unitBeside } from './unit-beside';

const open = async () => {
  planQuietRecord();
  const onSaved = vi.fn();
  const { user } = renderRecord(<ResultDrawer patient={ruth} onSaved={onSaved} onClose={vi.fn()} />);
  const picker = await screen.findByRole('combobox', { name: 'Result' });
  const choose = async (words: string) => {
    await user.clear(picker);
    await user.type(picker, words);
    await user.keyboard('{Enter}');
  };
  return { user, onSaved, picker, choose };
};

const noEarlier = { heightCm: null, weightKg: null, value: null };
const id = '11111111-1111-4111-8111-111111111111';

/** Inside every range and on every step. */
const someValue = (measure: (typeof enterableMeasures)[number]): string => {
  const range = measure.plausible ?? measure.absolute ?? { min: 1, max: 1 };
  return String(measure.allowedValues?.[3] ?? Math.ceil(range.min / (measure.step ?? 1)) * (measure.step ?? 1));
};

describe('the result form, by the registry', () => {
  it.each(enterableMeasures.map((measure) => measure.id))('%s can be chosen, filled and sent', (measureId) => {
    const measure = getMeasure(measureId);
    const form = {
      ...emptyResultForm('2026-10-14T10:26', id),
      measure: measureId,
      value: someValue(measure),
      conditions: usualConditions(measureId),
      item9: measure.safetyItem ? '0' : '',
    };
    expect(findMeasures(measure.label).flatMap(({ measures }) => measures)).toContain(measure);
    expect(checkResult(form, 'America/Denver').issues).toEqual([]);
    expect(checkResult(form, 'America/Denver').body).toMatchObject({ measure: measureId, value: Number(form.value) });
    expect(resultQuestions(form, noEarlier)).toEqual([]);
  });

  it('offers no measure that belongs to a test form or is worked out', () => {
    const offered = findMeasures('').flatMap(({ measures }) => measures.map((measure) => measure.id));
    expect(offered).not.toEqual(expect.arrayContaining(['fev1']));
    expect(offered).not.toEqual(expect.arrayContaining(['bmi']));
    expect(offered).toEqual(expect.arrayContaining(['tlc', 'cat', 'sixMinuteWalkDistance']));
  });

  // Rule 0.7: 6MWD plausible 50 to 750 m, absolute 0 to 1000 m; shuttle in steps of 10.
  it.each([
    ['sixMinuteWalkDistance', '820', 0, 1],
    ['sixMinuteWalkDistance', '1001', 1, 0],
    ['shuttleWalkDistance', '405', 1, 0],
    ['cat', '41', 1, 0],
    ['mmrc', '2', 0, 0],
  ] as const)('%s of %s: %i refusals, %i questions', (measure, value, refusals, questions) => {
    const form = { ...emptyResultForm('2026-10-14T10:26', id), measure, value, conditions: usualConditions(measure) };
    expect(checkResult(form, 'America/Denver').issues).toHaveLength(refusals);
    expect(resultQuestions(form, noEarlier)).toHaveLength(questions);
  });

  it('flags any ninth answer but 0 (rule OM-1)', () => {
    const item = getMeasure('phq9').safetyItem!;
    expect(item.choices.map((choice) => isFlagged(item, choice))).toEqual([false, true, true, true, true]);
    expect(isFlagged(item, '')).toBe(false);
  });
});

const OneMeasure = ({ measure }: { measure: MeasureId }) => {
  const start: ResultForm = {
    ...emptyResultForm('2026-10-14T10:26', id),
    measure,
    conditions: usualConditions(measure),
  };
  const state = useRecordForm({ start, check: () => [], ask: () => [] });
  return (
    <FormProvider {...state.form}>
      <ResultFields state={state} earlierHeight={null} amending={false} />
    </FormProvider>
  );
};

describe('the fields of a result', () => {
  it.each(enterableMeasures)('$id has its value, its conditions and its body size', (measure) => {
    renderRecord(<OneMeasure measure={measure.id} />);
    if (measure.gradeDescriptions) expect(screen.getAllByRole('radio')).toHaveLength(measure.gradeDescriptions.length);
    else expect(screen.getByRole('textbox', { name: measure.label })).toBeVisible();
    const highest = measure.unit.ucum === '{score}' && !measure.gradeDescriptions && measure.absolute?.max;
    expect(screen.queryAllByText(`of ${highest}`)).toHaveLength(highest === false ? 0 : 1);
    for (const { label, type } of Object.values(measure.conditions)) {
      const role = { number: 'textbox', choice: 'combobox', boolean: 'group' }[type];
      expect(screen.getByRole(role, { name: label })).toBeVisible();
    }
    expect(screen.queryAllByRole('textbox', { name: /^Height/ })).toHaveLength(measure.referenceKind ? 1 : 0);
    expect(screen.queryAllByRole('group', { name: measure.safetyItem?.label ?? 'none' })).toHaveLength(
      measure.safetyItem ? 1 : 0,
    );
  });
});

describe('what stands beside a result', () => {
  it('is the highest score, the unit, or nothing where the name says it', () => {
    expect(unitBeside(getMeasure('phq9'))).toBe('of 27');
    expect(unitBeside(getMeasure('sixMinuteWalkDistance'))).toBe('m');
    expect(unitBeside(getMeasure('mmrc'))).toBe('');
  });
});

describe('the result drawer', () => {
  it('closes the list with Escape, not the drawer', async () => {
    const { user, picker } = await open();
    await user.click(picker);
    expect(picker).toHaveAttribute('aria-expanded', 'true');
    await user.keyboard('{Escape}');
    expect(picker).toHaveAttribute('aria-expanded', 'false');
    expect(screen.getByRole('dialog', { name: 'Record a result' })).toBeVisible();
  });

  it('draws what the registry declares for the walk', async () => {
    const { user, choose, onSaved } = await open();
    const sent = plan('POST /api/patients/:id/measurements', {
      measurement: measurementOf({ measure: 'sixMinuteWalkDistance', value: 412 }),
    });
    await choose('6 walk');
    const value = await screen.findByLabelText('6-minute walk distance');
    expect(value).toHaveFocus();
    expect(screen.getByLabelText('Course length')).toHaveValue('30');
    expect(screen.getByLabelText('Walking aid')).toHaveValue('none');
    expect(screen.getByLabelText(/^Height optional/)).toHaveAccessibleDescription(/165\.0 cm from Aug 24/);
    await user.type(value, '412');
    await user.click(screen.getByRole('button', { name: 'Save result' }));
    await waitFor(() => expect(onSaved).toHaveBeenCalledOnce());
    expect(sent[0]?.body).toMatchObject({
      measure: 'sixMinuteWalkDistance',
      value: 412,
      conditions: { courseM: 30, walks: 1, oxygenLpm: 0, aid: 'none' },
    });
  });

  it('asks about a value outside the usual range before it saves', async () => {
    const { user, choose } = await open();
    const sent = plan('POST /api/patients/:id/measurements', { measurement: measurementOf({}) });
    await choose('6 walk');
    await user.type(await screen.findByLabelText('6-minute walk distance'), '820');
    expect(await screen.findByText(/820 m is outside the usual 50 to 750 m\. Is it right\?/)).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Save result' }));
    expect(sent).toHaveLength(0);
    await user.click(screen.getByRole('button', { name: 'Yes, it is right' }));
    await user.click(screen.getByRole('button', { name: 'Save result' }));
    await waitFor(() => expect(sent).toHaveLength(1));
  });

  it('needs the ninth answer of a PHQ-9 and says that it is flagged at once', async () => {
    const { user, choose, onSaved } = await open();
    const sent = plan('POST /api/patients/:id/measurements', {
      measurement: measurementOf({ measure: 'phq9', value: 7, item9: '2' }),
    });
    await choose('phq');
    await user.type(await screen.findByLabelText('PHQ-9 depression score'), '7');
    await user.click(screen.getByRole('button', { name: 'Save result' }));
    expect(await screen.findByText('The ninth answer is needed: 0, 1, 2, 3 or not answered')).toBeVisible();
    expect(sent).toHaveLength(0);
    expect(screen.queryByText('Saving raises a safety flag.')).not.toBeInTheDocument();
    await user.click(screen.getByRole('radio', { name: '2' }));
    expect(screen.getByText('Saving raises a safety flag.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Save result' }));
    await waitFor(() => expect(onSaved).toHaveBeenCalledOnce());
    expect(sent[0]?.body).toMatchObject({ measure: 'phq9', value: 7, item9: '2' });
  });

  it('records several results in one sitting, each with an id of its own', async () => {
    const { user, choose, picker } = await open();
    const sent = plan(
      'POST /api/patients/:id/measurements',
      { measurement: measurementOf({ measure: 'cat', value: 18 }) },
      { measurement: measurementOf({ measure: 'mmrc', value: 2 }) },
    );
    await choose('cat');
    await user.type(await screen.findByLabelText('COPD Assessment Test'), '18');
    await user.click(screen.getByRole('button', { name: 'Save and add another' }));
    expect(await screen.findByText('In the record: CAT 18')).toBeVisible();
    expect(picker).toHaveValue('');
    await choose('mmrc');
    await user.click(await screen.findByRole('radio', { name: /^2 / }));
    await user.click(screen.getByRole('button', { name: 'Save and add another' }));
    await waitFor(() => expect(sent).toHaveLength(2));
    expect(sent[1]?.body?.id).not.toBe(sent[0]?.body?.id);
    expect(sent[1]?.body?.takenAt).toBe(sent[0]?.body?.takenAt);
    expect(sent[1]?.body).toMatchObject({ measure: 'mmrc', value: 2 });
  });
});
