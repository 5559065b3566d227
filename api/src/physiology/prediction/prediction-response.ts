import { getMeasure, type GradingRuleId, type MeasureId } from '@slighthill/shared/measures';
import { bandsOf } from '../grading/bands-of';
import type { GradingRule } from '../grading/types';
import { findGradingRule, gradingRuleFor } from '../grading/index';
import { assess } from '../reference-sets/assess';
import { getReferenceSet, referenceSetFor } from '../reference-sets/index';
import { predict } from '../reference-sets/predict';
import { checkGroup, type InputError } from './check-group';
import { gradesOf } from './grades-of';
import { predictionNotes } from './prediction-notes';
import { predictionPattern } from './prediction-pattern';
import type {
  JudgedMeasures,
  PredictionDefaults,
  PredictionOutcome,
  PredictionRequest,
  PredictionResponse,
} from './types';

/**
 * The whole of a prediction (rules PV-0 to PV-7, GR-0 to GR-8): predicted value and limits of every measure of the named
 * set and of every value given, the pattern and the grades. Age 18 to 100 decimal years, height 120.0 to 220.0 cm;
 * throws RangeError outside them. Input that is well formed but not enough, such as a legacy set without a group, comes
 * back as errors. FEV1 and FVC without FEV1/FVC give the ratio.
 * @example predictionResponse({ referenceSet: 'gli-global-2022', sex: 'male', ageYears: 26.5, heightCm: 184.2, values: {} }, clinic)
 */
export function predictionResponse(request: PredictionRequest, clinic: PredictionDefaults): PredictionOutcome {
  const errors = inputErrors(request);
  if (errors.length > 0) return { ok: false, errors };
  const values = withRatio(request.values);
  const judged = judgeAll(request, values);
  const ratioRule = request.ratioRule ?? clinic.ratioRule;
  const pattern = predictionPattern(request, judged, {
    ratioRule,
    fev1Rule: gradingRuleFor('fev1', request.gradingRule ?? null, clinic)?.id ?? clinic.fev1SeverityRule,
    tlcRule: gradingRuleFor('tlc', request.gradingRule ?? null, clinic)?.id ?? clinic.tlcSeverityRule,
    copdConfirmed: request.diagnosisGroup === 'copd' && request.diagnosisConfirmed === true,
  });
  const ruleOf = (measure: MeasureId) => gradingRuleFor(measure, request.gradingRule ?? null, clinic);
  return {
    ok: true,
    response: {
      referenceSet: request.referenceSet,
      measures: withoutSides(judged),
      pattern: pattern && { ...pattern, spirometryTestId: null, tlcMeasurementId: null },
      grades: gradesOf(judged, pattern, ruleOf),
      bands: bandsOfValues(judged, ruleOf),
      notes: predictionNotes(request, judged, pattern),
    },
  };
}

function inputErrors({ referenceSet, group, values, gradingRule }: PredictionRequest): InputError[] {
  const errors: InputError[] = [];
  const groupError = checkGroup(referenceSet, group);
  if (groupError) errors.push(groupError);
  for (const [measure, value] of Object.entries(values))
    if (!(value > 0)) errors.push({ path: `values.${measure}`, message: 'Must be more than 0' });
  if (values.fev1 !== undefined && values.fvc !== undefined && values.fev1 > values.fvc)
    errors.push({ path: 'values.fev1', message: 'FEV1 cannot be more than FVC' });
  if (values.fev1fvc !== undefined && values.fev1fvc > 1)
    errors.push({ path: 'values.fev1fvc', message: 'FEV1/FVC is a fraction such as 0.47' });
  const covers = (rule: GradingRuleId) =>
    (['fev1', 'tlc', 'dlco', 'cat'] as const).some((measure) => findGradingRule(measure, rule) !== null);
  if (gradingRule !== undefined && !covers(gradingRule))
    errors.push({ path: 'gradingRule', message: 'There is no such grading rule' });
  return errors;
}

function withRatio(values: PredictionRequest['values']): PredictionRequest['values'] {
  const { fev1, fvc, fev1fvc } = values;
  if (fev1 === undefined || fvc === undefined || fev1fvc !== undefined) return values;
  return { ...values, fev1fvc: fev1 / fvc };
}

function judgeAll(request: PredictionRequest, values: PredictionRequest['values']): JudgedMeasures {
  const named = getReferenceSet(request.referenceSet);
  const ids = new Set<MeasureId>([...named.measures, ...(Object.keys(values) as MeasureId[])]);
  const judged: JudgedMeasures = {};
  for (const id of ids) judged[id] = judgeOne(request, id, values[id] ?? null);
  return judged;
}

function judgeOne(
  request: PredictionRequest,
  id: MeasureId,
  value: number | null,
): NonNullable<JudgedMeasures['fev1']> {
  const set = referenceSetFor(id, getMeasure(id).referenceKind, getReferenceSet(request.referenceSet));
  const found = predict(set, id, request);
  const empty = { value, percentPredicted: null, z: null, belowLln: null, aboveUln: null };
  if (!found.computable)
    return { ...empty, referenceSet: set?.id ?? null, predicted: null, lln: null, uln: null, reason: found.reason };
  const { predicted, lln, uln } = found;
  const base = { ...empty, referenceSet: set?.id ?? null, predicted, lln, uln };
  if (value === null) return base;
  const { zApproximate, ...assessed } = assess(value, found);
  return { ...base, ...assessed, ...(zApproximate === null ? {} : { zApproximate }) };
}

function withoutSides(judged: JudgedMeasures): PredictionResponse['measures'] {
  return Object.fromEntries(
    Object.entries(judged).map(([id, { belowLln: _below, aboveUln: _above, ...measure }]) => [id, measure]),
  );
}

function bandsOfValues(
  judged: JudgedMeasures,
  ruleOf: (measure: MeasureId) => GradingRule | null,
): PredictionResponse['bands'] {
  const graded = (Object.keys(judged) as MeasureId[]).flatMap((id) => {
    const rule = judged[id]?.value == null ? null : ruleOf(id);
    return rule ? [[id, bandsOf(rule)] as const] : [];
  });
  return Object.fromEntries(graded);
}
