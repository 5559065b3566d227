import { fromStored, isMeasureId, type MeasureId } from '@slighthill/shared/measures';
import type { DiagnosisGroup, EnrollmentStatus, SexForPrediction } from '@slighthill/shared/contracts/patient';
import { readRows } from '../db/read-rows';
import { notFound } from '../errors/app-error';
import type { TrendEnrollment, TrendMeasurement, TrendPerson } from '../physiology/trends/types';

/** All that a patient's trends are computed from. */
export interface TrendSource {
  patient: { id: string; clinicId: string };
  person: TrendPerson;
  enrollments: TrendEnrollment[];
  exacerbationOnsets: string[];
  measurements: TrendMeasurement[];
}

interface TrendReader {
  clinicId: string;
  clinic: { timeZone: string };
}

export const trendPersonSql = /* sql */ `
  select p.id, p.clinic_id as "clinicId", p.birth_date::text as "birthDate", p.sex_for_prediction as "sexForPrediction",
    p.diagnosis_group as "diagnosisGroup",
    exists (select 1 from file_entries f
      where f.patient_id = p.id and f.kind = 'diagnosis' and f.voided_at is null
        and f.details ->> 'diagnosisGroup' = p.diagnosis_group and f.details ->> 'confirmedBy' is not null)
      as "diagnosisConfirmed",
    coalesce((select json_agg(json_build_object('id', e.id, 'status', e.status, 'startOn', e.start_on,
      'firstExerciseOn', e.first_exercise_on, 'lastSessionOn', e.last_session_on,
      'endOn', coalesce(e.ended_on, e.planned_end_on)) order by e.start_on, e.id)
      from enrollments e where e.patient_id = p.id), '[]') as enrollments,
    coalesce((select json_agg(f.on_date order by f.on_date) from file_entries f
      where f.patient_id = p.id and f.kind = 'exacerbation' and f.voided_at is null), '[]') as "exacerbationOnsets"
  from patients p where p.id = $patientId and p.clinic_id = $clinicId`;

/** One indexed statement reads every current point, oldest first; of one instant the one recorded last comes last. */
export const trendMeasurementsSql = /* sql */ `
  select id, measure, to_char(taken_at at time zone 'UTC', 'YYYY-MM-DD"T"HH24:MI:SS.MS"Z"') as "takenAt",
    to_char(taken_at at time zone $timeZone, 'YYYY-MM-DD') as "takenOn",
    value, state, conditions, quality, height_cm::float8 as "heightCm", height_method as "heightMethod",
    height_carried as "heightCarried", weight_kg::float8 as "weightKg", source_kind as "sourceKind",
    source_id as "sourceId"
  from measurements
  where patient_id = $patientId and clinic_id = $clinicId and voided_at is null
    and ($measures::text[] is null or measure = any ($measures::text[]))
  order by taken_at, created_at, id`;

interface PersonRow {
  id: string;
  clinicId: string;
  birthDate: string;
  sexForPrediction: SexForPrediction;
  diagnosisGroup: DiagnosisGroup;
  diagnosisConfirmed: boolean;
  enrollments: (Omit<TrendEnrollment, 'status'> & { status: EnrollmentStatus })[];
  exacerbationOnsets: string[];
}

type MeasurementRow = Omit<TrendMeasurement, 'measure'> & { measure: string };

/** The measures the pattern is judged by are always read along. */
const patternMeasures: readonly MeasureId[] = ['fev1', 'fvc', 'fev1fvc', 'tlc'];

/** Reads a patient's trend source; `measures` null reads all of them. */
export async function trendSource(
  reader: TrendReader,
  patientId: string,
  measures: readonly MeasureId[] | null = null,
): Promise<TrendSource> {
  const bind = { patientId, clinicId: reader.clinicId };
  const person = (await readRows<PersonRow>(trendPersonSql, bind))[0];
  if (!person) throw notFound('This patient');
  const wanted = measures && [...new Set([...measures, ...patternMeasures])];
  const rows = await readRows<MeasurementRow>(trendMeasurementsSql, {
    ...bind,
    timeZone: reader.clinic.timeZone,
    measures: wanted,
  });
  const { id, clinicId, enrollments, exacerbationOnsets, ...who } = person;
  return {
    patient: { id, clinicId },
    person: who,
    enrollments,
    exacerbationOnsets,
    measurements: toDisplayUnits(rows),
  };
}

/** Rows of measures the registry no longer knows are left out; values come in the storage unit. */
function isKnown(row: MeasurementRow): row is TrendMeasurement {
  return isMeasureId(row.measure);
}

/** In place: there may be thousands of rows, and nobody else holds them. */
function toDisplayUnits(rows: MeasurementRow[]): TrendMeasurement[] {
  const known = rows.filter(isKnown);
  for (const row of known) row.value = fromStored(row.measure, row.value);
  return known;
}
