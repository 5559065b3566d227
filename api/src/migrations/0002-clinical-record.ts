import type { Migration } from './migration';

/** Who entered, and who voided: the same columns on every clinical entry. Nothing clinical is deleted. */
const entryColumns = /* sql */ `
  recorded_by uuid not null,
  version integer not null default 1 check (version >= 1),
  voided_at timestamptz,
  voided_by uuid,
  void_reason text check (void_reason in ('wrong-patient', 'wrong-test', 'duplicate', 'other')),
  void_text text,
  created_at timestamptz not null,
  updated_at timestamptz not null,
  foreign key (clinic_id, patient_id) references patients (clinic_id, id),
  foreign key (clinic_id, recorded_by) references users (clinic_id, id),
  foreign key (clinic_id, voided_by) references users (clinic_id, id),
  check ((voided_at is null) = (voided_by is null) and (voided_at is null) = (void_reason is null)),
  check (void_reason is distinct from 'other' or length(btrim(void_text)) > 0)
`;

const sql = /* sql */ `
create table body_sizes (
  id uuid primary key,
  clinic_id uuid not null references clinics (id),
  patient_id uuid not null,
  taken_at timestamptz not null,
  height_cm numeric(4, 1) check (height_cm between 120.0 and 220.0),
  height_method text check (height_method in ('measured', 'stated', 'arm-span')),
  weight_kg numeric(4, 1) check (weight_kg between 20 and 350),
  note text,
  source_kind text not null check (source_kind in ('body-size', 'spirometry-test', 'measurement')),
  source_id uuid not null,
  ${entryColumns},
  check (height_cm is not null or weight_kg is not null),
  check ((height_cm is null) = (height_method is null)),
  unique (source_kind, source_id)
);
create index body_sizes_heights on body_sizes (patient_id, taken_at desc)
  where voided_at is null and height_cm is not null;
create index body_sizes_of_patient on body_sizes (patient_id, taken_at desc, id desc);

create table spirometry_tests (
  id uuid primary key,
  clinic_id uuid not null references clinics (id),
  patient_id uuid not null,
  visit_id uuid not null,
  performed_at timestamptz not null,
  height_cm numeric(4, 1) not null check (height_cm between 120.0 and 220.0),
  height_method text not null check (height_method in ('measured', 'stated', 'arm-span')),
  weight_kg numeric(4, 1) check (weight_kg between 20 and 350),
  bronchodilator text not null check (bronchodilator in ('before', 'after', 'none', 'unknown')),
  drug text,
  dose_mcg numeric(8, 1) check (dose_mcg > 0),
  minutes_since_dose integer check (minutes_since_dose between 0 and 1440),
  own_bronchodilator_hours_ago numeric(5, 1) check (own_bronchodilator_hours_ago between 0 and 720),
  entry text not null check (entry in ('best', 'maneuvers')),
  fev1_ml integer check (fev1_ml between 100 and 8000),
  fvc_ml integer check (fvc_ml between 200 and 10000),
  pef_l_s numeric(6, 3) check (pef_l_s between 0.2 and 20),
  fef2575_l_s numeric(6, 3) check (fef2575_l_s between 0.03 and 12),
  quality text,
  note text,
  ${entryColumns},
  unique (clinic_id, id),
  check (entry = 'maneuvers' or (fev1_ml is not null and fvc_ml is not null and fev1_ml <= fvc_ml))
);
create index spirometry_tests_of_patient on spirometry_tests (patient_id, performed_at desc, id desc);
create index spirometry_tests_of_visit on spirometry_tests (visit_id);

create table maneuvers (
  spirometry_test_id uuid not null,
  clinic_id uuid not null,
  number smallint not null check (number between 1 and 8),
  fev1_ml integer not null check (fev1_ml between 100 and 8000),
  fvc_ml integer not null check (fvc_ml between 200 and 10000),
  pef_l_s numeric(6, 3) check (pef_l_s between 0.2 and 20),
  fef2575_l_s numeric(6, 3) check (fef2575_l_s between 0.03 and 12),
  forced_time_s numeric(5, 2) check (forced_time_s between 0.1 and 60),
  fev1_accepted boolean not null default true,
  fvc_accepted boolean not null default true,
  reason text,
  primary key (spirometry_test_id, number),
  foreign key (clinic_id, spirometry_test_id) references spirometry_tests (clinic_id, id),
  check (fev1_ml <= fvc_ml)
);

-- The one fact table every trend reads. Values are in the storage unit of the measure's registry entry
-- (volumes in whole milliliters); written in the same transaction as their source.
create table measurements (
  id uuid primary key,
  clinic_id uuid not null references clinics (id),
  patient_id uuid not null,
  enrollment_id uuid,
  measure text not null check (length(measure) between 1 and 40),
  taken_at timestamptz not null,
  value double precision not null check (value between -1e6 and 1e6),
  state text check (state in ('before', 'after', 'none', 'unknown')),
  conditions jsonb not null default '{}' check (jsonb_typeof(conditions) = 'object'),
  quality text check (quality in ('A', 'B', 'C', 'D', 'E', 'U', 'F')),
  height_cm numeric(4, 1) check (height_cm between 120.0 and 220.0),
  height_method text check (height_method in ('measured', 'stated', 'arm-span')),
  height_carried boolean not null default false,
  weight_kg numeric(4, 1) check (weight_kg between 20 and 350),
  safety_answer text check (safety_answer in ('0', '1', '2', '3', 'not-answered')),
  note text,
  source_kind text not null check (source_kind in ('spirometry-test', 'measurement', 'body-size', 'derived')),
  source_id uuid not null,
  ${entryColumns},
  foreign key (clinic_id, enrollment_id) references enrollments (clinic_id, id),
  check ((height_cm is null) = (height_method is null)),
  unique (source_kind, source_id, measure)
);
create index measurements_for_trends on measurements (patient_id, taken_at, id) where voided_at is null;
create index measurements_by_measure on measurements (patient_id, measure, taken_at desc, id desc);
create index measurements_entered on measurements (patient_id, taken_at desc, id desc) where source_kind = 'measurement';

create table file_entries (
  id uuid primary key,
  clinic_id uuid not null references clinics (id),
  patient_id uuid not null,
  kind text not null check (kind in ('diagnosis', 'exacerbation', 'oxygen-order', 'medicine', 'heart-rhythm',
    'smoking', 'safety-hold')),
  on_date date not null,
  details jsonb not null check (jsonb_typeof(details) = 'object'),
  note text,
  released_at timestamptz,
  released_by uuid,
  release_reason text,
  ${entryColumns},
  foreign key (clinic_id, released_by) references users (clinic_id, id),
  check ((released_at is null) = (released_by is null) and (released_at is null) = (release_reason is null)),
  check (released_at is null or kind = 'safety-hold'),
  check (kind <> 'diagnosis' or details ? 'diagnosisGroup'),
  check (kind <> 'exacerbation' or details ?& array['steroid', 'antibiotic', 'admitted']),
  check (kind <> 'oxygen-order' or details ?& array['device', 'prescriber', 'outside']),
  check (kind <> 'medicine' or details ?& array['name', 'medicineClass']),
  check (kind <> 'heart-rhythm' or details ? 'atrialFibrillation'),
  check (kind <> 'smoking' or details ? 'status'),
  check (kind <> 'safety-hold' or details ? 'item')
);
create index file_entries_of_patient on file_entries (patient_id, on_date desc, id desc);
create index file_entries_by_kind on file_entries (patient_id, kind, on_date desc, created_at desc)
  where voided_at is null;

create table clinical_revisions (
  id uuid primary key,
  clinic_id uuid not null references clinics (id),
  patient_id uuid not null,
  entity_kind text not null check (entity_kind in ('spirometry-test', 'measurement', 'body-size', 'file-entry')),
  entity_id uuid not null,
  version integer not null,
  snapshot jsonb not null,
  reason text not null check (length(btrim(reason)) > 0),
  changed_by uuid not null,
  changed_at timestamptz not null,
  foreign key (clinic_id, patient_id) references patients (clinic_id, id),
  foreign key (clinic_id, changed_by) references users (clinic_id, id),
  unique (entity_kind, entity_id, version)
);
create trigger clinical_revisions_append_only before update or delete on clinical_revisions
  for each row execute function refuse_change();

create table flags (
  id uuid primary key,
  clinic_id uuid not null references clinics (id),
  patient_id uuid not null,
  rule text not null check (length(rule) between 1 and 60),
  status text not null default 'open' check (status in ('open', 'resolved')),
  raised_at timestamptz not null,
  resolved_at timestamptz,
  resolved_by uuid,
  resolution text,
  version integer not null default 1 check (version >= 1),
  created_at timestamptz not null,
  updated_at timestamptz not null,
  unique (clinic_id, id),
  foreign key (clinic_id, patient_id) references patients (clinic_id, id),
  foreign key (clinic_id, resolved_by) references users (clinic_id, id),
  check ((status = 'resolved') = (resolved_at is not null and resolution is not null))
);
create unique index flags_one_open on flags (patient_id, rule) where status = 'open';
create index flags_of_patient on flags (patient_id, raised_at desc);

create table flag_occurrences (
  id uuid primary key,
  clinic_id uuid not null,
  flag_id uuid not null,
  source_kind text not null,
  source_id uuid not null,
  detail text not null,
  occurred_at timestamptz not null,
  withdrawn_at timestamptz,
  created_at timestamptz not null,
  foreign key (clinic_id, flag_id) references flags (clinic_id, id)
);
create index flag_occurrences_of_flag on flag_occurrences (flag_id, occurred_at desc);
create index flag_occurrences_of_source on flag_occurrences (source_kind, source_id);

-- The only projection: one row an enrollment, rebuilt by a command and proved equal to recomputation.
create table enrollment_summaries (
  enrollment_id uuid primary key,
  clinic_id uuid not null,
  patient_id uuid not null,
  pattern jsonb,
  measures jsonb not null default '{}' check (jsonb_typeof(measures) = 'object'),
  last_test_on date,
  computed_at timestamptz not null,
  foreign key (clinic_id, enrollment_id) references enrollments (clinic_id, id),
  foreign key (clinic_id, patient_id) references patients (clinic_id, id)
);
create index enrollment_summaries_of_patient on enrollment_summaries (patient_id);

create function refuse_delete() returns trigger language plpgsql as $$
begin
  raise exception '% are amended or voided, never deleted', tg_table_name;
end $$;
create trigger no_delete before delete on body_sizes for each row execute function refuse_delete();
create trigger no_delete before delete on spirometry_tests for each row execute function refuse_delete();
create trigger no_delete before delete on measurements for each row execute function refuse_delete();
create trigger no_delete before delete on file_entries for each row execute function refuse_delete();
create trigger no_delete before delete on flags for each row execute function refuse_delete();
create trigger no_delete before delete on enrollments for each row execute function refuse_delete();
create trigger no_delete before delete on patients for each row execute function refuse_delete();
`;

export const clinicalRecord: Migration = { name: '0002-clinical-record', sql };
