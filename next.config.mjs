/** @type {import('next').NextConfig} */
const config = {
  poweredByHeader: false,
  reactStrictMode: true,
  typedRoutes: false,
  agentRules: false,
  turbopack: { root: import.meta.dirname },
  serverExternalPackages: ['@libsql/client', '@node-rs/argon2', 'pino'],
};

export default config;
