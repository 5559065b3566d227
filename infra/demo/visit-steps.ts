import type { MeasurementInput } from '@slighthill/shared/contracts/measurement';
import { clinicInstant } from './clinic-instant';
import type { Lungs } from './lungs';
import type { DemoPerson } from './plan-people';
import type { Wellbeing } from './scores';
import { spirometryBody, type TestStyle } from './spirometry-body';
import type { DemoStep, StepAction } from './steps';

export interface Visit {
  on: string;
  /** Minutes from midnight at which the visit begins. */
  beginsAt: number;
  /** A full visit has every test, a short one spirometry, walk and breathlessness. */
  extent: 'full' | 'short';
  style: TestStyle;
  entry: 'maneuvers' | 'best';
  lungs: Lungs;
  wellbeing: Wellbeing;
  heightCm: number;
  heightMethod: 'measured' | 'stated';
  weightKg: number;
  oxygenLpm: number;
  courseM: number;
  item9: '0' | '1' | 'not-answered';
}

type Person = Pick<DemoPerson, 'id' | 'group' | 'random'>;
type Conditions = NonNullable<MeasurementInput['conditions']>;

/** Everything recorded on one visit, each entry typed in some minutes after it was taken. */
export function visitSteps(person: Person, visit: Visit, timeZone: string): DemoStep[] {
  const { random } = person;
  const at = (minutes: number) => clinicInstant(visit.on, visit.beginsAt + minutes, timeZone);
  const typed = (minutes: number, action: StepAction): DemoStep => ({
    ...action,
    patientId: person.id,
    by: 'therapist',
    at: at(minutes + random.whole(3, 9)),
  });
  const value = (
    minutes: number,
    measure: MeasurementInput['measure'],
    number: number,
    conditions: Conditions = {},
    more: Partial<MeasurementInput> = {},
  ) =>
    typed(minutes, {
      kind: 'measurement',
      body: { id: random.uuid(), measure, takenAt: at(minutes).toISOString(), value: number, conditions, ...more },
    });
  const { lungs, wellbeing } = visit;
  const { fev1L, fvcL, bronchodilatorGain } = lungs;
  const size = { heightCm: visit.heightCm, heightMethod: visit.heightMethod, weightKg: visit.weightKg };
  const spirometry = spirometryBody(random, { ...visit, ...size, at: at(0), fev1L, fvcL, bronchodilatorGain });
  const oxygenLpm = visit.oxygenLpm;
  const common = [
    typed(30, { kind: 'spirometry', body: spirometry }),
    value(
      66,
      'sixMinuteWalkDistance',
      wellbeing.walkM,
      { courseM: visit.courseM, walks: 2, oxygenLpm, aid: 'none' },
      { weightKg: visit.weightKg },
    ),
    value(67, 'spo2Nadir', wellbeing.spo2Nadir, { oxygenLpm }),
    value(80, 'mmrc', wellbeing.mmrc),
    value(82, 'cat', wellbeing.cat),
  ];
  if (visit.extent === 'short') return common;
  return [
    ...common,
    value(68, 'borgDyspnea', wellbeing.borgBreathlessness, { moment: 'end-of-test' }),
    value(90, 'phq9', wellbeing.phq9, {}, { item9: visit.item9 }),
    ...(random.chance(0.4) ? [value(69, 'borgLegFatigue', wellbeing.borgLegs, { moment: 'end-of-test' })] : []),
    ...(random.chance(0.6) ? [value(93, 'gad7', wellbeing.gad7)] : []),
    ...lungVolumes(lungs).map(([measure, number]) => value(45, measure, number, { method: 'plethysmography' })),
    ...(lungs.dlco === null ? [] : [value(54, 'dlco', tenths(lungs.dlco), { hemoglobinCorrected: true })]),
    ...(person.group === 'post-covid' || person.group === 'asthma'
      ? [value(85, 'sitToStandOneMinute', wellbeing.sitToStand, { oxygenLpm })]
      : []),
  ];
}

const tenths = (value: number) => Math.round(value * 10) / 10;
const hundredths = (value: number) => Math.round(value * 100) / 100;

function lungVolumes({ tlcL, rvL }: Lungs): ['tlc' | 'rv', number][] {
  if (tlcL === null || rvL === null) return [];
  return [
    ['tlc', hundredths(tlcL)],
    ['rv', hundredths(rvL)],
  ];
}
