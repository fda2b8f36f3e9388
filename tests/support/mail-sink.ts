import { expect } from '@playwright/test';

export type Mail = { to: string[]; subject: string; text: string };

/** Waits for the newest mail to that address in the local sink. */
export async function mailTo(email: string): Promise<Mail> {
  const address = `${process.env.MAIL_SINK_URL ?? 'http://127.0.0.1:8025'}/messages.json`;
  const newest = async () => {
    const mails = (await (await fetch(address)).json()) as Mail[];
    return mails.find((mail) => mail.to.includes(email)) ?? null;
  };
  await expect.poll(newest, { timeout: 45_000 }).not.toBeNull();
  const mail = await newest();
  if (!mail) throw new Error(`the mail to ${email} is gone`);
  return mail;
}

/** The address in the mail that opens the report, and the short code beside it. */
export function keysOf({ text }: Mail): { link: string; code: string } {
  const link = text.match(/http\S+\/open#\S+/)?.[0];
  const code = text.match(/\b[0-9A-Z]{5}-[0-9A-Z]{5}\b/)?.[0];
  if (!link || !code) throw new Error('the mail holds no link or no short code');
  return { link, code };
}
