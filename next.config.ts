import type { NextConfig } from 'next'

const config: NextConfig = {
  // The test run builds into its own folder so that it never disturbs a running app.
  distDir: process.env['NEXT_DIST_DIR'] ?? '.next',
  typedRoutes: true,
  // Next writes its type folder into the tsconfig it uses; another build folder brings its own file, and the checks that
  // build there have compared the types before.
  typescript: {
    tsconfigPath: process.env['NEXT_TSCONFIG'] ?? 'tsconfig.json',
    ignoreBuildErrors: Boolean(process.env['NEXT_TSCONFIG']),
  },
  poweredByHeader: false,
  reactStrictMode: true,
  serverExternalPackages: ['@node-rs/argon2', '@react-pdf/renderer', 'graphile-worker', 'pg', 'pino'],
  experimental: { authInterrupts: true },
  async headers() {
    const common = [
      { key: 'X-Content-Type-Options', value: 'nosniff' },
      { key: 'X-Frame-Options', value: 'DENY' },
      { key: 'Content-Security-Policy', value: "base-uri 'self'; form-action 'self'; frame-ancestors 'none'; object-src 'none'" },
      { key: 'Permissions-Policy', value: 'camera=(), geolocation=(), microphone=(self)' },
    ]
    return [
      { source: '/:path*', headers: [...common, { key: 'Referrer-Policy', value: 'same-origin' }] },
      // A link's address is its key: it must not leak to any page it leads to, nor into a search index.
      ...['/r/:path*', '/b/:path*', '/invitation/:path*', '/reset/:path*'].map((source) => ({
        source,
        headers: [
          { key: 'Referrer-Policy', value: 'no-referrer' },
          { key: 'X-Robots-Tag', value: 'noindex, nofollow' },
        ],
      })),
    ]
  },
}

export default config
