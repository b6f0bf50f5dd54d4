/** @type {import('next').NextConfig} */
const config = {
  poweredByHeader: false,
  reactStrictMode: true,
  // Packages that must not be bundled: native drivers, and Yjs, of which a process may hold one copy only.
  serverExternalPackages: [
    'yjs',
    'y-protocols',
    'lib0',
    'y-websocket',
    'better-sqlite3',
    'sqlite3',
    '@prisma/client',
    '@prisma/adapter-better-sqlite3',
    'better-auth',
    'ws',
  ],
}

export default config
