import type { Migration } from './migration';

const sql = /* sql */ `
create table clinics (
  id uuid primary key,
  name text not null check (length(btrim(name)) between 1 and 120),
  time_zone text not null,
  phone text,
  ratio_rule text not null default 'fixed-ratio' check (ratio_rule in ('fixed-ratio', 'lln')),
  fev1_severity_rule text not null default 'ats-ers-2005'
    check (fev1_severity_rule in ('ats-ers-2005', 'ers-ats-2021', 'gold')),
  tlc_severity_rule text not null default 'tlc-percent' check (tlc_severity_rule in ('tlc-percent', 'ers-ats-2021')),
  tlc_window_days integer not null default 180 check (tlc_window_days between 1 and 730),
  next_record_number integer not null default 1001 check (next_record_number > 0),
  demo boolean not null default false,
  version integer not null default 1 check (version >= 1),
  created_at timestamptz not null,
  updated_at timestamptz not null
);

create table patients (
  id uuid primary key,
  clinic_id uuid not null references clinics (id),
  given_name text not null check (length(btrim(given_name)) between 1 and 80),
  family_name text not null check (length(btrim(family_name)) between 1 and 80),
  given_key text collate "C" not null,
  family_key text collate "C" not null,
  birth_date date not null,
  sex_for_prediction text not null check (sex_for_prediction in ('male', 'female')),
  diagnosis_group text not null check (diagnosis_group in ('copd', 'ild', 'asthma', 'bronchiectasis', 'post-covid',
    'pulmonary-hypertension', 'surgery-or-transplant', 'other')),
  record_number text not null check (length(btrim(record_number)) between 1 and 30),
  record_key text collate "C" not null,
  email text,
  phone text,
  -- which of the lists the patient stands in; kept by the enrollment services in their own transaction
  list text not null default 'none' check (list in ('none', 'current', 'finished')),
  created_by uuid,
  version integer not null default 1 check (version >= 1),
  created_at timestamptz not null,
  updated_at timestamptz not null,
  unique (clinic_id, id),
  constraint patients_record_number_key unique (clinic_id, record_key)
);
create index patients_by_name on patients (clinic_id, family_key, given_key, id);
create index patients_by_given_name on patients (clinic_id, given_key, family_key, id);
create index patients_by_birth_date on patients (clinic_id, birth_date, family_key, given_key, id);
create index patients_by_list on patients (clinic_id, list, family_key, given_key, id);

create table users (
  id uuid primary key,
  clinic_id uuid not null references clinics (id),
  email text not null,
  display_name text not null check (length(btrim(display_name)) between 1 and 120),
  credential text,
  roles text[] not null,
  password_hash text,
  patient_id uuid,
  disabled_at timestamptz,
  version integer not null default 1 check (version >= 1),
  created_at timestamptz not null,
  updated_at timestamptz not null,
  unique (clinic_id, id),
  foreign key (clinic_id, patient_id) references patients (clinic_id, id),
  check (cardinality(roles) >= 1),
  check (roles <@ array['administrator', 'coordinator', 'therapist', 'pulmonologist', 'patient']),
  check (case when 'patient' = any (roles) then cardinality(roles) = 1 and patient_id is not null
    else patient_id is null end)
);
create unique index users_email_key on users (lower(email));
create unique index users_patient_key on users (patient_id) where patient_id is not null;
create index users_by_name on users (clinic_id, display_name, id);
alter table patients add foreign key (clinic_id, created_by) references users (clinic_id, id);

create table auth_sessions (
  id uuid primary key,
  token_hash text not null unique,
  user_id uuid not null references users (id),
  expires_at timestamptz not null,
  last_active_at timestamptz not null,
  created_at timestamptz not null
);
create index auth_sessions_of_user on auth_sessions (user_id);
create index auth_sessions_by_expiry on auth_sessions (expires_at);

create table account_links (
  id uuid primary key,
  token_hash text not null unique,
  user_id uuid not null references users (id),
  expires_at timestamptz not null,
  used_at timestamptz,
  created_at timestamptz not null
);
create index account_links_of_user on account_links (user_id);

-- Counts failed sign-ins. Losing them in a crash is harmless, so the table is not logged.
create unlogged table rate_limits (
  key text primary key,
  hits integer not null,
  resets_at timestamptz not null
);

create table programs (
  id uuid primary key,
  clinic_id uuid not null references clinics (id),
  name text not null check (length(btrim(name)) between 1 and 120),
  planned_sessions integer not null check (planned_sessions between 1 and 200),
  weeks integer not null check (weeks between 1 and 104),
  sessions_per_day integer not null check (sessions_per_day between 1 and 4),
  sessions_per_week integer not null check (sessions_per_week between 1 and 14),
  session_kinds text[] not null check (cardinality(session_kinds) >= 1
    and session_kinds <@ array['exercise', 'education', 'assessment']),
  retired_at timestamptz,
  version integer not null default 1 check (version >= 1),
  created_at timestamptz not null,
  updated_at timestamptz not null,
  unique (clinic_id, id)
);
create unique index programs_name_key on programs (clinic_id, lower(name)) where retired_at is null;
create index programs_by_name on programs (clinic_id, name, id);

create table enrollments (
  id uuid primary key,
  clinic_id uuid not null references clinics (id),
  patient_id uuid not null,
  program_id uuid not null,
  status text not null
    check (status in ('planned', 'active', 'paused', 'completed', 'partly-completed', 'withdrawn')),
  start_on date not null,
  planned_end_on date not null,
  planned_sessions integer not null check (planned_sessions between 1 and 200),
  ended_on date,
  consent_on date,
  status_reason text,
  first_exercise_on date,
  last_session_on date,
  version integer not null default 1 check (version >= 1),
  created_at timestamptz not null,
  updated_at timestamptz not null,
  unique (clinic_id, id),
  foreign key (clinic_id, patient_id) references patients (clinic_id, id),
  foreign key (clinic_id, program_id) references programs (clinic_id, id),
  check (planned_end_on >= start_on),
  check (ended_on is null or ended_on >= start_on),
  check ((status in ('completed', 'partly-completed', 'withdrawn')) = (ended_on is not null))
);
create unique index enrollments_one_open on enrollments (patient_id) where status in ('planned', 'active', 'paused');
create index enrollments_of_patient on enrollments (patient_id, start_on desc, id desc);

create table audit_events (
  id bigint generated always as identity primary key,
  clinic_id uuid not null references clinics (id),
  at timestamptz not null,
  actor_id uuid references users (id),
  actor_name text not null,
  action text not null,
  outcome text not null check (outcome in ('done', 'refused')),
  patient_ids uuid[] not null default '{}',
  entity_kind text,
  entity_id uuid,
  address text,
  detail jsonb not null default '{}' check (jsonb_typeof(detail) = 'object')
);
create index audit_events_by_time on audit_events (clinic_id, id desc);
create index audit_events_by_actor on audit_events (clinic_id, actor_id, id desc);
create index audit_events_by_patient on audit_events using gin (patient_ids);

create function refuse_change() returns trigger language plpgsql as $$
begin
  raise exception '% is append-only', tg_table_name;
end $$;
create trigger audit_events_append_only before update or delete on audit_events
  for each row execute function refuse_change();

-- Ids chosen by clients: the same id and body again answers with the first result.
create table created_ids (
  kind text not null,
  id uuid not null,
  clinic_id uuid not null references clinics (id),
  body_hash text not null,
  created_at timestamptz not null,
  primary key (kind, id)
);

create table drafts (
  id uuid primary key,
  clinic_id uuid not null references clinics (id),
  owner_id uuid not null,
  form text not null,
  subject text not null,
  content jsonb not null check (jsonb_typeof(content) = 'object'),
  saved_at timestamptz not null,
  expires_at timestamptz not null,
  foreign key (clinic_id, owner_id) references users (clinic_id, id),
  unique (owner_id, form, subject)
);
create index drafts_by_expiry on drafts (expires_at);
`;

export const peopleAndAccess: Migration = { name: '0001-people-and-access', sql };
