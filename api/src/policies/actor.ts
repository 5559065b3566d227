import type { Role } from '@slighthill/shared/permissions';

/** The signed-in person, as every policy, service and query sees them. */
export interface Actor {
  userId: string;
  displayName: string;
  roles: readonly Role[];
  patientId: string | null;
  clinicId: string;
  clinic: ActorClinic;
}

export interface ActorClinic {
  name: string;
  timeZone: string;
  phone: string | null;
  ratioRule: 'fixed-ratio' | 'lln';
  fev1SeverityRule: 'ats-ers-2005' | 'ers-ats-2021' | 'gold';
  tlcSeverityRule: 'tlc-percent' | 'ers-ats-2021';
  tlcWindowDays: number;
}
