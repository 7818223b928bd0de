const ofOwnOrigin = [
  { key: 'X-Content-Type-Options', value: 'nosniff' },
  { key: 'Cross-Origin-Resource-Policy', value: 'same-origin' },
];

/** @type {import('next').NextConfig} */
const config = {
  // A second build beside the first: the tests' own, or another person's at the same time.
  distDir: process.env.COILYARD_DIST ?? '.next',
  output: 'standalone',
  outputFileTracingRoot: import.meta.dirname,
  // Turbopack follows Knex's optional drivers unless Knex stays outside the bundle.
  serverExternalPackages: ['knex', 'better-sqlite3', '@react-pdf/renderer', 'argon2', 'sharp', 'pino'],
  // `npm test` checks types as a step of its own, tests included; a build need not do it again.
  typescript: { ignoreBuildErrors: true },
  images: { unoptimized: true },
  poweredByHeader: false,
  productionBrowserSourceMaps: false,
  // What proxy.ts does not pass: the build's own files and the webhook.
  headers: () => [
    { source: '/_next/static/:path*', headers: ofOwnOrigin },
    {
      source: '/api/stripe',
      headers: [
        ...ofOwnOrigin,
        { key: 'Content-Security-Policy', value: "default-src 'none'; frame-ancestors 'none'" },
      ],
    },
  ],
  // authInterrupts: `forbidden()` answers 403 with app/forbidden.tsx.
  experimental: { authInterrupts: true, serverActions: { bodySizeLimit: '1mb' } },
};

export default config;
