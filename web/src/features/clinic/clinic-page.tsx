import { Outlet } from 'react-router-dom';
import type { Ability } from '@slighthill/shared/permissions';
import { useSessionUser } from '../../lib/session';
import { MarginNav } from '../../ui/margin-nav';
import { MarginSection } from '../../ui/margin-section';

const sections: { to: string; label: string; needs: Ability }[] = [
  { to: '/clinic/users', label: 'Users', needs: 'users:manage' },
  { to: '/clinic/programs', label: 'Programs', needs: 'programs:manage' },
  { to: '/clinic/rules', label: 'Rules', needs: 'clinic:manage' },
  { to: '/clinic/audit', label: 'Audit trail', needs: 'audit:read' },
];

export const Component = () => {
  const { abilities } = useSessionUser();
  return (
    <div className="page-frame py-6">
      <MarginSection
        margin={<MarginNav label="Clinic" items={sections.filter((section) => abilities.includes(section.needs))} />}
      >
        <Outlet />
      </MarginSection>
    </div>
  );
};
