import 'server-only';
import { sql } from 'drizzle-orm';
import type { Actor } from './actor';
import { database, type Database } from './client';
import { withoutValues } from './query-error';

export type Transaction = Parameters<Parameters<Database['transaction']>[0]>[0];

/**
 * Runs `work` in one transaction that row security reads the actor from. The settings end with the transaction, so a
 * connection goes back to the pool without a firm. Rolls back and throws what `work` throws, less the values of a failed statement.
 */
export async function withActor<Result>(
  actor: Actor,
  work: (tx: Transaction) => Promise<Result>,
  mode?: TransactionMode,
): Promise<Result> {
  const running = database().transaction(async (tx) => {
    const { firmId, userId, membershipId, grantId, name } = settingsOf(actor);
    await tx.execute(sql`select
      set_config('app.kind', ${actor.kind}, true), set_config('app.firm_id', ${firmId}, true),
      set_config('app.user_id', ${userId}, true), set_config('app.membership_id', ${membershipId}, true),
      set_config('app.grant_id', ${grantId}, true), set_config('app.name', ${name}, true)`);
    return work(tx);
  }, mode);
  return running.catch((error: unknown) => {
    throw withoutValues(error);
  });
}

type TransactionMode = { isolationLevel: 'repeatable read'; accessMode: 'read only' };
/** For several queries that must see the same moment. */
export const ONE_MOMENT: TransactionMode = { isolationLevel: 'repeatable read', accessMode: 'read only' };

type Settings = { firmId: string; userId: string; membershipId: string; grantId: string; name: string };
const NOBODY: Settings = { firmId: '', userId: '', membershipId: '', grantId: '', name: '' };

function settingsOf(actor: Actor): Settings {
  switch (actor.kind) {
    case 'member':
      return { ...NOBODY, ...pick(actor), userId: actor.userId, membershipId: actor.membershipId };
    case 'recipient':
      return { ...NOBODY, ...pick(actor), grantId: actor.grantId };
    case 'system':
      return { ...NOBODY, firmId: actor.firmId, name: actor.task };
    case 'visitor':
      return NOBODY;
  }
}

function pick({ firmId, name }: { firmId: string; name: string }) {
  return { firmId, name };
}
