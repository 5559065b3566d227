import type { StaffRole } from '@slighthill/shared/permissions';

export const demoPassword = 'slight-hill-demo';

export interface DemoStaff {
  role: StaffRole;
  email: string;
  displayName: string;
  credential: string | null;
}

export interface DemoClinic {
  id: string;
  name: string;
  timeZone: string;
  phone: string;
  seed: number;
  staff: readonly DemoStaff[];
}

export const alderFalls: DemoClinic = {
  id: '6d1f0c3a-58a2-4b0e-9c71-a1de2fa11501',
  name: 'Alder Falls Pulmonary Rehabilitation',
  timeZone: 'America/Denver',
  phone: '720-555-0110',
  seed: 4310,
  staff: [
    { role: 'administrator', email: 'admin@alderfalls.test', displayName: 'Corin Ashlock', credential: null },
    { role: 'coordinator', email: 'coordinator@alderfalls.test', displayName: 'Tamsin Wrede', credential: 'RN' },
    { role: 'therapist', email: 'therapist@alderfalls.test', displayName: 'Joss Ferrand', credential: 'RRT' },
    {
      role: 'pulmonologist',
      email: 'pulmonologist@alderfalls.test',
      displayName: 'Dr. Imre Castellow',
      credential: 'MD',
    },
  ],
};

/** Exists to show that nothing crosses clinics: one person runs it. */
export const stonebridge: DemoClinic = {
  id: '0b7e94d2-1c6f-4f35-8a40-570eb21d6e02',
  name: 'Stonebridge',
  timeZone: 'America/Chicago',
  phone: '312-555-0164',
  seed: 4311,
  staff: [
    { role: 'coordinator', email: 'coordinator@stonebridge.test', displayName: 'Della Marchbank', credential: 'RN' },
  ],
};

export const stonebridgePatients = 3;
