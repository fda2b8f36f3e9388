export type Part =
  | { kind: 'text'; text: string }
  /** Something that must not be overlooked. */
  | { kind: 'urgent'; head: string; text: string }
  | { kind: 'button'; label: string; href: string }
  | { kind: 'small'; text: string };
export type Letter = { subject: string; parts: Part[] };

const SERIF = "Georgia, 'Times New Roman', serif";

/** One letter as HTML and as plain text, with the same words. No picture, no script, nothing loaded from elsewhere. */
export function renderLetter({ subject, parts }: Letter): { html: string; text: string } {
  const body = parts.map(htmlOf).join('\n');
  const html = `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><title>${escape(subject)}</title></head>
<body style="margin:0;padding:24px;background:#f7f3ea;color:#1d1a15;font:17px/1.6 ${SERIF}">
<div style="max-width:36em;margin:0 auto">
${body}
</div></body></html>`;
  return { html, text: `${parts.map(textOf).join('\n\n')}\n` };
}

function htmlOf(part: Part): string {
  switch (part.kind) {
    case 'text':
      return `<p>${escape(part.text)}</p>`;
    case 'urgent':
      return `<p style="border:2px solid #1d1a15;padding:12px 16px"><strong>${escape(part.head)}</strong><br>${escape(part.text)}</p>`;
    case 'button':
      return `<p><a href="${escape(part.href)}" style="display:inline-block;padding:12px 18px;background:#1d1a15;color:#f7f3ea;text-decoration:none;font-weight:bold">${escape(part.label)}</a></p>`;
    case 'small':
      return `<p style="font-size:15px;color:#5c5548">${escape(part.text)}</p>`;
  }
}

function textOf(part: Part): string {
  switch (part.kind) {
    case 'urgent':
      return `${part.head}\n${part.text}`;
    case 'button':
      return `${part.label}:\n${part.href}`;
    case 'text':
    case 'small':
      return part.text;
  }
}

function escape(text: string): string {
  return text.replaceAll(/[&<>"']/g, (letter) => `&#${letter.charCodeAt(0)};`);
}
