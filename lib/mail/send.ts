import 'server-only';
import { createTransport, type Transporter } from 'nodemailer';
import { env } from '@/lib/env';
import { renderLetter, type Letter } from './letter';

export type Envelope = {
  toName: string;
  toEmail: string;
  messageId: string;
  replyTo?: { name: string; address: string };
};
export type SendOutcome = { kind: 'sent' } | { kind: 'refused'; says: string } | { kind: 'unreachable'; says: string };

const TIMEOUT_MS = 20_000;
let transport: Transporter | undefined;

/** Hands a letter to the mail server. A repeat carries the same Message-ID, so that a reader's program shows one mail. */
export async function sendLetter(letter: Letter, envelope: Envelope): Promise<SendOutcome> {
  transport ??= createTransport({
    url: env.SMTP_URL,
    connectionTimeout: TIMEOUT_MS,
    greetingTimeout: TIMEOUT_MS,
    socketTimeout: TIMEOUT_MS,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  const { toName, toEmail, messageId, replyTo } = envelope;
  try {
    await transport.sendMail({
      from: env.MAIL_FROM,
      to: { name: toName, address: toEmail },
      ...(replyTo ? { replyTo } : {}),
      subject: letter.subject,
      messageId: `<${messageId}@${new URL(env.APP_URL).hostname}>`,
      headers: { 'Auto-Submitted': 'auto-generated' },
      ...renderLetter(letter),
    });
    return { kind: 'sent' };
  } catch (error) {
    return outcomeOf(error);
  }
}

/** A mail server answers 5xx to what it will never take; everything else may go through later. */
function outcomeOf(error: unknown): SendOutcome {
  const { responseCode, message } = error as { responseCode?: number; message?: string };
  if (responseCode !== undefined && responseCode >= 500)
    return { kind: 'refused', says: 'The mail server refused the address. Check it for a typing mistake.' };
  return { kind: 'unreachable', says: `The mail server could not be reached (${message ?? 'no answer'}).` };
}
