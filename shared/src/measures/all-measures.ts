import { bmi, bode, weight } from './body';
import { borgDyspnea, borgLegFatigue, mmrc } from './breathlessness';
import {
  enduranceShuttleWalk,
  shuttleWalkDistance,
  sitToStandOneMinute,
  sixMinuteWalkDistance,
  spo2Nadir,
} from './exercise';
import { erv, frc, ic, rv, rvtlc, tlc, vc } from './lung-volumes';
import { measureIds, type MeasureId } from './measure-ids';
import { gad7, hadsAnxiety, hadsDepression, phq9 } from './mood';
import { cat, crqDyspnea, crqEmotion, crqFatigue, crqMastery, sgrq } from './quality-of-life';
import { fef2575, fev1, fev1fvc, fvc, pef } from './spirometry';
import { dlco, kco, va } from './transfer-factor';
import type { Measure } from './types';

/** The one list of measures. Adding a measure is adding its id, its entry and this line. */
const byId: Record<MeasureId, Measure> = {
  fev1,
  fvc,
  fev1fvc,
  pef,
  fef2575,
  tlc,
  rv,
  rvtlc,
  frc,
  ic,
  erv,
  vc,
  dlco,
  kco,
  va,
  sixMinuteWalkDistance,
  shuttleWalkDistance,
  enduranceShuttleWalk,
  sitToStandOneMinute,
  mmrc,
  cat,
  borgDyspnea,
  borgLegFatigue,
  phq9,
  gad7,
  sgrq,
  crqDyspnea,
  crqFatigue,
  crqEmotion,
  crqMastery,
  hadsAnxiety,
  hadsDepression,
  spo2Nadir,
  weight,
  bmi,
  bode,
};

export const measures: readonly Measure[] = measureIds.map((id) => byId[id]);

export const getMeasure = (id: MeasureId): Measure => byId[id];

export const isMeasureId = (id: string): id is MeasureId => Object.hasOwn(byId, id);
