import type { MetadataRoute } from 'next';

/** Installable on a phone; on iOS what Walk keeps lasts only in an installed app. */
export default function manifest(): MetadataRoute.Manifest {
  return {
    id: '/',
    name: 'Ohmstead',
    short_name: 'Ohmstead',
    description: 'Receptacle, GFCI and AFCI findings for home inspections.',
    lang: 'en-US',
    start_url: '/inspections',
    scope: '/',
    display: 'standalone',
    background_color: '#f7f3ea',
    theme_color: '#f7f3ea',
    icons: [
      { src: '/icons/icon-192.png', sizes: '192x192', type: 'image/png' },
      { src: '/icons/icon-512.png', sizes: '512x512', type: 'image/png' },
      { src: '/icons/icon-maskable-512.png', sizes: '512x512', type: 'image/png', purpose: 'maskable' },
    ],
  };
}
