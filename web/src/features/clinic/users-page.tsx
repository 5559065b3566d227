import { useInfiniteQuery } from '@tanstack/react-query';
import type { StaffUser } from '@slighthill/shared/contracts/clinic';
import { useState } from 'react';
import { describeProblem } from '../../lib/api-problem';
import { usePageTitle } from '../../lib/page-title';
import { Button } from '../../ui/button';
import { ErrorNotice } from '../../ui/error-notice';
import { PageHeader } from '../../ui/page-header';
import { HeaderCell, Table, TableBody, TableHead } from '../../ui/table';
import { VisuallyHidden } from '../../ui/visually-hidden';
import { InvitationLink } from './invitation-link';
import { ListState } from './list-state';
import { useInviteUser, type IssuedInvitation } from './mutations';
import { usersQuery } from './queries';
import { UserDrawer } from './user-drawer';
import { UserRow } from './user-row';

interface ShownInvitation {
  user: StaffUser;
  invitation: IssuedInvitation;
}

export const Component = () => {
  usePageTitle('Users');
  const query = useInfiniteQuery(usersQuery);
  const [open, setOpen] = useState<StaffUser | 'new' | null>(null);
  const [shown, setShown] = useState<ShownInvitation | null>(null);
  const invite = useInviteUser();
  const users = query.data?.pages.flatMap((page) => page.items) ?? [];

  const issue = (user: StaffUser): void => {
    setShown(null);
    invite.mutate(user.id, { onSuccess: ({ invitation }) => setShown({ user, invitation }) });
  };

  return (
    <>
      <PageHeader
        title="Users"
        note={query.isSuccess ? `${users.length} staff` : undefined}
        actions={
          <Button kind="main" icon="plus" onClick={() => setOpen('new')}>
            New user
          </Button>
        }
      />
      {shown && (
        <InvitationLink name={shown.user.displayName} invitation={shown.invitation} onDone={() => setShown(null)} />
      )}
      {invite.error && (
        <ErrorNotice className="mt-4">{`No link was made. ${describeProblem(invite.error)}`}</ErrorNotice>
      )}
      <div className="mt-4">
        {users.length > 0 && (
          <Table caption="Users of this clinic">
            <TableHead>
              <HeaderCell>Name</HeaderCell>
              <HeaderCell>E-mail</HeaderCell>
              <HeaderCell>Roles</HeaderCell>
              <HeaderCell>State</HeaderCell>
              <HeaderCell>
                <VisuallyHidden>Actions</VisuallyHidden>
              </HeaderCell>
            </TableHead>
            <TableBody>
              {users.map((user) => (
                <UserRow
                  key={user.id}
                  user={user}
                  inviting={invite.isPending && invite.variables === user.id}
                  onEdit={() => setOpen(user)}
                  onInvite={() => issue(user)}
                />
              ))}
            </TableBody>
          </Table>
        )}
        <ListState query={query} label="Loading users" />
      </div>
      {open && (
        <UserDrawer
          user={open === 'new' ? null : open}
          onClose={() => setOpen(null)}
          onSaved={({ user, invitation }) => {
            setOpen(null);
            setShown(invitation ? { user, invitation } : null);
          }}
        />
      )}
    </>
  );
};
