import 'server-only';
import { and, eq } from 'drizzle-orm';
import { operationSchema, type Operation } from '@/lib/schemas/operations';
import type { Receipt, SyncAnswer, SyncRequest } from '@/lib/schemas/sync';
import type { MemberActor } from './actor';
import { applyOperation, type Applied } from './operations';
import { mutationLog, syncClients } from './schema';
import { keepable, storable } from './storable';
import { withActor, type Transaction } from './with-actor';

/**
 * Answers each operation of a browser with one receipt, in order, each in a transaction of its own. A number seen before
 * gets its first receipt again; a number too far ahead stops the batch and says which one is awaited.
 */
export async function applyOperations(actor: MemberActor, request: SyncRequest): Promise<SyncAnswer> {
  const receipts: Receipt[] = [];
  for (const sent of request.operations) {
    const answer = await answerOne(actor, request.clientId, sent.n, sent.operation);
    if (answer.kind === 'gap') return { receipts, gap: { expected: answer.expected } };
    receipts.push(answer.receipt);
  }
  return { receipts };
}

/** The same for a change made at a desk, which the member's own numbers are given to here. Throws on a bug only. */
export async function applyFromDesk(actor: MemberActor, operation: Operation): Promise<Receipt> {
  return withActor(actor, async (tx) => {
    const client = await lockClient(tx, actor, actor.membershipId);
    if (!client) throw new Error(`desk client of membership ${actor.membershipId} belongs to another person`);
    const parsed = parseOperation(operation);
    return settle(tx, actor, { clientId: client.id, n: client.last + 1, operation, parsed });
  });
}

type Answer = { kind: 'receipt'; receipt: Receipt } | { kind: 'gap'; expected: number };

async function answerOne(actor: MemberActor, clientId: string, n: number, operation: unknown): Promise<Answer> {
  try {
    return await withActor(actor, (tx) => answerIn(tx, actor, { clientId, n, operation }, parseOperation(operation)));
  } catch (error) {
    // Data that the database cannot take would be sent for ever; it is kept with the reason, and the rest goes on.
    if (!isDataError(error)) throw error;
    const refused: Parsed = { kind: 'malformed', reason: 'This change could not be stored. Record it once more.' };
    return withActor(actor, (tx) => answerIn(tx, actor, { clientId, n, operation }, refused));
  }
}

type Sent = { clientId: string; n: number; operation: unknown };

async function answerIn(tx: Transaction, actor: MemberActor, sent: Sent, parsed: Parsed): Promise<Answer> {
  const client = await lockClient(tx, actor, sent.clientId);
  if (!client) {
    const reason = 'These changes were recorded by another person. Sign in as that person to send them.';
    return { kind: 'receipt', receipt: { n: sent.n, outcome: 'rejected', reason } };
  }
  if (sent.n <= client.last) return { kind: 'receipt', receipt: await receiptOf(tx, actor, sent) };
  if (sent.n > client.last + 1) return { kind: 'gap', expected: client.last + 1 };
  return { kind: 'receipt', receipt: await settle(tx, actor, { ...sent, parsed }) };
}

/** Applies the next operation of a locked client, and stores its number and receipt with the effect. */
async function settle(tx: Transaction, actor: MemberActor, sent: Sent & { parsed: Parsed }): Promise<Receipt> {
  const { clientId, n, operation, parsed } = sent;
  const applied: Applied =
    parsed.kind === 'operation'
      ? await applyOperation(tx, actor, parsed.operation, clientId)
      : { outcome: 'rejected', reason: parsed.reason };
  const receipt: Receipt = { n, ...applied };
  await tx.insert(mutationLog).values({
    firmId: actor.firmId,
    clientId,
    n,
    inspectionId: parsed.kind === 'operation' ? parsed.operation.inspectionId : null,
    operation: parsed.kind === 'operation' ? parsed.operation : { malformed: keepable(operation) },
    outcome: applied.outcome,
    receipt,
  });
  await tx
    .update(syncClients)
    .set({ last: n })
    .where(and(eq(syncClients.firmId, actor.firmId), eq(syncClients.id, clientId)));
  return receipt;
}

/** Locks the browser's row, made at its first word. Null where it belongs to another person. */
async function lockClient(tx: Transaction, actor: MemberActor, clientId: string) {
  const found = await selectClient(tx, actor, clientId);
  if (!found) {
    await tx
      .insert(syncClients)
      .values({ firmId: actor.firmId, id: clientId, userId: actor.userId })
      .onConflictDoNothing({ target: [syncClients.firmId, syncClients.id] });
  }
  const client = found ?? (await selectClient(tx, actor, clientId));
  if (!client) throw new Error(`insert into sync_clients left no row for ${clientId}`);
  return client.userId === actor.userId ? client : null;
}

async function selectClient(tx: Transaction, actor: MemberActor, clientId: string) {
  const [client] = await tx
    .select()
    .from(syncClients)
    .where(and(eq(syncClients.firmId, actor.firmId), eq(syncClients.id, clientId)))
    .for('update');
  return client;
}

async function receiptOf(tx: Transaction, actor: MemberActor, { clientId, n }: Sent): Promise<Receipt> {
  const [logged] = await tx
    .select({ receipt: mutationLog.receipt })
    .from(mutationLog)
    .where(and(eq(mutationLog.firmId, actor.firmId), eq(mutationLog.clientId, clientId), eq(mutationLog.n, n)));
  if (!logged) throw new Error(`mutation_log has no receipt ${n} of client ${clientId}`);
  return logged.receipt as Receipt;
}

type Parsed = { kind: 'operation'; operation: Operation } | { kind: 'malformed'; reason: string };

function parseOperation(operation: unknown): Parsed {
  const parsed = operationSchema.safeParse(operation);
  if (!parsed.success) {
    const says = parsed.error.issues[0]?.message ?? 'it is not known here';
    return { kind: 'malformed', reason: `This change could not be read: ${says}` };
  }
  if (!storable(parsed.data)) {
    return { kind: 'malformed', reason: 'This text holds characters that cannot be stored. Type it again.' };
  }
  return { kind: 'operation', operation: parsed.data };
}

/** PostgreSQL's classes 22 (data) and 23 (constraints). */
function isDataError(error: unknown): boolean {
  const cause = error instanceof Error ? (error.cause ?? error) : error;
  const code = typeof cause === 'object' && cause !== null && 'code' in cause ? String(cause.code) : '';
  return /^2[23]/.test(code);
}
