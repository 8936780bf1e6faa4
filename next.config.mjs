/** @type {import('next').NextConfig} */
const nextConfig = {
  // Lets the test build, the demo build and the development server live beside one another.
  distDir: process.env.NEXT_DIST_DIR ?? '.next',
  // These reach for their own files or native code at run time, so they stay outside the bundle.
  serverExternalPackages: ['sequelize', 'pg', 'pg-hstore', 'pg-boss', 'sharp', '@node-rs/argon2', 'pino'],
  poweredByHeader: false,
  reactStrictMode: true,
};

export default nextConfig;
