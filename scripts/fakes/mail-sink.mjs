/**
 * A mail server that delivers nothing: it keeps each message as a file and shows it on a page. `npm start` and the tests
 * run it on loopback.   node mail-sink.mjs <smtp port> <page port> <folder>
 */
import { mkdirSync, readdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:http';
import path from 'node:path';
import { simpleParser } from 'mailparser';
import { SMTPServer } from 'smtp-server';

const [smtpPort, pagePort, folder] = process.argv.slice(2);
mkdirSync(folder, { recursive: true, mode: 0o700 });
let count = 0;

const smtp = new SMTPServer({
  authOptional: true,
  disabledCommands: ['STARTTLS'],
  logger: false,
  onAuth: (auth, session, done) => done(null, { user: auth.username }),
  onData: (stream, session, done) => {
    const pieces = [];
    stream.on('data', (piece) => pieces.push(piece));
    stream.on('error', done);
    stream.on('end', () => {
      const id = `${Date.now()}-${String((count += 1)).padStart(5, '0')}`;
      const draft = path.join(folder, `${id}.part`);
      writeFileSync(draft, Buffer.concat(pieces), { mode: 0o600 });
      renameSync(draft, path.join(folder, `${id}.eml`));
      done(null, `kept as ${id}`);
    });
  },
});

const pages = createServer((request, response) => {
  answer(new URL(request.url, 'http://localhost').pathname).then(
    ({ status = 200, type, body, headers = {} }) => {
      response.writeHead(status, { 'content-type': type, 'cache-control': 'no-store', ...headers });
      response.end(body);
    },
    (error) => {
      response.writeHead(500, { 'content-type': 'text/plain; charset=utf-8' });
      response.end(String(error));
    },
  );
});

async function answer(pathname) {
  if (pathname === '/') return page('Mail', list(await messages()));
  if (pathname === '/messages.json') return { type: 'application/json', body: JSON.stringify(await messages()) };
  const [, id, part] = /^\/([0-9]+-[0-9]+)(?:\/(html))?$/.exec(pathname) ?? [];
  if (!id || !ids().includes(id)) return { ...page('Not found', '<p>There is no such message.</p>'), status: 404 };
  const message = await parse(id);
  if (part)
    return {
      type: 'text/html; charset=utf-8',
      body: message.html,
      headers: {
        'content-security-policy':
          "sandbox allow-popups allow-popups-to-escape-sandbox allow-top-navigation-by-user-activation; default-src 'none'; img-src data:; style-src 'unsafe-inline'",
      },
    };
  return page(message.subject, read(message));
}

const ids = () =>
  readdirSync(folder)
    .flatMap((name) => (name.endsWith('.eml') ? [name.slice(0, -4)] : []))
    .sort()
    .reverse();

async function messages() {
  return Promise.all(ids().map(parse));
}

async function parse(id) {
  const mail = await simpleParser(readFileSync(path.join(folder, `${id}.eml`)));
  const attachments = mail.attachments.map(({ filename, contentType, size }) => ({ filename, contentType, size }));
  return {
    id,
    from: mail.from?.text ?? '',
    to: [mail.to ?? []].flat().flatMap((list) => list.value.map((person) => person.address)),
    subject: mail.subject ?? '',
    date: mail.date ?? null,
    text: mail.text ?? '',
    html: mail.html || '',
    attachments,
  };
}

function list(all) {
  if (all.length === 0) return '<p>No mail yet. What the program sends shows here, newest first.</p>';
  const rows = all.map(
    (mail) =>
      `<tr><td>${escape(mail.to.join(', '))}</td><td><a href="/${mail.id}">${escape(mail.subject)}</a></td><td>${escape(mail.date?.toLocaleString('en-US') ?? '')}</td></tr>`,
  );
  return `<table><thead><tr><th>To</th><th>Subject</th><th>Sent</th></tr></thead><tbody>${rows.join('')}</tbody></table>`;
}

function read(mail) {
  const html = mail.html
    ? `<h2>As a page</h2><iframe title="The message as a page" src="/${mail.id}/html"></iframe>`
    : '';
  return `<p><a href="/">All mail</a></p><dl><dt>From</dt><dd>${escape(mail.from)}</dd><dt>To</dt><dd>${escape(mail.to.join(', '))}</dd></dl>
    <h2>As text</h2><pre>${linked(escape(mail.text))}</pre>${html}
    ${mail.attachments.map((file) => `<p>Attached: ${escape(file.filename ?? file.contentType)}, ${file.size} bytes</p>`).join('')}`;
}

function page(title, body) {
  return {
    type: 'text/html; charset=utf-8',
    body: `<!doctype html><html lang="en"><meta charset="utf-8"><meta name="viewport" content="width=device-width"><title>${escape(title)}</title>
<style>body{font:16px/1.5 system-ui,sans-serif;max-width:60rem;margin:2rem auto;padding:0 1rem;color:#1c1a17;background:#fbfaf7}
table{width:100%;border-collapse:collapse}th,td{text-align:left;padding:.5rem;border-bottom:1px solid #d8d3c8}pre{white-space:pre-wrap;background:#fff;padding:1rem;border:1px solid #d8d3c8}
iframe{width:100%;height:40rem;border:1px solid #d8d3c8;background:#fff}dt{font-weight:bold}</style>
<h1>${escape(title)}</h1>${body}</html>`,
  };
}

const escape = (text) =>
  text.replace(/[&<>"]/g, (sign) => ({ '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' })[sign]);
const linked = (text) => text.replace(/https?:\/\/[^\s<>]+/g, (address) => `<a href="${address}">${address}</a>`);

smtp.listen(Number(smtpPort), '127.0.0.1');
pages.listen(Number(pagePort), '127.0.0.1');
process.on('SIGTERM', () => process.exit(0));
