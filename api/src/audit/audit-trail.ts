import { AuditEvent } from '../models/audit-event';
import type { Actor } from '../policies/actor';

export interface AuditEntry {
  clinicId: string;
  actorId: string | null;
  actorName: string;
  action: string;
  outcome?: 'done' | 'refused';
  patientIds?: readonly string[];
  entity?: { kind: string; id: string };
  address?: string | null;
  detail?: Record<string, unknown>;
}

export async function writeAuditEvent(entry: AuditEntry, at: Date): Promise<void> {
  await AuditEvent.create({
    clinicId: entry.clinicId,
    at,
    actorId: entry.actorId,
    actorName: entry.actorName,
    action: entry.action,
    outcome: entry.outcome ?? 'done',
    patientIds: [...(entry.patientIds ?? [])],
    entityKind: entry.entity?.kind ?? null,
    entityId: entry.entity?.id ?? null,
    address: entry.address ?? null,
    detail: entry.detail ?? {},
  });
}

/**
 * Collects what one request showed or changed and writes it as one event: inside the command's transaction when there
 * is one, else when the request ends.
 */
export class AuditTrail {
  private readonly patientIds = new Set<string>();
  private entity: { kind: string; id: string } | undefined;
  private detail: Record<string, unknown> = {};
  private written = false;
  private readonly actor: Actor;
  private readonly action: string;
  private readonly address: string | null;
  private readonly now: () => Date;

  constructor(actor: Actor, action: string, address: string | null, now: () => Date) {
    this.actor = actor;
    this.action = action;
    this.address = address;
    this.now = now;
  }

  showsPatients(...ids: string[]): void {
    for (const id of ids) this.patientIds.add(id);
  }

  about(kind: string, id: string): void {
    this.entity = { kind, id };
  }

  /** What the changed fields said before; never shown to an administrator. */
  keepsBefore(values: Record<string, unknown>): void {
    this.detail = { before: values };
  }

  get isDue(): boolean {
    return !this.written && (this.patientIds.size > 0 || this.entity !== undefined);
  }

  async write(outcome: 'done' | 'refused' = 'done'): Promise<void> {
    if (this.written) return;
    this.written = true;
    await writeAuditEvent(
      {
        clinicId: this.actor.clinicId,
        actorId: this.actor.userId,
        actorName: this.actor.displayName,
        action: this.action,
        outcome,
        patientIds: [...this.patientIds],
        address: this.address,
        detail: this.detail,
        ...(this.entity ? { entity: this.entity } : {}),
      },
      this.now(),
    );
  }

  /** A transaction that rolled back took its event along: the next write must make it again. */
  forgetWrite(): void {
    this.written = false;
  }
}
