import 'server-only';
import { and, asc, desc, eq } from 'drizzle-orm';
import { v7 as uuidv7 } from 'uuid';
import type { StateProfileCode } from '@/lib/findings/vocabulary';
import type { MemberActor } from './actor';
import { recordAudit } from './audit';
import { adoptions, firms } from './schema';
import type { Address } from './schema/firms';
import { withActor } from './with-actor';

export type FirmSettings = {
  name: string;
  address: Address | null;
  phone: string | null;
  email: string | null;
  licenseNumber: string | null;
  timeZone: string;
  stateProfile: StateProfileCode;
  /** Inspectors see each other's drafts. */
  sharedDrafts: boolean;
};
export type Firm = FirmSettings & { logoKey: string | null };

/** The actor's firm as its screens and reports show it. */
export async function loadFirm(actor: MemberActor): Promise<Firm> {
  const [firm] = await withActor(actor, (tx) =>
    tx
      .select({
        name: firms.name,
        address: firms.address,
        phone: firms.phone,
        email: firms.email,
        licenseNumber: firms.licenseNumber,
        timeZone: firms.timeZone,
        stateProfile: firms.stateProfile,
        sharedDrafts: firms.sharedDrafts,
        logoKey: firms.logoKey,
      })
      .from(firms)
      .where(eq(firms.id, actor.firmId)),
  );
  if (!firm) throw new Error('the actor has no firm');
  return firm;
}

export type SaveFirmOutcome = { kind: 'saved' } | { kind: 'not-allowed' };

/** Owners only. Released reports keep what they were released with. */
export async function saveFirm(actor: MemberActor, settings: FirmSettings): Promise<SaveFirmOutcome> {
  if (!actor.roles.includes('owner')) return { kind: 'not-allowed' };
  await withActor(actor, async (tx) => {
    await tx.update(firms).set(settings).where(eq(firms.id, actor.firmId));
    await recordAudit(tx, null, 'firm-changed');
  });
  return { kind: 'saved' };
}

/** The object key of the firm's logo, or null to go without. Owners only. */
export async function saveLogo(actor: MemberActor, logoKey: string | null): Promise<SaveFirmOutcome> {
  if (!actor.roles.includes('owner')) return { kind: 'not-allowed' };
  await withActor(actor, async (tx) => {
    await tx.update(firms).set({ logoKey }).where(eq(firms.id, actor.firmId));
    await recordAudit(tx, null, 'logo-changed');
  });
  return { kind: 'saved' };
}

export type Adoption = {
  /** The town, county or state that enforces the edition. */
  place: string;
  edition: number;
  /** A date, YYYY-MM-DD. */
  from: string;
  source: string;
};

/** Which place enforces which edition of the model code from when, by place, the newest first. */
export async function listAdoptions(actor: MemberActor): Promise<(Adoption & { id: string })[]> {
  return withActor(actor, (tx) =>
    tx
      .select({
        id: adoptions.id,
        place: adoptions.place,
        edition: adoptions.edition,
        from: adoptions.from,
        source: adoptions.source,
      })
      .from(adoptions)
      .where(eq(adoptions.firmId, actor.firmId))
      .orderBy(asc(adoptions.place), desc(adoptions.from)),
  );
}

/** Owners only. */
export async function addAdoption(actor: MemberActor, adoption: Adoption): Promise<SaveFirmOutcome> {
  if (!actor.roles.includes('owner')) return { kind: 'not-allowed' };
  await withActor(actor, async (tx) => {
    await tx.insert(adoptions).values({ firmId: actor.firmId, id: uuidv7(), ...adoption });
    await recordAudit(tx, null, 'adoption-added', adoption);
  });
  return { kind: 'saved' };
}

/** Owners only. Removing one that is gone changes nothing. */
export async function removeAdoption(actor: MemberActor, adoptionId: string): Promise<SaveFirmOutcome> {
  if (!actor.roles.includes('owner')) return { kind: 'not-allowed' };
  await withActor(actor, async (tx) => {
    const [gone] = await tx
      .delete(adoptions)
      .where(and(eq(adoptions.firmId, actor.firmId), eq(adoptions.id, adoptionId)))
      .returning({ place: adoptions.place, edition: adoptions.edition });
    if (gone) await recordAudit(tx, null, 'adoption-removed', gone);
  });
  return { kind: 'saved' };
}
