/** @type {import('next').NextConfig} */
const config = {
  output: 'standalone',
  outputFileTracingRoot: import.meta.dirname,
  // Turbopack follows Knex's optional drivers unless Knex stays outside the bundle.
  serverExternalPackages: ['knex', 'better-sqlite3', '@react-pdf/renderer', 'argon2', 'sharp', 'pino'],
  images: { unoptimized: true },
  poweredByHeader: false,
  productionBrowserSourceMaps: false,
  experimental: { serverActions: { bodySizeLimit: '1mb' } },
};

export default config;
