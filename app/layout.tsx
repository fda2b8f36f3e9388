import './globals.css';

import type { Metadata, Viewport } from 'next';
import { connection } from 'next/server';
import type { ReactNode } from 'react';

export const metadata: Metadata = {
  title: { default: 'Ohmstead', template: '%s · Ohmstead' },
  description: 'Receptacle, GFCI and AFCI findings for home inspections.',
};

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  viewportFit: 'cover',
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#f7f3ea' },
    { media: '(prefers-color-scheme: dark)', color: '#15130f' },
  ],
};

export default async function RootLayout({ children }: { children: ReactNode }) {
  // Each page carries the nonce of its own request, so none is made ahead.
  await connection();
  return (
    <html lang="en">
      <body>{children}</body>
    </html>
  );
}
