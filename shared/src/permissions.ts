/**
 * Names of what a person may do. Which role holds which ability is decided once, in the API's policy matrix;
 * the web only asks whether an ability was served.
 */
export const abilities = [
  'clinic:manage',
  'users:manage',
  'programs:read',
  'programs:manage',
  'audit:read',
  'patients:read',
  'patients:write',
  'enrollments:read',
  'enrollments:write',
  'tests:read',
  'tests:write',
  'file:read',
  'file:write',
  'oxygen:order',
  'holds:release',
  'trends:read',
  'predictions:compute',
  'flags:resolve',
  'drafts:own',
  'me:read',
] as const;

export type Ability = (typeof abilities)[number];

export const roles = ['administrator', 'coordinator', 'therapist', 'pulmonologist', 'patient'] as const;

export type Role = (typeof roles)[number];

/** Roles a member of staff may hold together; a patient account holds no other. */
export const staffRoles = ['administrator', 'coordinator', 'therapist', 'pulmonologist'] as const;

export type StaffRole = (typeof staffRoles)[number];

/** Areas of the web in the order of the top navigation. */
export const areas = ['patients', 'clinic', 'home'] as const;

export type Area = (typeof areas)[number];
