const everywhere = [
  { key: 'X-Content-Type-Options', value: 'nosniff' },
  { key: 'X-Frame-Options', value: 'DENY' },
  { key: 'Referrer-Policy', value: 'strict-origin-when-cross-origin' },
  { key: 'Cross-Origin-Opener-Policy', value: 'same-origin' },
  { key: 'Cross-Origin-Resource-Policy', value: 'same-origin' },
  { key: 'Permissions-Policy', value: 'camera=(), geolocation=(), microphone=(), payment=(), usb=()' },
  // Nothing here is meant for a search engine.
  { key: 'X-Robots-Tag', value: 'noindex, nofollow' },
];

// The address of these pages is itself a key: it must not travel on in a referrer or stay in a cache.
const addressIsAKey = [
  { key: 'Referrer-Policy', value: 'no-referrer' },
  { key: 'Cache-Control', value: 'no-store' },
];

/** @type {import('next').NextConfig} */
const nextConfig = {
  // Lets the test build, the demo build and the development server live beside one another.
  distDir: process.env.NEXT_DIST_DIR ?? '.next',
  // These reach for their own files or native code at run time, so they stay outside the bundle.
  serverExternalPackages: ['sequelize', 'pg', 'pg-hstore', 'pg-boss', 'sharp', '@node-rs/argon2', 'pino'],
  // `npm test` checks types, once; a start need not wait for it.
  typescript: { ignoreBuildErrors: true },
  // The route types follow next-env.d.ts, so no build adds its own folder to tsconfig.json.
  experimental: { strictRouteTypes: true },
  poweredByHeader: false,
  reactStrictMode: true,
  headers: async () => [
    { source: '/:path*', headers: everywhere },
    { source: '/:page(share|invitation|reset-password|unsubscribe)/:path*', headers: addressIsAKey },
    { source: '/api/:link(share|unsubscribe)/:path*', headers: [{ key: 'Referrer-Policy', value: 'no-referrer' }] },
  ],
};

export default nextConfig;
