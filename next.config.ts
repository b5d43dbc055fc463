import type { NextConfig } from 'next'

/** Packages with native parts, files read at run time or a client of their own: required, not bundled. */
const keptOutside = [
  'better-sqlite3',
  '@prisma/client',
  '@prisma/adapter-better-sqlite3',
  '@prisma/adapter-pg',
  'pg',
  '@node-rs/argon2',
  'pdfmake',
  'pdfkit',
  '@resvg/resvg-js',
]

const config: NextConfig = {
  poweredByHeader: false,
  reactStrictMode: true,
  serverExternalPackages: keptOutside,
  // `npm test` checks types in a stage of its own over all files, the build checks what it builds.
  typescript: { ignoreBuildErrors: false },
}

export default config
