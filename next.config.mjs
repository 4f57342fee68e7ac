/** @type {import('next').NextConfig} */
const config = {
  reactStrictMode: true,
  poweredByHeader: false,
  images: { unoptimized: true },
  serverExternalPackages: ['@node-rs/argon2', 'postgres', 'sharp'],
}
export default config
