/** Posts a page's form as a browser without script would, and follows nothing. `at` is the words on its button. */
export async function postForm(
  page: URL,
  fields: Record<string, string>,
  options: { cookie?: string; button?: string; headers?: Record<string, string> } = {},
): Promise<Response> {
  const cookie = options.cookie ?? '';
  const html = await (await fetch(page, { headers: { cookie } })).text();
  const forms = html.match(/<form[\s\S]*?<\/form>/g) ?? [];
  const form = forms.find((text) => !options.button || text.includes(options.button));
  if (!form) throw new Error(`${page.pathname} has no form with "${options.button ?? ''}"`);

  const body = new FormData();
  for (const [input] of form.matchAll(/<input[^>]*type="hidden"[^>]*>/g)) {
    body.set(attribute(input, 'name'), attribute(input, 'value'));
  }
  for (const [name, value] of Object.entries(fields)) body.set(name, value);
  return fetch(page, {
    method: 'POST',
    body,
    redirect: 'manual',
    headers: { cookie, origin: page.origin, ...options.headers },
  });
}

/** What a browser would send back of the cookies that a response sets. */
export function cookiesOf(response: Response): string {
  return response.headers
    .getSetCookie()
    .map((line) => line.split(';')[0] ?? '')
    .join('; ');
}

function attribute(tag: string, name: string): string {
  const value = new RegExp(`\\b${name}="([^"]*)"`).exec(tag)?.[1] ?? '';
  return value.replaceAll('&quot;', '"').replaceAll('&#x27;', "'").replaceAll('&lt;', '<').replaceAll('&amp;', '&');
}
