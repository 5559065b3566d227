import { useInfiniteQuery } from '@tanstack/react-query';
import type { Program } from '@slighthill/shared/contracts/clinic';
import { useState } from 'react';
import { usePageTitle } from '../../lib/page-title';
import { useAbility } from '../../lib/session';
import { Badge } from '../../ui/badge';
import { Button } from '../../ui/button';
import { EmptyState } from '../../ui/empty-state';
import { PageHeader } from '../../ui/page-header';
import { Cell, HeaderCell, Row, Table, TableBody, TableHead } from '../../ui/table';
import { VisuallyHidden } from '../../ui/visually-hidden';
import { ListState } from './list-state';
import { ProgramDrawer } from './program-drawer';
import { kindWords } from './program-words';
import { programsQuery } from './queries';

interface ProgramRowProps {
  program: Program;
  onEdit: (() => void) | null;
}

const ProgramRow = ({ program, onEdit }: ProgramRowProps) => (
  <Row>
    <Cell asHeader className="font-semibold">
      {program.name}
    </Cell>
    <Cell label="Sessions" numeric>
      {program.plannedSessions}
    </Cell>
    <Cell label="Weeks" numeric>
      {program.weeks}
    </Cell>
    <Cell label="A week" numeric>
      {program.sessionsPerWeek}
    </Cell>
    <Cell label="A day" numeric>
      {program.sessionsPerDay}
    </Cell>
    <Cell label="Kinds">{kindWords(program.sessionKinds)}</Cell>
    <Cell label="State">{program.retired ? <Badge>Retired</Badge> : <Badge tone="good">Open</Badge>}</Cell>
    <Cell className="text-right">
      {onEdit && (
        <Button size="row" kind="quiet" onClick={onEdit} aria-label={`Edit ${program.name}`}>
          Edit
        </Button>
      )}
    </Cell>
  </Row>
);

export const Component = () => {
  usePageTitle('Programs');
  const query = useInfiniteQuery(programsQuery);
  const mayManage = useAbility('programs:manage');
  const [open, setOpen] = useState<Program | 'new' | null>(null);
  const programs = query.data?.pages.flatMap((page) => page.items) ?? [];
  const add = (
    <Button kind="main" icon="plus" onClick={() => setOpen('new')}>
      New program
    </Button>
  );

  return (
    <>
      <PageHeader
        title="Programs"
        note="Templates of a course of rehabilitation"
        actions={mayManage && programs.length > 0 && add}
      />
      <div className="mt-4">
        {programs.length > 0 && (
          <Table caption="Programs">
            <TableHead>
              <HeaderCell>Name</HeaderCell>
              <HeaderCell numeric>Sessions</HeaderCell>
              <HeaderCell numeric>Weeks</HeaderCell>
              <HeaderCell numeric>A week</HeaderCell>
              <HeaderCell numeric>A day</HeaderCell>
              <HeaderCell>Kinds</HeaderCell>
              <HeaderCell>State</HeaderCell>
              <HeaderCell>
                <VisuallyHidden>Actions</VisuallyHidden>
              </HeaderCell>
            </TableHead>
            <TableBody>
              {programs.map((program) => (
                <ProgramRow key={program.id} program={program} onEdit={mayManage ? () => setOpen(program) : null} />
              ))}
            </TableBody>
          </Table>
        )}
        {query.isSuccess && programs.length === 0 && (
          <EmptyState action={mayManage && add}>
            There is no program yet. Patients are enrolled in a program.
          </EmptyState>
        )}
        <ListState query={query} label="Loading programs" />
      </div>
      {open && <ProgramDrawer program={open === 'new' ? null : open} onClose={() => setOpen(null)} />}
    </>
  );
};
