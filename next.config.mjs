const isTestBuild = Boolean(process.env.OHMSTEAD_BUILD_DIR);

/** @type {import('next').NextConfig} */
const config = {
  distDir: process.env.OHMSTEAD_BUILD_DIR || '.next',
  typedRoutes: true,
  reactStrictMode: true,
  poweredByHeader: false,
  allowedDevOrigins: ['127.0.0.1'],
  turbopack: { root: import.meta.dirname },
  serverExternalPackages: ['@node-rs/argon2', 'pg', 'pino', 'sharp', 'multer', 'nodemailer', 'graphile-worker'],
  images: { unoptimized: true },
  typescript: {
    // "npm run check" and "npm test" check the types; a start need not do it again.
    ignoreBuildErrors: true,
    // A build writes its folder's name into its tsconfig; the tests' build has one of its own.
    tsconfigPath: isTestBuild ? 'tsconfig.test.json' : 'tsconfig.json',
  },
};

export default config;
