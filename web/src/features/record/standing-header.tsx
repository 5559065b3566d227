import { useRef, type ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { Patient } from '@slighthill/shared/contracts/patient';
import { diagnosisGroupLabels } from '@slighthill/shared/vocabulary';
import { clinicDateOf, formatDate } from '../../lib/clinic-time';
import { useClinicZone } from '../../lib/session';
import { cx } from '../../ui/cx';
import { Icon } from '../../ui/icon';
import { FlagChips } from './flag-chips';
import { courseWords, enrollHash, oxygenWords } from './record-words';

interface FactProps {
  label: string;
  note?: string | false;
  className?: string;
  children: ReactNode;
}

const Fact = ({ label, note, className, children }: FactProps) => (
  <div className={className}>
    <dt className="text-note whitespace-nowrap text-ink-soft">{label}</dt>
    <dd className="whitespace-nowrap">
      {children}
      {note && <span className="text-note text-ink-soft"> {note}</span>}
    </dd>
  </div>
);

interface StandingHeaderProps {
  patient: Patient;
  /** The Record button with its menu, where the reader may record. */
  record: ReactNode;
}

/** What is missing leads to where it is given, for those who may. */
const CourseFact = ({ patient: { id, enrollment, abilities } }: { patient: Patient }) => {
  const today = clinicDateOf(new Date(), useClinicZone());
  const words = courseWords(enrollment, today);
  if (enrollment || !abilities.includes('enroll')) return words;
  return (
    <Link to={`/patients/${id}/details${enrollHash}`} className="link">
      {words}
    </Link>
  );
};

/** An open safety hold stands beside the flags; its words and its release are in the file. */
const HoldChip = ({ patientId }: { patientId: string }) => (
  <Link
    to={`/patients/${patientId}/file`}
    className="inline-flex min-h-8 items-center gap-2 rounded-chip bg-rowan-wash px-3 text-note font-semibold whitespace-nowrap text-rowan"
  >
    <Icon name="alert" size={16} />
    Exercise on hold
  </Link>
);

/** Who this is, always in sight; under 1000 px it keeps name, course and flags. */
export const StandingHeader = ({ patient, record }: StandingHeaderProps) => {
  const name = useRef<HTMLHeadingElement>(null);
  return (
    <header
      data-record-header
      className="sticky top-(--top-bar-height) z-20 border-b border-line bg-surface print:static print:border-rule"
    >
      <div className="page-frame flex min-h-20 flex-wrap items-center gap-x-6 gap-y-1.5 py-2 margin:flex-nowrap margin:py-1">
        <div className="min-w-0 grow basis-40 margin:min-w-46 margin:grow-0 margin:basis-auto">
          <h1 ref={name} tabIndex={-1} className="text-record">
            {patient.givenName} {patient.familyName}
          </h1>
          <p className="text-note whitespace-nowrap text-ink-soft">
            {patient.ageYears}, born {formatDate(patient.birthDate)}
          </p>
        </div>
        <span aria-hidden="true" className="order-3 h-0 basis-full margin:hidden print:hidden" />
        <dl className="order-4 flex gap-x-6 margin:order-none print:order-none">
          <Fact
            label="Diagnosis group"
            note={!patient.diagnosisConfirmed && 'not confirmed'}
            className="hidden margin:block print:block"
          >
            {diagnosisGroupLabels[patient.diagnosisGroup]}
          </Fact>
          <Fact label="Course" className="max-margin:[&>dt]:sr-only print:[&>dt]:not-sr-only">
            <CourseFact patient={patient} />
          </Fact>
          <Fact label="Oxygen" className={cx('hidden print:block', patient.oxygen ? 'margin:block' : 'drawer:block')}>
            {oxygenWords(patient.oxygen)}
          </Fact>
        </dl>
        <div className="order-5 flex min-w-0 flex-wrap gap-x-2 gap-y-1 margin:order-none margin:ml-auto margin:justify-end print:ml-auto">
          {patient.openHolds > 0 && <HoldChip patientId={patient.id} />}
          <FlagChips patient={patient} onGone={() => name.current?.focus()} />
        </div>
        <div data-print="hide" className="order-2 margin:order-none">
          {record}
        </div>
      </div>
    </header>
  );
};
