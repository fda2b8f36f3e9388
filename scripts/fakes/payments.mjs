/**
 * A payment service that moves no money: it speaks the few Stripe calls that the program uses, shows a page to pay on,
 * and posts the signed webhook. `npm start` and the tests run it on loopback.
 *   node payments.mjs <port> <state file> <webhook address>      with STRIPE_WEBHOOK_SECRET set
 */
import { createHmac, randomBytes } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:http';

const [port, stateFile, webhook] = process.argv.slice(2);
const secret = process.env.STRIPE_WEBHOOK_SECRET;
const state = existsSync(stateFile)
  ? JSON.parse(readFileSync(stateFile, 'utf8'))
  : { sessions: {}, refunds: {}, byKey: {} };
const keep = () => writeFileSync(stateFile, JSON.stringify(state), { mode: 0o600 });
const id = (prefix) => `${prefix}_${randomBytes(12).toString('hex')}`;
const nowSeconds = () => Math.floor(Date.now() / 1000);

const routes = [
  ['POST', /^\/v1\/checkout\/sessions$/, createSession],
  ['GET', /^\/v1\/checkout\/sessions\/(\w+)$/, ({ params }) => found(state.sessions[params[0]])],
  ['POST', /^\/v1\/checkout\/sessions\/(\w+)\/expire$/, expireSession],
  ['POST', /^\/v1\/refunds$/, createRefund],
  ['GET', /^\/pay\/(\w+)$/, payPage],
  ['POST', /^\/pay\/(\w+)$/, pay],
];

createServer((request, response) => {
  respond(request).then(
    ({ status = 200, type = 'application/json', body = '', headers = {} }) => {
      response.writeHead(status, { 'content-type': type, ...headers });
      response.end(typeof body === 'string' ? body : JSON.stringify(body));
    },
    (error) => {
      response.writeHead(500, { 'content-type': 'application/json' });
      response.end(JSON.stringify({ error: { type: 'api_error', message: String(error) } }));
    },
  );
}).listen(Number(port), '127.0.0.1');
process.on('SIGTERM', () => process.exit(0));

async function respond(request) {
  const { pathname } = new URL(request.url, 'http://localhost');
  let text = '';
  for await (const piece of request.setEncoding('utf8')) text += piece;
  for (const [method, pattern, handle] of routes) {
    const match = request.method === method ? pattern.exec(pathname) : null;
    if (!match) continue;
    if (pathname.startsWith('/v1/') && !/^(Bearer|Basic) ./.test(request.headers.authorization ?? ''))
      return refused(401, 'No API key was sent.');
    return handle({ params: match.slice(1), form: new URLSearchParams(text), key: request.headers['idempotency-key'] });
  }
  return refused(404, `No such call: ${request.method} ${pathname}`);
}

function createSession({ form, key }) {
  if (key && state.byKey[key]) return { body: state.sessions[state.byKey[key]] };
  const session = {
    id: id('cs_test'),
    object: 'checkout.session',
    mode: form.get('mode'),
    status: 'open',
    payment_status: 'unpaid',
    amount_total:
      Number(form.get('line_items[0][price_data][unit_amount]')) * Number(form.get('line_items[0][quantity]') ?? 1),
    currency: form.get('line_items[0][price_data][currency]') ?? 'usd',
    client_reference_id: form.get('client_reference_id'),
    customer_email: form.get('customer_email'),
    metadata: Object.fromEntries(
      [...form].flatMap(([name, value]) => (/^metadata\[(\w+)\]$/.test(name) ? [[name.slice(9, -1), value]] : [])),
    ),
    success_url: form.get('success_url'),
    cancel_url: form.get('cancel_url'),
    payment_intent: null,
    expires_at: nowSeconds() + 86_400,
    livemode: false,
  };
  if (!(session.amount_total > 0)) return refused(400, 'A session needs an amount above zero.');
  session.url = `http://127.0.0.1:${port}/pay/${session.id}`;
  state.sessions[session.id] = session;
  if (key) state.byKey[key] = session.id;
  keep();
  return { body: session };
}

function expireSession({ params }) {
  const session = state.sessions[params[0]];
  if (session?.status !== 'open') return refused(400, 'Only an open session can expire.');
  session.status = 'expired';
  keep();
  return { body: session };
}

function createRefund({ form }) {
  const session = Object.values(state.sessions).find((one) => one.payment_intent === form.get('payment_intent'));
  if (!session) return refused(404, 'No such payment.');
  const refund = {
    id: id('re'),
    object: 'refund',
    status: 'succeeded',
    payment_intent: session.payment_intent,
    amount: Number(form.get('amount') ?? session.amount_total),
  };
  state.refunds[refund.id] = refund;
  keep();
  return { body: refund };
}

function payPage({ params }) {
  const session = state.sessions[params[0]];
  if (session?.status !== 'open')
    return html(404, '<h1>Nothing to pay here</h1><p>This payment is done or has run out.</p>');
  return html(
    200,
    `<h1>Pay $${(session.amount_total / 100).toFixed(2)}</h1><p>This page stands in for the card form. No money moves.</p>
    <form method="post"><button>Pay now</button></form><p><a href="${escape(session.cancel_url ?? '/')}">Go back without paying</a></p>`,
  );
}

async function pay({ params }) {
  const session = state.sessions[params[0]];
  if (session?.status !== 'open') return html(404, '<h1>Nothing to pay here</h1>');
  Object.assign(session, { status: 'complete', payment_status: 'paid', payment_intent: id('pi') });
  keep();
  await postWebhook({
    id: id('evt'),
    object: 'event',
    type: 'checkout.session.completed',
    created: nowSeconds(),
    livemode: false,
    data: { object: session },
  });
  const address = (session.success_url ?? '/').replace('{CHECKOUT_SESSION_ID}', session.id);
  return { status: 303, headers: { location: address } };
}

/** As the real service does: sent again, a few times, until it is taken. */
async function postWebhook(event) {
  const body = JSON.stringify(event);
  for (const waitMs of [0, 500, 2000]) {
    await new Promise((resolve) => setTimeout(resolve, waitMs));
    const time = nowSeconds();
    const signature = createHmac('sha256', secret).update(`${time}.${body}`).digest('hex');
    const headers = { 'content-type': 'application/json', 'stripe-signature': `t=${time},v1=${signature}` };
    const response = await fetch(webhook, { method: 'POST', headers, body }).catch(() => null);
    if (response?.ok) return;
  }
}

function found(object) {
  return object ? { body: object } : refused(404, 'No such object.');
}

function refused(status, message) {
  return { status, body: { error: { type: 'invalid_request_error', message } } };
}

function html(status, body) {
  return {
    status,
    type: 'text/html; charset=utf-8',
    body: `<!doctype html><html lang="en"><meta charset="utf-8"><title>Payment</title><body style="font:18px system-ui;max-width:30rem;margin:4rem auto">${body}</body></html>`,
  };
}

function escape(text) {
  return text.replace(/[&<>"]/g, (sign) => `&#${sign.charCodeAt(0)};`);
}
