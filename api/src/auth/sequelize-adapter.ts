import type { Adapter, DatabaseSession, DatabaseUser } from 'lucia';
import { Op } from 'sequelize';
import { selectRow } from '../db/query';
import { AuthSession } from '../models/auth-session';
import type { Role } from '@slighthill/shared/permissions';
import { randomUUID } from 'node:crypto';
import type { ActorClinic } from '../policies/actor';
import { hashToken } from './tokens';

export interface SessionAttributes {
  lastActiveAt: Date;
  createdAt: Date;
}

export interface UserAttributes {
  email: string;
  displayName: string;
  roles: Role[];
  patientId: string | null;
  disabledAt: Date | null;
  clinicId: string;
  clinic: ActorClinic;
}

interface Row extends UserAttributes {
  userId: string;
  expiresAt: Date;
  lastActiveAt: Date;
  createdAt: Date;
}

const findSql = /* sql */ `
  select s.user_id as "userId", s.expires_at as "expiresAt", s.last_active_at as "lastActiveAt",
    s.created_at as "createdAt", u.email, u.display_name as "displayName", u.roles, u.patient_id as "patientId",
    u.disabled_at as "disabledAt", u.clinic_id as "clinicId",
    json_build_object('name', c.name, 'timeZone', c.time_zone, 'phone', c.phone, 'ratioRule', c.ratio_rule,
      'fev1SeverityRule', c.fev1_severity_rule, 'tlcSeverityRule', c.tlc_severity_rule,
      'tlcWindowDays', c.tlc_window_days) as clinic
  from auth_sessions s
  join users u on u.id = s.user_id
  join clinics c on c.id = u.clinic_id
  where s.token_hash = $tokenHash`;

/** Keeps only a hash of the session id, so that a copy of the table signs nobody in. */
export class SequelizeAdapter implements Adapter {
  async getSessionAndUser(sessionId: string): Promise<[DatabaseSession | null, DatabaseUser | null]> {
    const row = await selectRow<Row>(findSql, { tokenHash: hashToken(sessionId) });
    if (!row) return [null, null];
    const { userId, expiresAt, lastActiveAt, createdAt, ...attributes } = row;
    return [
      { id: sessionId, userId, expiresAt, attributes: { lastActiveAt, createdAt } },
      { id: userId, attributes },
    ];
  }

  async getUserSessions(userId: string): Promise<DatabaseSession[]> {
    const rows = await AuthSession.findAll({ where: { userId } });
    return rows.map((row) => ({
      id: row.tokenHash,
      userId: row.userId,
      expiresAt: row.expiresAt,
      attributes: { lastActiveAt: row.lastActiveAt, createdAt: row.createdAt },
    }));
  }

  async setSession(session: DatabaseSession): Promise<void> {
    await AuthSession.create({
      id: randomUUID(),
      tokenHash: hashToken(session.id),
      userId: session.userId,
      expiresAt: session.expiresAt,
      lastActiveAt: session.attributes.lastActiveAt,
      createdAt: session.attributes.createdAt,
    });
  }

  async updateSessionExpiration(sessionId: string, expiresAt: Date): Promise<void> {
    await AuthSession.update({ expiresAt }, { where: { tokenHash: hashToken(sessionId) } });
  }

  async deleteSession(sessionId: string): Promise<void> {
    await AuthSession.destroy({ where: { tokenHash: hashToken(sessionId) } });
  }

  async deleteUserSessions(userId: string): Promise<void> {
    await AuthSession.destroy({ where: { userId } });
  }

  async deleteExpiredSessions(): Promise<void> {
    await AuthSession.destroy({ where: { expiresAt: { [Op.lte]: new Date() } } });
  }
}
