import { dirname } from 'node:path'
import { fileURLToPath } from 'node:url'
import { contentPolicy } from './lib/http/content-policy.mjs'

const root = dirname(fileURLToPath(import.meta.url))
const distDir = process.env.NEXT_DIST_DIR || '.next'

const headers = (values) => Object.entries(values).map(([key, value]) => ({ key, value }))

const everywhere = headers({
  // /embed answers with a policy of its own, which names the sites that a link may be framed on
  'Content-Security-Policy': contentPolicy(),
  'X-Content-Type-Options': 'nosniff',
  'Referrer-Policy': 'strict-origin-when-cross-origin',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Permissions-Policy': 'camera=(), microphone=(), geolocation=(), payment=(), usb=()',
})

// whoever holds such an address may see the scene: no other site and no index is told of it
const capability = headers({
  'Referrer-Policy': 'no-referrer',
  'X-Robots-Tag': 'noindex, nofollow',
  'Cache-Control': 'private, no-store',
})

// the older word for frame-ancestors 'none', which knows no list of sites
const unframed = headers({ 'X-Frame-Options': 'DENY' })

/** @type {import('next').NextConfig} */
const config = {
  // a running program and the tests (.next-test) each have a build and types of their own
  distDir,
  generateBuildId: () => process.env.COUNTERTHROW_BUILD || null,
  typescript: {
    tsconfigPath: distDir === '.next' ? 'tsconfig.json' : 'tests/quality/tsconfig.next.json',
    // types are a gate of `npm test`, which also looks at the tests; starting need not wait for it
    ignoreBuildErrors: true,
  },
  reactStrictMode: true,
  poweredByHeader: false,
  typedRoutes: false,
  images: { unoptimized: true },
  serverExternalPackages: ['@node-rs/argon2', 'pdfkit', 'postgres', 'sharp'],
  outputFileTracingRoot: root,
  turbopack: { root },
  // under `next dev` the program is opened by the address that start prints
  allowedDevOrigins: ['127.0.0.1'],
  headers: async () => [
    { source: '/:path*', headers: everywhere },
    { source: '/((?!embed/).*)', headers: unframed },
    { source: '/s/:path*', headers: capability },
    { source: '/embed/:path*', headers: capability },
  ],
}

export default config
