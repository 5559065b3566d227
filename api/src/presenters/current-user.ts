import type { CurrentUser } from '@slighthill/shared/contracts/auth';
import type { Area, Role } from '@slighthill/shared/permissions';
import { staffIdleS } from '../auth/session';
import type { Actor } from '../policies/actor';
import { abilitiesOf } from '../policies/matrix';

const titles: Record<Role, string> = {
  administrator: 'Administrator',
  coordinator: 'Coordinator',
  therapist: 'Therapist',
  pulmonologist: 'Pulmonologist',
  patient: 'Patient',
};

/** Which areas exist for whom; an area is drawn only when its screens exist. */
const areaOf: Record<Role, Area> = {
  coordinator: 'patients',
  therapist: 'patients',
  pulmonologist: 'patients',
  administrator: 'clinic',
  patient: 'home',
};

const pathOf: Record<Area, string> = { patients: '/patients', clinic: '/clinic', home: '/home' };

export function presentCurrentUser(actor: Actor, email: string): CurrentUser {
  const areas = (['patients', 'clinic', 'home'] as const).filter((area) =>
    actor.roles.some((role) => areaOf[role] === area),
  );
  const { name, timeZone, phone, ratioRule, fev1SeverityRule, tlcSeverityRule, tlcWindowDays } = actor.clinic;
  return {
    id: actor.userId,
    displayName: actor.displayName,
    title: actor.roles.map((role) => titles[role]).join(', '),
    email,
    clinic: { id: actor.clinicId, name, timeZone, phone, ratioRule, fev1SeverityRule, tlcSeverityRule, tlcWindowDays },
    abilities: abilitiesOf(actor.roles),
    areas,
    firstPath: pathOf[areas[0] ?? 'home'],
    idleSeconds: actor.roles.includes('patient') ? null : staffIdleS,
    patientId: actor.patientId,
  };
}
