import 'server-only';
import { and, asc, desc, eq, sql, type SQL } from 'drizzle-orm';
import { z } from 'zod';
import type { InspectionFilter, InspectionListItem, InspectionSort } from '@/lib/schemas/inspection';
import type { MemberActor } from './actor';
import { inspectionInspectors, listedInspections, memberships, parties, users } from './schema';
import { holds, seesAll } from './scope';
import { searchQuery, searchWords } from './search-words';
import type { Transaction } from './with-actor';

const listed = listedInspections;

const SORTS: Record<InspectionSort, { by: 'scheduledAt' | 'number'; newestFirst: boolean }> = {
  'scheduled-newest': { by: 'scheduledAt', newestFirst: true },
  'scheduled-oldest': { by: 'scheduledAt', newestFirst: false },
  'number-newest': { by: 'number', newestFirst: true },
  'number-oldest': { by: 'number', newestFirst: false },
};

/** Where a page ended: the sort it belongs to, the last row's key as PostgreSQL writes it, and its id. */
const cursorSchema = z.tuple([z.string(), z.string().max(60), z.uuid()]);
export type ListCursor = { key: string; id: string };

/** The cursor of a page, or null where it was not made for this sort. */
export function readCursor(text: string, sort: InspectionSort): ListCursor | null {
  try {
    const [forSort, key, id] = cursorSchema.parse(JSON.parse(Buffer.from(text, 'base64url').toString('utf8')));
    const wellFormed = SORTS[sort].by === 'number' ? /^\d{1,9}$/.test(key) : !Number.isNaN(Date.parse(key));
    return forSort === sort && wellFormed ? { key, id } : null;
  } catch {
    return null;
  }
}

export function writeCursor(sort: InspectionSort, { key, id }: ListCursor): string {
  return Buffer.from(JSON.stringify([sort, key, id])).toString('base64url');
}

export type ListedRow = { item: InspectionListItem; cursor: ListCursor };

/** At most `limit` rows after the cursor, in the order of the sort; ties go by id. */
export async function listRows(
  tx: Transaction,
  actor: MemberActor,
  filter: InspectionFilter,
  after: ListCursor | undefined,
  limit: number,
): Promise<ListedRow[]> {
  const { by, newestFirst } = SORTS[filter.sort];
  const direction = newestFirst ? desc : asc;
  const few = await findFew(tx, actor, filter);
  const rowsMeant = few ? [eq(listed.firmId, actor.firmId), isOneOf(few)] : conditions(actor, filter);
  const page = tx
    .select()
    .from(listed)
    .where(and(...rowsMeant, after && beyond(filter.sort, after)))
    .orderBy(...(few || !filter.state ? [] : [direction(listed.state)]), direction(listed[by]), direction(listed.id))
    .limit(limit)
    .as('page');
  const rows = await tx
    .select({
      id: page.id,
      number: page.number,
      state: page.state,
      address: page.address,
      timeZone: page.timeZone,
      scheduledAt: page.scheduledAt,
      yearBuilt: page.yearBuilt,
      key: by === 'number' ? sql<string>`${page.number}::text` : sql<string>`to_json(${page.scheduledAt})#>>'{}'`,
      buyer: BUYER,
      inspector: LEAD,
    })
    .from(page)
    .orderBy(direction(page[by]), direction(page.id));
  return rows.map(({ key, address, scheduledAt, buyer, inspector, ...row }) => ({
    cursor: { key, id: row.id },
    item: {
      ...row,
      address: address.unit ? `${address.street}, ${address.unit}` : address.street,
      city: `${address.city}, ${address.state}`,
      buyer: buyer ?? '',
      inspector: inspector ?? '',
      scheduledAt: scheduledAt.toISOString(),
    },
  }));
}

/** More matches than this stand so close together that reading in the order of the sort finds a page soon. */
const FEW = 250;

/**
 * The ids that a search or a person narrows the list to, where they are few. The planner cannot know how many there are,
 * and given an order and a limit it reads the whole firm for them.
 */
async function findFew(tx: Transaction, actor: MemberActor, filter: InspectionFilter): Promise<string[] | null> {
  if (filter.search === '' && filter.inspector === undefined && seesAll(actor)) return null;
  const found = await tx
    .select({ id: listed.id })
    .from(listed)
    .where(and(...conditions(actor, filter)))
    .orderBy(asc(listed.id))
    .limit(FEW + 1);
  return found.length > FEW ? null : found.map((row) => row.id);
}

function isOneOf(ids: string[]): SQL {
  return sql`${listed.id} = any(${sql.param(ids)}::uuid[])`;
}

function conditions(actor: MemberActor, filter: InspectionFilter): (SQL | undefined)[] {
  return [
    eq(listed.firmId, actor.firmId),
    listedVisibleTo(actor),
    // As a range, so that it keeps its place in the order and the index that starts with it is the only one in that order.
    filter.state && sql`${listed.state} between ${filter.state} and ${filter.state}`,
    filter.inspector === undefined ? undefined : walks(filter.inspector),
    filter.search !== '' ? matches(actor.firmId, filter.search) : undefined,
  ];
}

/** The rule of `inspectionsVisibleTo`, for the view. */
function listedVisibleTo(actor: MemberActor): SQL | undefined {
  if (seesAll(actor)) return undefined;
  return holds(actor, 'inspector') ? walks(actor.membershipId) : sql`false`;
}

function walks(membershipId: string): SQL {
  return sql`exists (select 1 from ${inspectionInspectors} w where w.firm_id = ${listed.firmId}
    and w.inspection_id = ${listed.id} and w.membership_id = ${membershipId})`;
}

function matches(firmId: string, search: string): SQL {
  if (searchWords(search).length === 0) return sql`false`;
  return sql`${listed.searchWords} @@ ${searchQuery(firmId, search)}::tsquery`;
}

function beyond(sort: InspectionSort, { key, id }: ListCursor): SQL {
  const { by, newestFirst } = SORTS[sort];
  const value = by === 'number' ? sql`${key}::integer` : sql`${key}::timestamptz`;
  const row = sql`(${listed[by]}, ${listed.id})`;
  return newestFirst ? sql`${row} < (${value}, ${id}::uuid)` : sql`${row} > (${value}, ${id}::uuid)`;
}

/** Drizzle writes the columns of a lone table without its name, so these name the page themselves. */
const BUYER = sql<string | null>`(select p.name from ${parties} p where p.firm_id = page.firm_id
  and p.inspection_id = page.id and p.kind = 'buyer' and p.deleted_at is null order by p.created_at, p.id limit 1)`;

const LEAD = sql<string | null>`(select u.name from ${inspectionInspectors} w
  join ${memberships} m on m.firm_id = w.firm_id and m.id = w.membership_id
  join ${users} u on u.id = m.user_id
  where w.firm_id = page.firm_id and w.inspection_id = page.id order by w.leads desc, w.created_at limit 1)`;
