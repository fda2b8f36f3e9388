import { randomBytes } from 'node:crypto';
import { afterAll, describe, expect, test } from 'vitest';
import { createFirm } from '@/db/auth';
import { closeDatabase } from '@/db/client';
import { requestLink } from '@/db/links';
import { hashPassword } from '@/lib/auth/password';
import { mintLink } from '@/lib/auth/link-token';
import { cookiesOf, postForm } from '@/tests/support/form-post';
import { asOwner, closeOwner } from '@/tests/support/owner';

const app = process.env.TEST_APP_URL ?? '';
const PASSWORD = 'ledge tomato quilt 4';
const at = (path: string) => new URL(path, app);

afterAll(async () => {
  await closeDatabase();
  await closeOwner();
});

describe.skipIf(!app)('the running program', () => {
  test('signs a person in with a cookie that scripts and other sites cannot use', async () => {
    const { email } = await aPerson();
    const response = await signIn(email, PASSWORD);
    expect(response.status).toBe(303);
    expect(response.headers.get('location')).toMatch(/\/inspections$/);
    const cookie = response.headers.getSetCookie().find((line) => line.includes('ohmstead.session='));
    expect(cookie).toMatch(/HttpOnly/i);
    expect(cookie).toMatch(/SameSite=Lax/i);
    expect(await whoIs(cookiesOf(response))).toBe(200);
  });

  test('gives the same answer to a wrong password and to an unknown e-mail, and never the password', async () => {
    const { email } = await aPerson();
    const wrong = await signIn(email, 'not the password 1');
    const unknown = await signIn(anEmail(), 'not the password 1');
    const [wrongText, unknownText] = await Promise.all([wrong.text(), unknown.text()]);
    expect(wrong.status).toBe(unknown.status);
    expect([...wrong.headers.keys()].toSorted()).toEqual([...unknown.headers.keys()].toSorted());
    for (const text of [wrongText, unknownText]) {
      expect(text).toContain('The e-mail and the password do not belong together');
      expect(text).not.toContain('not the password 1');
    }
    expect(wrongText).toContain(email);
    expect(wrong.headers.getSetCookie().join()).not.toContain('ohmstead.session=');
  });

  test('asks to wait after five wrong passwords, even with the right one', async () => {
    const { email } = await aPerson();
    const address = anAddress();
    for (let n = 0; n < 5; n += 1) await signIn(email, 'not the password 1', address);
    const response = await signIn(email, PASSWORD, address);
    expect(await response.text()).toContain('Too many tries. Wait');
    expect(response.headers.getSetCookie().join()).not.toContain('ohmstead.session=');
  });

  test('answers 401 to the next request of a person disabled meanwhile', async () => {
    const { email, membershipId } = await aPerson();
    const cookie = cookiesOf(await signIn(email, PASSWORD));
    expect(await whoIs(cookie)).toBe(200);
    await asOwner('update memberships set disabled_at = now() where id = $1', [membershipId]);
    expect(await whoIs(cookie)).toBe(401);
  });

  test('gives no session to a person who asks for somebody else with a made-up cookie', async () => {
    expect(await whoIs(`ohmstead.session=${randomBytes(40).toString('base64url')}`)).toBe(401);
  });

  test('sends a visitor from an office page to sign-in, and back afterwards', async () => {
    const response = await fetch(at('/people?x=1'), { redirect: 'manual' });
    expect(response.status).toBe(303);
    expect(new URL(response.headers.get('location') ?? '', app).search).toBe('?next=%2Fpeople%3Fx%3D1');
    const { email } = await aPerson();
    const signedIn = await postForm(
      at('/sign-in?next=%2Fpeople'),
      { email, password: PASSWORD, next: '/people' },
      FORM,
    );
    expect(signedIn.headers.get('location')).toMatch(/\/people$/);
    const elsewhere = await postForm(at('/sign-in'), { email, password: PASSWORD, next: '//elsewhere.example/' }, FORM);
    expect(elsewhere.headers.get('location')).toMatch(/\/inspections$/);
  });

  test('has a new nonce in the policy of every page, and lets no page be framed', async () => {
    const responses = await Promise.all(Array.from({ length: 30 }, () => fetch(at('/sign-in'))));
    const policies = responses.map((response) => response.headers.get('content-security-policy') ?? '');
    const nonces = policies.map((policy) => /'nonce-([^']+)'/.exec(policy)?.[1]);
    expect(new Set(nonces).size).toBe(30);
    for (const policy of policies) {
      expect(policy).toContain("'strict-dynamic'");
      expect(policy).toContain("object-src 'none'; base-uri 'none'");
      expect(policy).toContain("frame-ancestors 'none'");
      expect(policy.split('; ').find((part) => part.startsWith('script-src'))).not.toContain('unsafe-inline');
    }
    expect(responses[0]?.headers.get('x-content-type-options')).toBe('nosniff');
    const html = await responses[0]?.text();
    for (const [tag] of html?.matchAll(/<script[^>]*>/g) ?? []) expect(tag).toContain(`nonce="${nonces[0]}"`);
    expect((await fetch(at('/open'))).headers.get('referrer-policy')).toBe('no-referrer');
  });

  test('takes a mailed token only from its own page, and uses nothing up before the button', async () => {
    const { email, userId } = await aPerson();
    const link = { ...mintLink(email), address: '' };
    await requestLink(email, 'sign-in', link, 600);
    for (const origin of ['https://elsewhere.example', 'null', undefined]) {
      expect((await exchange(link.token, origin)).status).toBe(403);
    }
    const opened = await exchange(link.token, at('/').origin);
    expect(await opened.json()).toEqual({ to: '/sign-in/link' });
    const cookie = cookiesOf(opened);
    for (let n = 0; n < 20; n += 1) await fetch(at('/sign-in/link'), { headers: { cookie } });

    const signedIn = await postForm(at('/sign-in/link'), {}, { cookie, button: 'Sign in' });
    expect(await whoIs(cookiesOf(signedIn))).toBe(200);
    const again = await exchange(link.token, at('/').origin);
    expect(await again.json()).toEqual({ to: '/open/expired' });
    expect(userId).toBeTruthy();
  });

  test('opens the same link by the short code of the mail, without script', async () => {
    const { email } = await aPerson();
    const link = { ...mintLink(email), address: '' };
    await requestLink(email, 'reset', link, 600);
    const wrong = await postForm(at('/open'), { email, code: 'ZZZZZ-22222' }, { button: 'code' });
    expect(await wrong.text()).toContain('do not belong together');
    const right = await postForm(
      at('/open'),
      { email: email.toUpperCase(), code: link.code.toLowerCase() },
      { button: 'code' },
    );
    expect(right.headers.get('location')).toMatch(/\/reset-password$/);
  });

  test('takes a form of its own page that sends no origin, and no form of another site', async () => {
    const { email } = await aPerson();
    const send = (headers: Record<string, string>) =>
      postForm(at('/open'), { email, code: 'ZZZZZ-22222' }, { headers });
    const own = await send({ origin: 'null', 'sec-fetch-site': 'same-origin' });
    expect(await own.text()).toContain('do not belong together');
    const elsewhere: Record<string, string>[] = [
      { origin: 'null', 'sec-fetch-site': 'cross-site' },
      { origin: 'null' },
      { origin: 'https://elsewhere.example', 'sec-fetch-site': 'cross-site' },
    ];
    for (const headers of elsewhere) {
      const foreign = await send(headers);
      expect(foreign.status).toBeGreaterThanOrEqual(400);
      expect(await foreign.text()).not.toContain('do not belong together');
    }
  });

  test('answers a request for a reset the same with and without an account', async () => {
    const { email } = await aPerson();
    const stranger = anEmail();
    const ask = async (to: string) => (await postForm(at('/forgot-password'), { email: to })).text();
    const [known, unknown] = await Promise.all([ask(email), ask(stranger)]);
    const plain = (text: string, to: string) =>
      /<main[\s\S]*<\/main>/
        .exec(text)?.[0]
        .replaceAll(to, 'x')
        .replace(/value="[^"]*"/g, '');
    expect(plain(known, email)).toBe(plain(unknown, stranger));
  });

  test('says nothing of who is signed in at the session address of next-auth', async () => {
    const { email } = await aPerson();
    const cookie = cookiesOf(await signIn(email, PASSWORD));
    const session = (await (await fetch(at('/api/auth/session'), { headers: { cookie } })).json()) as object;
    expect(Object.keys(session).filter((key) => key !== 'expires')).toEqual([]);
  });
});

