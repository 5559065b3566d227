import type { AuditEventRow } from '@slighthill/shared/contracts/clinic';
import { formatInstant } from '../../lib/clinic-time';
import { useClinicZone } from '../../lib/session';
import { Badge } from '../../ui/badge';
import { Cell, Row } from '../../ui/table';
import { actionWords } from './action-words';

interface AuditRowProps {
  event: AuditEventRow;
  onPatient: (patient: { id: string; name: string }) => void;
}

export const AuditRow = ({ event, onPatient }: AuditRowProps) => {
  const timeZone = useClinicZone();
  const unnamed = event.patientCount - event.patients.length;
  return (
    <Row>
      <Cell label="When" className="whitespace-nowrap">
        {formatInstant(event.at, timeZone)}
      </Cell>
      <Cell label="Who" className="whitespace-nowrap">
        {event.actorName}
      </Cell>
      <Cell label="What">
        <span className="inline-flex flex-wrap items-center gap-2">
          {actionWords(event.action)}
          {event.outcome === 'refused' && <Badge tone="attention">Refused</Badge>}
        </span>
      </Cell>
      <Cell label="Patients">
        <span>
          {event.patients.map((patient) => (
            <button
              key={patient.id}
              type="button"
              className="link mr-3 inline-flex min-h-6 items-center gap-1"
              onClick={() => onPatient({ id: patient.id, name: patient.name })}
            >
              {patient.name} <span className="font-normal text-ink-soft">{patient.recordNumber}</span>
            </button>
          ))}
          {unnamed > 0 && <span className="text-ink-soft">{`and ${unnamed} more`}</span>}
        </span>
      </Cell>
      <Cell label="From" className="text-ink-soft">
        {event.address ?? ''}
      </Cell>
    </Row>
  );
};
