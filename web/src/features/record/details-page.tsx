import { lazy, Suspense, useEffect, useRef, useState, type MouseEvent } from 'react';
import { useLocation } from 'react-router-dom';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { diagnosisGroupLabels, openEnrollmentStatuses } from '@slighthill/shared/vocabulary';
import { formatNumber } from '@slighthill/shared/format';
import { formatDate } from '../../lib/clinic-time';
import { usePageTitle } from '../../lib/page-title';
import { Button } from '../../ui/button';
import { SavedNote } from '../../ui/saved-note';
import { DetailList } from './detail-list';
import { enrollHash, enrollmentStatusLabels } from './record-words';
import { useRecord } from './record-context';
import { useFocusBack } from './use-focus-back';

const EditPatientDrawer = lazy(() =>
  import('./edit-patient-drawer').then((module) => ({ default: module.EditPatientDrawer })),
);
const EnrollDrawer = lazy(() => import('./enroll-drawer').then((module) => ({ default: module.EnrollDrawer })));
const ChangeEnrollmentDrawer = lazy(() =>
  import('./change-enrollment-drawer').then((module) => ({ default: module.ChangeEnrollmentDrawer })),
);

type Open = 'patient' | 'enroll' | 'enrollment' | null;

const sexWords = { female: 'Female', male: 'Male' } as const;

const personRows = (patient: Patient): [string, string][] => [
  ['Name', `${patient.givenName} ${patient.familyName}`],
  ['Date of birth', `${formatDate(patient.birthDate)}, ${patient.ageYears} years`],
  ['Sex used in prediction equations', sexWords[patient.sexForPrediction]],
  ['Record number', patient.recordNumber],
  [
    'Diagnosis group',
    `${diagnosisGroupLabels[patient.diagnosisGroup]}, ${patient.diagnosisConfirmed ? 'confirmed' : 'not confirmed'}`,
  ],
  ['E-mail', patient.email ?? 'None'],
  ['Phone', patient.phone ?? 'None'],
];

const bodyRows = ({ bodySize }: Patient): [string, string][] => {
  if (!bodySize) return [];
  const { heightCm, heightOn, weightKg, weightOn } = bodySize;
  return [
    [
      'Height',
      heightCm === null ? 'None' : `${formatNumber(heightCm, 1)} cm${heightOn ? `, ${formatDate(heightOn)}` : ''}`,
    ],
    [
      'Weight',
      weightKg === null ? 'None' : `${formatNumber(weightKg, 1)} kg${weightOn ? `, ${formatDate(weightOn)}` : ''}`,
    ],
  ];
};

const enrollmentRows = (enrollment: NonNullable<Patient['enrollment']>): [string, string][] => [
  ['Program', `${enrollment.programName}, ${enrollment.plannedSessions} sessions`],
  ['State', enrollmentStatusLabels[enrollment.status]],
  ['Start', formatDate(enrollment.startOn)],
  enrollment.endedOn ? ['Ended', formatDate(enrollment.endedOn)] : ['Planned end', formatDate(enrollment.plannedEndOn)],
  ['Consent', enrollment.consentOn ? formatDate(enrollment.consentOn) : 'Not recorded'],
  ...(enrollment.statusReason ? [['Reason', enrollment.statusReason] satisfies [string, string]] : []),
];

const isOpen = (enrollment: Patient['enrollment']): boolean =>
  enrollment !== null && (openEnrollmentStatuses as readonly string[]).includes(enrollment.status);

/** The header's "Not enrolled" leads here, to the button that changes it. */
const useEnrollButton = () => {
  const button = useRef<HTMLButtonElement>(null);
  const { hash, key } = useLocation();
  useEffect(() => {
    if (hash !== enrollHash) return undefined;
    // A new page first brings the focus to its heading.
    const timer = window.setTimeout(() => button.current?.focus());
    return () => window.clearTimeout(timer);
  }, [hash, key]);
  return button;
};

/** Who the patient is and the course; changed by whoever may. */
export const PatientDetails = () => {
  const { patient } = useRecord();
  const { enrollment } = patient;
  const [open, setOpen] = useState<Open>(null);
  const [saved, setSaved] = useState<string | null>(null);
  const enroll = useEnrollButton();
  const focusBackTo = useFocusBack(open !== null);
  const mayEnroll = patient.abilities.includes('enroll');
  const finish = (words: string): void => {
    setSaved(words);
    setOpen(null);
  };
  const begin =
    (what: Open) =>
    ({ currentTarget }: MouseEvent<HTMLButtonElement>): void => {
      focusBackTo(currentTarget);
      setSaved(null);
      setOpen(what);
    };
  return (
    <>
      <SavedNote>{saved}</SavedNote>
      <DetailList
        title="Patient"
        rows={[...personRows(patient), ...bodyRows(patient)]}
        action={
          patient.abilities.includes('edit') && (
            <Button icon="pen" size="row" onClick={begin('patient')}>
              Edit patient
            </Button>
          )
        }
      />
      <DetailList
        title="Enrollment"
        rows={enrollment ? enrollmentRows(enrollment) : []}
        empty="Not enrolled in a program yet."
        action={
          mayEnroll && (
            <span className="flex flex-wrap gap-2">
              {enrollment && isOpen(enrollment) && (
                <Button icon="pen" size="row" onClick={begin('enrollment')}>
                  Change enrollment
                </Button>
              )}
              {!isOpen(enrollment) && (
                <Button ref={enroll} kind="main" icon="plus" size="row" onClick={begin('enroll')}>
                  Enroll in a program
                </Button>
              )}
            </span>
          )
        }
      />
      <Suspense>
        {open === 'patient' && (
          <EditPatientDrawer
            patient={patient}
            onClose={() => setOpen(null)}
            onSaved={() => finish('Saved in the record')}
          />
        )}
        {open === 'enroll' && (
          <EnrollDrawer
            patient={patient}
            onClose={() => setOpen(null)}
            onSaved={(program) => finish(`Enrolled in ${program}`)}
          />
        )}
        {open === 'enrollment' && enrollment && (
          <ChangeEnrollmentDrawer
            patient={patient}
            enrollment={enrollment}
            onClose={() => setOpen(null)}
            onSaved={() => finish('Enrollment changed')}
          />
        )}
      </Suspense>
    </>
  );
};

export const Component = () => {
  const { patient } = useRecord();
  usePageTitle(`${patient.givenName} ${patient.familyName}, details`);
  return <PatientDetails />;
};
