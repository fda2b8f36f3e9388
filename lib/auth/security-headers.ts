import { env } from '@/lib/env';

/**
 * Scripts run by nonce only. Style attributes are allowed because the drawings place their parts with them; style
 * elements and sheets are not. Development needs eval for readable stacks, and style elements for hot reload.
 */
export function contentPolicy(nonce: string): string {
  const isDevelopment = env.NODE_ENV === 'development';
  return [
    `default-src 'self'`,
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${isDevelopment ? " 'unsafe-eval'" : ''}`,
    isDevelopment ? `style-src 'self' 'unsafe-inline'` : `style-src 'self' 'nonce-${nonce}'`,
    `style-src-attr 'unsafe-inline'`,
    `img-src 'self' blob: data:`,
    `font-src 'self'`,
    `connect-src 'self'${isDevelopment ? ' ws:' : ''}`,
    `worker-src 'self'`,
    `manifest-src 'self'`,
    `object-src 'none'`,
    `base-uri 'none'`,
    `form-action 'self'`,
    `frame-ancestors 'none'`,
    ...(isHttps() ? ['upgrade-insecure-requests'] : []),
  ].join('; ');
}

/** Pages that a mailed link opens tell no other site where they are, and are kept by nobody. */
const BY_LINK = /^\/(?:open|shared|work|reset-password|invitation|sign-in\/link)(?:\/|$)/;

export function securityHeaders(pathname: string): Record<string, string> {
  const isByLink = BY_LINK.test(pathname);
  return {
    'x-content-type-options': 'nosniff',
    'x-frame-options': 'DENY',
    'referrer-policy': isByLink ? 'no-referrer' : 'same-origin',
    'permissions-policy': 'camera=(self), microphone=(), geolocation=(), payment=(), usb=()',
    'cross-origin-opener-policy': 'same-origin',
    'cross-origin-resource-policy': 'same-origin',
    ...(isByLink ? { 'cache-control': 'private, no-store', 'x-robots-tag': 'noindex' } : {}),
    ...(isHttps() ? { 'strict-transport-security': 'max-age=63072000; includeSubDomains' } : {}),
  };
}

function isHttps(): boolean {
  return env.APP_URL.startsWith('https://');
}
