import type { Sequelize } from 'sequelize';
import { initAccountLink } from './account-link';
import { initAuditEvent } from './audit-event';
import { initAuthSession } from './auth-session';
import { initBodySize } from './body-size';
import { initClinic } from './clinic';
import { initClinicalRevision } from './clinical-revision';
import { initDraft } from './draft';
import { initEnrollment } from './enrollment';
import { initFileEntry } from './file-entry';
import { initFlag } from './flag';
import { initManeuver } from './maneuver';
import { initMeasurement } from './measurement';
import { initPatient } from './patient';
import { initProgram } from './program';
import { initSpirometryTest } from './spirometry-test';
import { initUser } from './user';

export function initModels(sequelize: Sequelize): void {
  for (const init of [
    initClinic,
    initUser,
    initAuthSession,
    initAccountLink,
    initPatient,
    initProgram,
    initEnrollment,
    initBodySize,
    initSpirometryTest,
    initManeuver,
    initMeasurement,
    initFileEntry,
    initClinicalRevision,
    initFlag,
    initDraft,
    initAuditEvent,
  ])
    init(sequelize);
}
