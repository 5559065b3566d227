import type { PatientListItem } from '@slighthill/shared/contracts/patient';
import { diagnosisGroupLabels } from '@slighthill/shared/vocabulary';
import { Link } from 'react-router-dom';
import { clinicDateOf, formatDate } from '../../lib/clinic-time';
import { useClinicZone } from '../../lib/session';
import { Badge } from '../../ui/badge';
import { cx } from '../../ui/cx';
import { Cell, Row } from '../../ui/table';
import { VisuallyHidden } from '../../ui/visually-hidden';
import { courseWords } from './course-words';

interface PatientRowProps {
  patient: PatientListItem;
}

export const PatientRow = ({ patient }: PatientRowProps) => {
  const zone = useClinicZone();
  return (
    <Row className="relative hover:bg-mist">
      <Cell asHeader className="min-w-40">
        <Link
          to={`/patients/${patient.id}`}
          data-row-link
          className="-my-1.25 inline-flex min-h-8 items-center rounded-tag font-semibold text-tarn after:absolute after:inset-0 hover:text-tarn-deep"
        >
          {patient.familyName}, {patient.givenName}
        </Link>
      </Cell>
      <Cell label="Age" numeric className="max-row:hidden">
        {patient.ageYears}
      </Cell>
      <Cell label="Born" className="whitespace-nowrap text-ink-soft">
        {formatDate(patient.birthDate)}
        <span className="hidden max-row:inline">{`, ${patient.ageYears} years old`}</span>
      </Cell>
      <Cell label="Record no." className="text-ink-soft">
        {patient.recordNumber}
      </Cell>
      <Cell label="Diagnosis">{diagnosisGroupLabels[patient.diagnosisGroup]}</Cell>
      <Cell label="Course" className={cx('whitespace-nowrap', !patient.enrollment && 'text-ink-soft')}>
        {courseWords(patient.enrollment, clinicDateOf(new Date(), zone))}
      </Cell>
      <Cell label="Pattern">
        {patient.pattern ? (
          <span>
            {patient.pattern.heading}
            {patient.pattern.provisional && <span className="text-note text-ink-soft"> provisional</span>}
          </span>
        ) : (
          <span className="text-ink-soft">No spirometry</span>
        )}
      </Cell>
      <Cell label="Last test" className="whitespace-nowrap">
        {patient.lastTestOn ? formatDate(patient.lastTestOn) : <span className="text-ink-soft">None</span>}
      </Cell>
      <Cell label="Flags" className={cx('whitespace-nowrap', patient.openFlags === 0 && 'max-row:hidden')}>
        {patient.openFlags > 0 ? (
          <Badge tone="danger" icon="alert">
            {patient.openFlags === 1 ? '1 flag' : `${patient.openFlags} flags`}
          </Badge>
        ) : (
          <VisuallyHidden>None</VisuallyHidden>
        )}
      </Cell>
    </Row>
  );
};
