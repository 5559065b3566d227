import { AuditTrail, type AuditEntry } from '@slighthill/api/audit/audit-trail';
import { AuditEvent } from '@slighthill/api/models/audit-event';
import type { Actor } from '@slighthill/api/policies/actor';

interface Kept {
  at: Date;
  entry: AuditEntry;
}

/**
 * Keeps the events of a load and writes them in the order of their moments: several patients are loaded at once, and the
 * trail is read by its running number.
 */
export class OrderedAudit {
  private readonly kept: Kept[] = [];

  keep(entry: AuditEntry, at: Date): void {
    this.kept.push({ entry, at });
  }

  trail(actor: Actor, action: string, at: Date): AuditTrail {
    return new KeptTrail(this, actor, action, at);
  }

  async write(): Promise<void> {
    const rows = this.kept
      .sort((a, b) => a.at.getTime() - b.at.getTime())
      .map(({ at, entry }) => ({
        clinicId: entry.clinicId,
        at,
        actorId: entry.actorId,
        actorName: entry.actorName,
        action: entry.action,
        outcome: entry.outcome ?? 'done',
        patientIds: [...(entry.patientIds ?? [])],
        entityKind: entry.entity?.kind ?? null,
        entityId: entry.entity?.id ?? null,
        address: null,
        detail: entry.detail ?? {},
      }));
    const page = 500;
    for (let from = 0; from < rows.length; from += page) await AuditEvent.bulkCreate(rows.slice(from, from + page));
  }
}

/** A command's trail that hands its one event over instead of writing it. */
class KeptTrail extends AuditTrail {
  private readonly shown = new Set<string>();
  private subject: { kind: string; id: string } | undefined;
  private handedOver = false;
  private readonly book: OrderedAudit;
  private readonly by: Actor;
  private readonly what: string;
  private readonly at: Date;

  constructor(book: OrderedAudit, by: Actor, what: string, at: Date) {
    super(by, what, null, () => at);
    this.book = book;
    this.by = by;
    this.what = what;
    this.at = at;
  }

  override showsPatients(...ids: string[]): void {
    for (const id of ids) this.shown.add(id);
  }

  override about(kind: string, id: string): void {
    this.subject = { kind, id };
  }

  override get isDue(): boolean {
    return !this.handedOver && (this.shown.size > 0 || this.subject !== undefined);
  }

  override async write(outcome: 'done' | 'refused' = 'done'): Promise<void> {
    if (this.handedOver) return;
    this.handedOver = true;
    const { clinicId, userId, displayName } = this.by;
    const entry: AuditEntry = {
      clinicId,
      actorId: userId,
      actorName: displayName,
      action: this.what,
      outcome,
      patientIds: [...this.shown],
      ...(this.subject ? { entity: this.subject } : {}),
    };
    this.book.keep(entry, this.at);
    await Promise.resolve();
  }

  override forgetWrite(): void {
    this.handedOver = false;
  }
}
