import { dirname } from 'node:path'
import { fileURLToPath } from 'node:url'

const root = dirname(fileURLToPath(import.meta.url))
const distDir = process.env.NEXT_DIST_DIR || '.next'
const developing = process.env.NODE_ENV === 'development'

// The framework's own start-up scripts and styles are inline; hot reload evaluates and keeps a socket open.
const policy = {
  'default-src': ["'self'"],
  'script-src': ["'self'", "'unsafe-inline'", developing && "'unsafe-eval'"],
  'style-src': ["'self'", "'unsafe-inline'"],
  'img-src': ["'self'", 'data:', 'blob:'],
  'font-src': ["'self'"],
  'connect-src': ["'self'", developing && 'ws:'],
  'worker-src': ["'self'", 'blob:'],
  'object-src': ["'none'"],
  'base-uri': ["'self'"],
  'form-action': ["'self'"],
  'frame-ancestors': ["'none'"],
}

const headers = (values) => Object.entries(values).map(([key, value]) => ({ key, value }))

const everywhere = headers({
  'Content-Security-Policy': Object.entries(policy)
    .map(([directive, sources]) => [directive, ...sources.filter(Boolean)].join(' '))
    .join('; '),
  'X-Content-Type-Options': 'nosniff',
  'X-Frame-Options': 'DENY',
  'Referrer-Policy': 'strict-origin-when-cross-origin',
  'Cross-Origin-Opener-Policy': 'same-origin',
  'Permissions-Policy': 'camera=(), microphone=(), geolocation=(), payment=(), usb=()',
})

// whoever holds such an address may see the scene: no other site and no index is told of it
const capability = headers({ 'Referrer-Policy': 'no-referrer', 'X-Robots-Tag': 'noindex, nofollow' })

/** @type {import('next').NextConfig} */
const config = {
  // a running program and the tests (.next-test) each have a build and types of their own
  distDir,
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
    { source: '/s/:path*', headers: capability },
  ],
}

export default config
