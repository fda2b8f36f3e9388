import 'server-only';
import { after } from 'next/server';
import { requestLink } from '@/db/links';
import { log } from '@/lib/log';
import { mintMailedLink, RESET_SECONDS } from './link-token';

/** Mails a link once the answer is sent, so that an e-mail with an account answers as fast as one without. */
export function mailLinkAfterAnswer(email: string, purpose: 'reset' | 'sign-in'): void {
  after(async () => {
    try {
      await requestLink(email, purpose, mintMailedLink(email), RESET_SECONDS);
    } catch (error) {
      log.error({ err: error }, 'a mailed link could not be made');
    }
  });
}
