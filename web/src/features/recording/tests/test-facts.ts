import type { BodySize, Measurement } from '@slighthill/shared/contracts/measurement';
import type { Maneuver, SpirometryTest } from '@slighthill/shared/contracts/spirometry-test';
import { formatNumber } from '@slighthill/shared/format';
import { getMeasure, type MeasureId } from '@slighthill/shared/measures';
import { formatResult } from '../../../charts/format-measure';
import { capitalize, stateWords } from '../../../charts/rule-words';
import { formatInstant } from '../../../lib/clinic-time';
import { heightMethodLabels } from '../forms/height-methods';
import { factsFrom, type Fact } from '../history/fact';

type Maybe<T> = T | null | undefined;

const unitOf = (id: MeasureId): string => getMeasure(id).unit.symbol;
const result = (id: MeasureId, value: Maybe<number>): string | null =>
  value == null ? null : formatResult(id, value, unitOf(id));

const heightWords = (
  cm: Maybe<number>,
  method: Maybe<SpirometryTest['heightMethod']>,
  carried = false,
): string | null =>
  cm == null
    ? null
    : [
        `${formatNumber(cm, 1)} cm`,
        method && heightMethodLabels[method].toLowerCase(),
        carried && 'carried from an earlier day',
      ]
        .filter(Boolean)
        .join(', ');

const maneuverWords = (maneuver: Maneuver): string =>
  [
    `FEV1 ${formatNumber(maneuver.fev1, 2)} L`,
    `FVC ${formatNumber(maneuver.fvc, 2)} L`,
    result('pef', maneuver.pef) && `PEF ${result('pef', maneuver.pef)}`,
    result('fef2575', maneuver.fef2575) && `FEF25-75 ${result('fef2575', maneuver.fef2575)}`,
    maneuver.forcedTimeS !== null && `${formatNumber(maneuver.forcedTimeS, 1)} s`,
    !maneuver.fev1Accepted && 'FEV1 not used',
    !maneuver.fvcAccepted && 'FVC not used',
    maneuver.reason,
  ]
    .filter(Boolean)
    .join(', ');

/** Volumes stay as they were entered where two decimals would hide a change. */
const volume = (id: MeasureId, value: Maybe<number>): string | null =>
  value == null ? null : `${formatNumber(value, Math.round(value * 1000) % 10 === 0 ? 2 : 3)} ${unitOf(id)}`;

/** What a spirometry test says, without its maneuvers. */
export const spirometryFacts = (test: Partial<SpirometryTest>, timeZone: string): Fact[] =>
  factsFrom([
    ['Date and time', test.performedAt && formatInstant(test.performedAt, timeZone)],
    ['Bronchodilator', test.bronchodilator && capitalize(stateWords[test.bronchodilator])],
    ['FEV1', volume('fev1', test.best?.fev1)],
    ['FVC', volume('fvc', test.best?.fvc)],
    ['FEV1/FVC', result('fev1fvc', test.best?.fev1fvc)],
    ['PEF', result('pef', test.best?.pef)],
    ['FEF25-75', result('fef2575', test.best?.fef2575)],
    ['Height', heightWords(test.heightCm, test.heightMethod)],
    ['Weight', result('weight', test.weightKg)],
    ['Drug', [test.drug, test.doseMcg != null && `${test.doseMcg} \u00b5g`].filter(Boolean).join(', ')],
    ['Since the dose', test.minutesSinceDose != null && `${test.minutesSinceDose} min`],
    ['Own bronchodilator', test.ownBronchodilatorHoursAgo != null && `${test.ownBronchodilatorHoursAgo} hours before`],
    ['Note', test.note],
  ]);

/** The same with every maneuver, for a history. */
export const spirometryHistoryFacts = (test: Partial<SpirometryTest>, timeZone: string): Fact[] => [
  ...spirometryFacts(test, timeZone),
  ...factsFrom([['Entered as', test.entry === 'best' ? 'Best values' : 'Maneuvers']]),
  ...(test.maneuvers ?? []).map((maneuver, index) => ({
    label: `Maneuver ${index + 1}`,
    value: maneuverWords(maneuver),
  })),
];

const conditionFacts = (measure: MeasureId, conditions: Measurement['conditions']): Fact[] =>
  Object.entries(getMeasure(measure).conditions).flatMap(([key, condition]) => {
    const value = conditions[key];
    if (value === undefined) return [];
    const place = condition.choices?.indexOf(String(value)) ?? -1;
    const words =
      typeof value === 'boolean'
        ? value
          ? 'Yes'
          : 'No'
        : (condition.choiceLabels?.[place] ?? `${value} ${condition.unit ?? ''}`.trim());
    return [{ label: condition.label, value: words }];
  });

/** What one result says; the registry names its unit and circumstances. */
export const measurementFacts = (measurement: Partial<Measurement>, timeZone: string): Fact[] => {
  const { measure } = measurement;
  if (!measure) return [];
  const entry = getMeasure(measure);
  const grade = measurement.value === undefined ? undefined : entry.gradeDescriptions?.[measurement.value];
  return [
    ...factsFrom([
      ['Date and time', measurement.takenAt && formatInstant(measurement.takenAt, timeZone)],
      [entry.label, [result(measure, measurement.value), grade].filter(Boolean).join(', ')],
      [
        entry.safetyItem?.label ?? 'Ninth answer',
        measurement.item9 && (measurement.item9 === 'not-answered' ? 'Not answered' : measurement.item9),
      ],
    ]),
    ...conditionFacts(measure, measurement.conditions ?? {}),
    ...factsFrom([
      ['Height', heightWords(measurement.heightCm, measurement.heightMethod, measurement.heightCarried)],
      ['Weight', result('weight', measurement.weightKg)],
      ['Note', measurement.note],
    ]),
  ];
};

export const bodySizeFacts = (size: Partial<BodySize>, timeZone: string): Fact[] =>
  factsFrom([
    ['Date and time', size.takenAt && formatInstant(size.takenAt, timeZone)],
    ['Height', heightWords(size.heightCm, size.heightMethod)],
    ['Weight', result('weight', size.weightKg)],
    ['Body mass index', result('bmi', size.bmi)],
    ['Note', size.note],
  ]);
