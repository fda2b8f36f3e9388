import { dateIn, dateTimeIn } from '@/lib/messages/dates';
import { en } from '@/lib/messages/en';
import type { ReportSnapshot } from '@/lib/schemas/snapshot';
import type { Letter, Part } from './letter';

export type ReportMail = { toName: string; link: string; code: string; openAddress: string; until: Date };

/** The mail to the buyer: what to stop using now stands in it, everything else waits behind the link. */
export function reportReadyLetter(snapshot: ReportSnapshot, mail: ReportMail): Letter {
  const { inspection, firm, findings, signature, number } = snapshot;
  const words = en.mail.report;
  const now = findings.filter((finding) => finding.urgency === 'U1');
  const days = findings.filter((finding) => finding.urgency === 'U2').length;
  const urgent = now.map(({ place, text }): Part => ({
    kind: 'urgent',
    head: `${en.report.urgency.U1}: ${place}`,
    text: text.en.plain,
  }));
  const license = signature.licenseNumber ? `, ${en.report.license(signature.licenseNumber)}` : '';
  const version = en.report.cover.versionLine(number, dateTimeIn(inspection.timeZone, snapshot.releasedAt));
  const texts = (...lines: string[]): Part[] => lines.filter(Boolean).map((text) => ({ kind: 'text', text }));
  return {
    subject: words.subject(inspection.street, now.length),
    parts: [
      ...texts(en.mail.hello(mail.toName), words.ready(inspection.street)),
      ...urgent,
      ...texts(now.length === 0 ? words.nothingNow : '', days > 0 ? words.days(days) : ''),
      { kind: 'button', label: words.button, href: mail.link },
      ...texts(
        words.until(dateIn(inspection.timeZone, mail.until.toISOString())),
        words.questions(firm.phone),
        `${signature.name}${license}`,
      ),
      { kind: 'small', text: en.mail.code(mail.openAddress, mail.code) },
      { kind: 'small', text: words.foot(firm.name, `Version ${version}`) },
    ],
  };
}
