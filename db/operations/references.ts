import 'server-only';
import { sql } from 'drizzle-orm';
import { refuse, type Context } from './context';
import { keepStanding, requireRow, type Entity } from './tracked';

type Reference = { field: string; to: Entity };

/** Fields that name another row of the same inspection. */
const REFERENCES: Partial<Record<Entity, Reference[]>> = {
  area: [{ field: 'structureId', to: 'structure' }],
  panel: [{ field: 'fedFromCircuitId', to: 'circuit' }],
  circuit: [{ field: 'panelId', to: 'panel' }],
  receptacle: [
    { field: 'areaId', to: 'area' },
    { field: 'circuitId', to: 'circuit' },
    { field: 'fedFromReceptacleId', to: 'receptacle' },
  ],
  photo: [
    { field: 'receptacleId', to: 'receptacle' },
    { field: 'areaId', to: 'area' },
    { field: 'circuitId', to: 'circuit' },
  ],
};

/** Refuses a field that names a row which is not in this inspection; brings a deleted one back. */
export async function checkReferences(
  context: Context,
  entity: Entity,
  id: string,
  fields: Record<string, unknown>,
): Promise<void> {
  for (const { field, to } of REFERENCES[entity] ?? []) {
    const target = fields[field];
    if (typeof target !== 'string') continue;
    if (to === entity && target === id) refuse('A receptacle cannot be fed from itself. Choose another one.');
    await keepChainStanding(context, to, target);
  }
  if (typeof fields.fedFromReceptacleId === 'string') {
    await refuseFeedingInACircle(context, id, fields.fedFromReceptacleId);
  }
  if (typeof fields.fedFromCircuitId === 'string') await refusePanelInACircle(context, id, fields.fedFromCircuitId);
}

/** The row and what it stands in, each brought back where it was deleted. */
export async function keepChainStanding(context: Context, entity: Entity, id: string): Promise<void> {
  const row = await requireRow(context, entity, id);
  await keepStanding(context, entity, row);
  if (entity === 'receptacle') await keepChainStanding(context, 'area', String(row.areaId));
  if (entity === 'area') await keepChainStanding(context, 'structure', String(row.structureId));
  if (entity === 'circuit') await keepChainStanding(context, 'panel', String(row.panelId));
}

async function refuseFeedingInACircle(context: Context, id: string, feeder: string): Promise<void> {
  const { rows } = await context.tx.execute(sql`
    with recursive upstream as (
      select id, fed_from_receptacle_id as up from receptacles
        where firm_id = ${context.actor.firmId} and id = ${feeder}
      union
      select r.id, r.fed_from_receptacle_id from receptacles r join upstream u on r.id = u.up
        where r.firm_id = ${context.actor.firmId}
    ) select 1 from upstream where id = ${id}`);
  if (rows.length > 0) refuse('These receptacles would feed each other in a circle. Check which one is upstream.');
}

async function refusePanelInACircle(context: Context, id: string, circuitId: string): Promise<void> {
  const { rows } = await context.tx.execute(sql`
    with recursive upstream as (
      select panel_id as id from circuits where firm_id = ${context.actor.firmId} and id = ${circuitId}
      union
      select c.panel_id from upstream u
        join panels p on p.firm_id = ${context.actor.firmId} and p.id = u.id
        join circuits c on c.firm_id = p.firm_id and c.id = p.fed_from_circuit_id
    ) select 1 from upstream where id = ${id}`);
  if (rows.length > 0) refuse('This panel would feed itself. Check which panel feeds which.');
}
