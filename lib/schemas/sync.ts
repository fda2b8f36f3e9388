import { z } from 'zod';
import { idSchema } from './id';

export const SYNC_FORMAT = 1;
export const SYNC_BATCH = 50;

/** The envelope is strict; each operation is parsed on its own, so that a malformed one is answered and holds up nothing. */
export const syncRequestSchema = z.strictObject({
  format: z.literal(SYNC_FORMAT),
  clientId: idSchema,
  operations: z
    .array(z.strictObject({ n: z.int().positive(), operation: z.unknown() }))
    .min(1)
    .max(SYNC_BATCH),
});
export type SyncRequest = z.infer<typeof syncRequestSchema>;

/** Both values of a field that two people changed; the server's stands until a person chooses. */
export type FieldConflict = { id: string; field: string; theirs: unknown; yours: unknown; by: string; at: string };

export type Receipt =
  | { n: number; outcome: 'applied' | 'merged'; version: number }
  | { n: number; outcome: 'conflict'; version: number; conflicts: FieldConflict[] }
  | { n: number; outcome: 'rejected'; reason: string };

/** Answer to POST /api/sync: a receipt for each number, in order; `gap` names the number that the server waits for. */
export type SyncAnswer = { receipts: Receipt[]; gap?: { expected: number } };