const FORM = { button: 'Password' };

function signIn(email: string, password: string, address = anAddress()): Promise<Response> {
  return postForm(at('/sign-in'), { email, password }, { ...FORM, headers: { 'x-forwarded-for': address } });
}

function exchange(token: string, origin: string | undefined): Promise<Response> {
  return fetch(at('/open/exchange'), {
    method: 'POST',
    headers: { 'content-type': 'application/json', ...(origin === undefined ? {} : { origin }) },
    body: JSON.stringify({ token }),
  });
}

async function whoIs(cookie: string): Promise<number> {
  return (await fetch(at('/api/me'), { headers: { cookie } })).status;
}

async function aPerson() {
  const email = anEmail();
  const firm = await createFirm({
    firmName: 'Quill Street Inspections',
    name: 'Ines Farrow',
    email,
    passwordHash: await hashPassword(PASSWORD),
    timeZone: 'America/New_York',
    stateProfile: 'general',
  });
  if (firm.kind !== 'created') throw new Error('the firm was not created');
  return { email, ...firm };
}

function anEmail(): string {
  return `${randomBytes(6).toString('hex')}@quill-street.example`;
}

/** From the documentation range; every test comes from an address of its own, so that limits do not meet. */
function anAddress(): string {
  return `2001:db8::${randomBytes(2).toString('hex')}:${randomBytes(2).toString('hex')}`;
}
