import type { PatientListItem } from '@slighthill/shared/contracts/patient';
import { useRef, type KeyboardEvent } from 'react';
import { HeaderCell, Table, TableBody, TableHead } from '../../ui/table';
import { PatientRow } from './patient-row';

interface PatientTableProps {
  patients: readonly PatientListItem[];
  busy: boolean;
}

/** Up and Down move from name to name; Enter opens the record. */
export const PatientTable = ({ patients, busy }: PatientTableProps) => {
  const place = useRef<HTMLDivElement>(null);

  const move = (event: KeyboardEvent): void => {
    if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
    const links = [...(place.current?.querySelectorAll<HTMLElement>('[data-row-link]') ?? [])];
    const at = links.indexOf(document.activeElement as HTMLElement);
    if (at < 0) return;
    event.preventDefault();
    links[at + (event.key === 'ArrowDown' ? 1 : -1)]?.focus();
  };

  return (
    <div ref={place} onKeyDown={move}>
      <Table caption="Patients" busy={busy}>
        <TableHead>
          <HeaderCell>Name</HeaderCell>
          <HeaderCell numeric>Age</HeaderCell>
          <HeaderCell>Born</HeaderCell>
          <HeaderCell>Record no.</HeaderCell>
          <HeaderCell>Diagnosis</HeaderCell>
          <HeaderCell>Course</HeaderCell>
          <HeaderCell>Pattern</HeaderCell>
          <HeaderCell>Last test</HeaderCell>
          <HeaderCell>Flags</HeaderCell>
        </TableHead>
        <TableBody>
          {patients.map((patient) => (
            <PatientRow key={patient.id} patient={patient} />
          ))}
        </TableBody>
      </Table>
    </div>
  );
};
