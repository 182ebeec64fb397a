import { dirname } from 'node:path';
import { fileURLToPath } from 'node:url';

/** For every answer, uploads and errors too. What hangs on settings read at start is set in proxy.ts. */
const everywhere = [
  { key: 'content-security-policy', value: "default-src 'none'; frame-ancestors 'none'" },
  // `no-referrer` would make browsers post forms with `Origin: null`, and those are refused.
  { key: 'referrer-policy', value: 'same-origin' },
  { key: 'x-content-type-options', value: 'nosniff' },
  { key: 'cross-origin-opener-policy', value: 'same-origin' },
  {
    key: 'permissions-policy',
    value:
      'accelerometer=(), browsing-topics=(), camera=(), display-capture=(), geolocation=(), gyroscope=(), magnetometer=(), microphone=(), midi=(), payment=(), usb=()',
  },
];

/** What people have sent: here, since what stands here wins over what a handler says. */
const kept = [{ key: 'content-security-policy', value: "sandbox; default-src 'none'; frame-ancestors 'none'" }];

/** Behind a front server that ended TLS: only there does a promise of https make sense. */
const overHttps = [{ key: 'strict-transport-security', value: 'max-age=63072000; includeSubDomains' }];

/** @type {import('next').NextConfig} */
const config = {
  distDir: process.env.FOOTRING_DIST ?? '.next',
  poweredByHeader: false,
  // `npm test` has a step of its own for types; a start should not wait for it, nor fail over the types of a test.
  typescript: { ignoreBuildErrors: true },
  reactStrictMode: true,
  serverExternalPackages: ['knex', 'mysql2', 'rate-limiter-flexible'],
  turbopack: { root: dirname(fileURLToPath(import.meta.url)) },
  // No picture is fetched or made smaller for anybody: the address that would do it does not exist.
  images: { unoptimized: true, localPatterns: [], remotePatterns: [] },
  experimental: { serverActions: { bodySizeLimit: '2mb' } },
  async headers() {
    return [
      { source: '/:path*', headers: everywhere },
      { source: '/api/files/:path*', headers: kept },
      { source: '/:path*', has: [{ type: 'header', key: 'x-forwarded-proto', value: 'https' }], headers: overHttps },
    ];
  },
};

export default config;
