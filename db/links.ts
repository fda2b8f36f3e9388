import 'server-only';
import { sql } from 'drizzle-orm';
import { VISITOR } from './actor';
import { enqueueJob } from './jobs';
import type { LINK_PURPOSES } from './schema';
import { withActor, type Transaction } from './with-actor';

export type LinkPurpose = (typeof LINK_PURPOSES)[number];
/** A link as lib/auth mints it: `address` is what the mail shows, `code` its short form; only the hashes are stored. */
export type LinkToSend = { tokenHash: Buffer; codeHash: Buffer; address: string; code: string };

export type MailedLink = {
  purpose: LinkPurpose;
  state: 'ready' | 'used' | 'expired';
  email: string;
  name: string;
  firmName: string | null;
  hasPassword: boolean;
};

/** What a mailed link is for, by the hash of its token or of e-mail and code. Uses nothing up. Null where there is none. */
export async function findLink(hash: Buffer): Promise<MailedLink | null> {
  const { rows } = await withActor(VISITOR, (tx) =>
    tx.execute<{
      purpose: LinkPurpose;
      state: MailedLink['state'];
      email: string;
      name: string;
      firm_name: string | null;
      has_password: boolean;
    }>(sql`select * from find_link(${hash})`),
  );
  const [row] = rows;
  if (!row) return null;
  const { firm_name: firmName, has_password: hasPassword, ...rest } = row;
  return { ...rest, firmName, hasPassword };
}

/** Mails a link for a reset or a sign-in where that e-mail has an account, and does nothing visible where it has none. */
export async function requestLink(
  email: string,
  purpose: 'reset' | 'sign-in',
  link: LinkToSend,
  seconds: number,
): Promise<void> {
  await withActor(VISITOR, async (tx) => {
    const { rows } = await tx.execute<{ name: string | null }>(
      sql`select request_link(${email}, ${purpose}, ${link.tokenHash}, ${link.codeHash}, ${seconds}) as name`,
    );
    const name = rows[0]?.name;
    if (name) await enqueueLinkMail(tx, { purpose, email, name, firmName: null }, link);
  });
}

/** Mails a new link in place of one that ran out, to the address the old one went to. */
export async function replaceExpiredLink(
  oldHash: Buffer,
  mint: (email: string) => LinkToSend,
): Promise<'mailed' | 'none'> {
  const old = await findLink(oldHash);
  if (old?.state !== 'expired') return 'none';
  const link = mint(old.email);
  return withActor(VISITOR, async (tx) => {
    const { rows } = await tx.execute<{ purpose: LinkPurpose; email: string; name: string; firm_name: string | null }>(
      sql`select * from replace_expired_link(${oldHash}, ${link.tokenHash}, ${link.codeHash})`,
    );
    const [row] = rows;
    if (!row) return 'none';
    await enqueueLinkMail(tx, { ...row, firmName: row.firm_name }, link);
    return 'mailed';
  });
}

/** Sets a password by a reset link, which is then used up, and ends every session. Null where the link no longer counts. */
export async function resetPassword(
  hash: Buffer,
  passwordHash: string,
): Promise<{ userId: string; email: string } | null> {
  const { rows } = await withActor(VISITOR, (tx) =>
    tx.execute<{ user_id: string; email: string }>(sql`select * from reset_password(${hash}, ${passwordHash})`),
  );
  return rows[0] ? { userId: rows[0].user_id, email: rows[0].email } : null;
}

/** Uses a sign-in link up. Answers who signs in, or null where the link no longer counts. */
export async function redeemSignInLink(hash: Buffer): Promise<string | null> {
  const { rows } = await withActor(VISITOR, (tx) =>
    tx.execute<{ user_id: string | null }>(sql`select use_sign_in_link(${hash}) as user_id`),
  );
  return rows[0]?.user_id ?? null;
}

export type AcceptedInvitation = { userId: string; firmId: string; email: string };

/** Joins the firm by an invitation. `passwordHash` is for a person new to the program; others keep theirs. */
export async function acceptInvitation(
  hash: Buffer,
  person: { name: string; passwordHash: string | null },
): Promise<AcceptedInvitation | null> {
  const { rows } = await withActor(VISITOR, (tx) =>
    tx.execute<{ user_id: string; firm_id: string; email: string }>(
      sql`select * from accept_invitation(${hash}, ${person.name}, ${person.passwordHash})`,
    ),
  );
  const [row] = rows;
  return row ? { userId: row.user_id, firmId: row.firm_id, email: row.email } : null;
}

export type LinkMail = { purpose: LinkPurpose; email: string; name: string; firmName: string | null };

/** The mail that carries a link, in the transaction that stored its hash. The job, and the token with it, goes when sent. */
export async function enqueueLinkMail(tx: Transaction, mail: LinkMail, link: LinkToSend): Promise<void> {
  await enqueueJob(tx, 'send-mail', {
    kind: mail.purpose,
    to: mail.email,
    name: mail.name,
    firmName: mail.firmName,
    link: link.address,
    code: link.code,
  });
}
