import type { TestListItem } from '@slighthill/shared/contracts/measurement';
import { Link } from 'react-router-dom';
import { formatDate } from '../../../lib/clinic-time';
import { Badge } from '../../../ui/badge';
import { Cell, HeaderCell, Row, Table, TableBody, TableHead } from '../../../ui/table';
import { testName, testResultWords } from './describe-test';

interface TestTableProps {
  patientId: string;
  tests: readonly TestListItem[];
}

export const TestTable = ({ patientId, tests }: TestTableProps) => (
  <Table caption="Tests">
    <TableHead>
      <HeaderCell>Date</HeaderCell>
      <HeaderCell>Test</HeaderCell>
      <HeaderCell>Result</HeaderCell>
      <HeaderCell>Entered by</HeaderCell>
    </TableHead>
    <TableBody>
      {tests.map((test) => (
        <Row key={`${test.kind} ${test.id}`} className="relative hover:bg-mist">
          <Cell className="whitespace-nowrap text-ink-soft">{formatDate(test.on)}</Cell>
          <Cell asHeader>
            <Link
              to={`/patients/${patientId}/tests/${test.kind}/${test.id}`}
              className="-my-1.25 inline-flex min-h-8 items-center rounded-tag font-semibold text-tarn after:absolute after:inset-0 hover:text-tarn-deep"
            >
              {testName(test)}
            </Link>
          </Cell>
          <Cell label="Result">
            <span className="flex flex-wrap items-center gap-x-3 gap-y-1">
              {test.voided ? <del className="text-ink-soft">{testResultWords(test)}</del> : testResultWords(test)}
              {test.voided && <Badge tone="danger">Voided</Badge>}
              {test.amended && !test.voided && <Badge>Amended</Badge>}
            </span>
          </Cell>
          <Cell label="Entered by" className="text-ink-soft">
            {test.recordedByName}
          </Cell>
        </Row>
      ))}
    </TableBody>
  </Table>
);
