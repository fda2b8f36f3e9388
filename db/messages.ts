import 'server-only';
import { and, eq, sql } from 'drizzle-orm';
import type { SystemActor } from './actor';
import { grants, messages } from './schema';
import { withActor } from './with-actor';

export type MessageToSend = {
  id: string;
  toName: string;
  toEmail: string;
  inspectionId: string | null;
  /** Until when the link of the mail counts. */
  until: Date | null;
};

/**
 * Marks a message as being sent, before the mail server is called. Null where it was sent already or its link was
 * revoked. One found "sending" was cut off: it is sent again, at most once more, under the same Message-ID.
 */
export async function beginSending(actor: SystemActor, messageId: string): Promise<MessageToSend | null> {
  return withActor(actor, async (tx) => {
    const [message] = await tx
      .update(messages)
      .set({ state: 'sending', attempts: sql`${messages.attempts} + 1` })
      .where(and(isMessage(actor, messageId), sql`${messages.state} <> 'sent'`))
      .returning({
        id: messages.id,
        toName: messages.toName,
        toEmail: messages.toEmail,
        inspectionId: messages.inspectionId,
        grantId: messages.grantId,
      });
    if (!message) return null;
    const { grantId, ...rest } = message;
    if (grantId === null) return { ...rest, until: null };
    const [grant] = await tx
      .select({ until: grants.until, revokedAt: grants.revokedAt })
      .from(grants)
      .where(and(eq(grants.firmId, actor.firmId), eq(grants.id, grantId)));
    if (grant?.revokedAt) {
      await tx
        .update(messages)
        .set({ state: 'failed', failure: 'The link was revoked before the mail went out.' })
        .where(isMessage(actor, messageId));
      return null;
    }
    return { ...rest, until: grant?.until ?? null };
  });
}

export async function recordSent(actor: SystemActor, messageId: string): Promise<void> {
  await withActor(actor, (tx) =>
    tx
      .update(messages)
      .set({ state: 'sent', failure: null, sentAt: sql`now()` })
      .where(isMessage(actor, messageId)),
  );
}

/** Keeps why a mail did not go out, for the Delivery screen. `isLast` says that nobody tries again by itself. */
export async function recordSendFailure(
  actor: SystemActor,
  messageId: string,
  failure: { says: string; isLast: boolean },
): Promise<void> {
  await withActor(actor, (tx) =>
    tx
      .update(messages)
      .set({ state: failure.isLast ? 'failed' : 'waiting', failure: failure.says })
      .where(and(isMessage(actor, messageId), sql`${messages.state} <> 'sent'`)),
  );
}

function isMessage({ firmId }: SystemActor, messageId: string) {
  return and(eq(messages.firmId, firmId), eq(messages.id, messageId));
}
