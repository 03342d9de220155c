/** @type {import('next').NextConfig} */
export default {
  distDir: process.env.NEXT_DIST ?? '.next',
  poweredByHeader: false,
  agentRules: false,
  experimental: { agentUpgrade: false },
  serverExternalPackages: ['better-sqlite3', 'pino', 'busboy'],
}
