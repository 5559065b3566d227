import { staffRoles, type StaffRole } from '@slighthill/shared/permissions';

/** Names of the roles an administrator gives. What each may do is decided by the server alone. */
export const roleLabels: Record<StaffRole, string> = {
  administrator: 'Administrator',
  coordinator: 'Coordinator',
  therapist: 'Therapist',
  pulmonologist: 'Pulmonologist',
};

export const roleHints: Record<StaffRole, string> = {
  administrator: 'Users, programs, rules and the audit trail; nothing clinical',
  coordinator: 'Patients, enrollment, tests',
  therapist: 'Tests and scores',
  pulmonologist: 'Tests, oxygen orders, releases safety holds',
};

export const roleWords = (roles: readonly StaffRole[]): string =>
  staffRoles
    .filter((role) => roles.includes(role))
    .map((role) => roleLabels[role])
    .join(', ');
