import type { StaffUser } from '@slighthill/shared/contracts/clinic';
import { Badge, type BadgeTone } from '../../ui/badge';
import { Button } from '../../ui/button';
import { Cell, Row } from '../../ui/table';
import { roleWords } from './role-labels';

const states: Record<StaffUser['state'], { words: string; tone: BadgeTone }> = {
  invited: { words: 'Invited', tone: 'attention' },
  active: { words: 'Active', tone: 'good' },
  disabled: { words: 'May not sign in', tone: 'plain' },
};

interface UserRowProps {
  user: StaffUser;
  inviting: boolean;
  onEdit: () => void;
  onInvite: () => void;
}

export const UserRow = ({ user, inviting, onEdit, onInvite }: UserRowProps) => (
  <Row>
    <Cell asHeader className="font-semibold">
      {user.displayName}
      {user.credential && <span className="font-normal text-ink-soft">, {user.credential}</span>}
    </Cell>
    <Cell label="E-mail" className="break-all">
      {user.email}
    </Cell>
    <Cell label="Roles">{roleWords(user.roles)}</Cell>
    <Cell label="State">
      <Badge tone={states[user.state].tone}>{states[user.state].words}</Badge>
    </Cell>
    <Cell className="whitespace-nowrap">
      <span className="flex justify-end gap-2 max-row:w-full max-row:justify-start max-row:pt-2">
        {user.state !== 'disabled' && (
          <Button
            size="row"
            saving={inviting}
            savingLabel="Making a link"
            onClick={onInvite}
            aria-label={`New link for ${user.displayName}`}
          >
            New link
          </Button>
        )}
        <Button size="row" kind="quiet" onClick={onEdit} aria-label={`Edit ${user.displayName}`}>
          Edit
        </Button>
      </span>
    </Cell>
  </Row>
);
