import { randomUUID } from 'node:crypto';
import { Op } from 'sequelize';
import { execute } from '../db/query';
import { Draft } from '../models/draft';
import { runCommand, type CommandContext } from './command-context';

const keptDays = 7;

export interface DraftKey {
  form: string;
  subject: string;
}

/** Keeps unfinished work for its owner; it is no part of the record and goes after seven days. */
export async function saveDraft(
  context: CommandContext,
  key: DraftKey,
  content: Record<string, unknown>,
): Promise<Draft> {
  const { userId, clinicId } = context.actor;
  const now = context.clock.now();
  return await runCommand(context, async () => {
    await execute(
      `insert into drafts (id, clinic_id, owner_id, form, subject, content, saved_at, expires_at)
       values ($id, $clinicId, $userId, $form, $subject, $content::jsonb, $now, $expiresAt)
       on conflict (owner_id, form, subject)
       do update set content = excluded.content, saved_at = excluded.saved_at, expires_at = excluded.expires_at`,
      {
        id: randomUUID(),
        clinicId,
        userId,
        ...key,
        content: JSON.stringify(content),
        now,
        expiresAt: new Date(now.getTime() + keptDays * 86_400_000),
      },
    );
    return (await Draft.findOne({ where: { ownerId: userId, ...key } }))!;
  });
}

export async function discardDraft(context: CommandContext, key: DraftKey): Promise<void> {
  await Draft.destroy({ where: { ownerId: context.actor.userId, ...key } });
}

export async function deleteExpiredDrafts(now: Date): Promise<void> {
  await Draft.destroy({ where: { expiresAt: { [Op.lte]: now } } });
}
