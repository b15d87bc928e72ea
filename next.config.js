/** What each answer carries; the content security policy needs a fresh number per answer and is set in proxy.ts. */
const securityHeaders = [
  { key: 'X-Content-Type-Options', value: 'nosniff' },
  { key: 'Referrer-Policy', value: 'same-origin' },
  { key: 'X-Frame-Options', value: 'DENY' },
  { key: 'Cross-Origin-Opener-Policy', value: 'same-origin' },
  { key: 'Cross-Origin-Resource-Policy', value: 'same-origin' },
  {
    key: 'Permissions-Policy',
    value: 'camera=(), microphone=(), geolocation=(), payment=(), usb=(), browsing-topics=()',
  },
  // heeded over HTTPS only, so it does no harm on a plain local address
  { key: 'Strict-Transport-Security', value: 'max-age=31536000' },
]

/** @type {import('next').NextConfig} */
export default {
  output: 'standalone',
  // the folder of this file, whatever other lock files lie above it
  outputFileTracingRoot: import.meta.dirname,
  turbopack: { root: import.meta.dirname },
  // the test command checks the types of everything once; whoever only starts the program need not wait for it
  typescript: { ignoreBuildErrors: true },
  poweredByHeader: false,
  reactStrictMode: true,
  // no picture is scaled by the server: neither its address nor its library is needed
  images: { unoptimized: true },
  outputFileTracingExcludes: { '/*': ['node_modules/sharp/**', 'node_modules/@img/**'] },
  // packages with compiled parts or threads of their own are loaded as they are
  serverExternalPackages: ['pg', 'pg-boss', 'piscina', '@node-rs/argon2', '@prisma/client', '@prisma/adapter-pg'],
  headers: async () => [{ source: '/:path*', headers: securityHeaders }],
}
