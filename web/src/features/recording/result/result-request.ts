import { measurementCreate, type MeasurementCreate } from '@slighthill/shared/contracts/measurement';
import type { Condition } from '@slighthill/shared/measures';
import { fromLocalInput } from '../../../lib/clinic-time';
import { parseDecimal } from '../../../lib/parse-decimal';
import { issuesOf, type FormIssue } from '../forms/form-issues';
import { measureOfForm, type ResultForm } from './result-form';

export interface CheckedResult {
  issues: FormIssue[];
  body: MeasurementCreate | null;
}

const readCondition = (condition: Condition, text: string): number | boolean | string | null => {
  if (text.trim() === '') return null;
  if (condition.type === 'number') return parseDecimal(text);
  return condition.type === 'boolean' ? text === 'yes' : text;
};

const readConditions = (form: ResultForm) => {
  const declared = Object.entries(measureOfForm(form)?.conditions ?? {});
  const issues: FormIssue[] = [];
  const conditions: Record<string, number | boolean | string> = {};
  for (const [key, condition] of declared) {
    const value = readCondition(condition, form.conditions[key] ?? '');
    if (Number.isNaN(value)) issues.push({ path: `conditions.${key}`, message: `${condition.label} must be a number` });
    else if (value !== null) conditions[key] = value;
  }
  return { conditions, issues };
};

export const resultFields = [
  'takenAt',
  'value',
  'heightCm',
  'heightMethod',
  'weightKg',
  'item9',
  'note',
  'measure',
] as const;

/** A message's place in the form; the conditions keep their key. */
export const resultFormPath = (path: readonly PropertyKey[]): string => path.map(String).join('.') || 'measure';

const isEmptyAt = (form: ResultForm, path: string): boolean => {
  const value = path.startsWith('conditions.')
    ? form.conditions[path.slice('conditions.'.length)]
    : form[path as keyof ResultForm];
  return value === '' || value === undefined;
};

/** Holds the form to the API's contract: what would be sent, or what stands against it at the form's own fields. */
export const checkResult = (form: ResultForm, timeZone: string): CheckedResult => {
  const measure = measureOfForm(form);
  if (!measure) return { issues: [{ path: 'measure', message: 'Choose what to record' }], body: null };
  const { conditions, issues } = readConditions(form);
  const usesHeight = measure.referenceKind !== null;
  const result = measurementCreate.safeParse({
    id: form.id,
    measure: measure.id,
    takenAt: fromLocalInput(form.takenAt, timeZone) ?? '',
    value: parseDecimal(form.value),
    heightCm: usesHeight ? parseDecimal(form.heightCm) : null,
    heightMethod: form.heightMethod,
    weightKg: usesHeight ? parseDecimal(form.weightKg) : null,
    conditions,
    item9: measure.safetyItem && form.item9 !== '' ? form.item9 : null,
    note: form.note,
  });
  issues.push(...issuesOf(result, resultFormPath, (path) => isEmptyAt(form, path)));
  return { issues, body: result.success && issues.length === 0 ? result.data : null };
};
