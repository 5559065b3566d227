import type { Maneuver } from '@slighthill/shared/contracts/spirometry-test';
import { formatNumber } from '@slighthill/shared/format';
import { Cell, HeaderCell, Row, Table, TableBody, TableHead } from '../../../ui/table';

interface ManeuverTableProps {
  maneuvers: readonly Maneuver[];
}

const shown = (value: number | null, decimals = 2): string => (value === null ? '' : formatNumber(value, decimals));

/** A value that was not used is struck through and says so. */
const Used = ({ used, children }: { used: boolean; children: string }) =>
  used ? children : <del className="text-ink-soft">{children}</del>;

const notUsed = (maneuver: Maneuver): string => {
  const names = [!maneuver.fev1Accepted && 'FEV1', !maneuver.fvcAccepted && 'FVC'].filter(Boolean).join(' and ');
  const words = names === '' ? '' : `${names} not used`;
  return [words, maneuver.reason].filter(Boolean).join(': ');
};

/** Every blow as it was entered. */
export const ManeuverTable = ({ maneuvers }: ManeuverTableProps) => {
  const withFef = maneuvers.some((maneuver) => maneuver.fef2575 !== null);
  return (
    <Table caption="Maneuvers">
      <TableHead>
        <HeaderCell>Maneuver</HeaderCell>
        <HeaderCell numeric>FEV1, L</HeaderCell>
        <HeaderCell numeric>FVC, L</HeaderCell>
        <HeaderCell numeric>PEF, L/s</HeaderCell>
        {withFef && <HeaderCell numeric>FEF25-75, L/s</HeaderCell>}
        <HeaderCell numeric>Time, s</HeaderCell>
        <HeaderCell>Note</HeaderCell>
      </TableHead>
      <TableBody>
        {maneuvers.map((maneuver, index) => (
          <Row key={index}>
            <Cell asHeader label="Maneuver">
              {index + 1}
            </Cell>
            <Cell label="FEV1, L" numeric>
              <Used used={maneuver.fev1Accepted}>{shown(maneuver.fev1)}</Used>
            </Cell>
            <Cell label="FVC, L" numeric>
              <Used used={maneuver.fvcAccepted}>{shown(maneuver.fvc)}</Used>
            </Cell>
            <Cell label="PEF, L/s" numeric>
              {shown(maneuver.pef)}
            </Cell>
            {withFef && (
              <Cell label="FEF25-75, L/s" numeric>
                {shown(maneuver.fef2575)}
              </Cell>
            )}
            <Cell label="Time, s" numeric>
              {shown(maneuver.forcedTimeS, 1)}
            </Cell>
            <Cell label="Note" className="text-note text-ink-soft">
              {notUsed(maneuver)}
            </Cell>
          </Row>
        ))}
      </TableBody>
    </Table>
  );
};
