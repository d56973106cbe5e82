import react from '@vitejs/plugin-react';
import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

const root = fileURLToPath(new URL('.', import.meta.url));
const alias = {
  '@': root.replace(/\/$/, ''),
  // `server-only` throws outside a React server bundle; its empty module is what the server gets.
  'server-only': `${root}node_modules/server-only/empty.js`,
};

export default defineConfig({
  resolve: { alias },
  test: {
    testTimeout: 60_000,
    hookTimeout: 60_000,
    projects: [
      {
        resolve: { alias },
        test: {
          name: 'node',
          environment: 'node',
          include: ['tests/{inversion,files,access,app,workers,headless}/**/*.test.ts'],
          testTimeout: 60_000,
        },
      },
      {
        plugins: [react()],
        resolve: { alias },
        test: {
          name: 'components',
          environment: 'jsdom',
          include: ['tests/components/**/*.test.tsx'],
          setupFiles: ['tests/support/components.ts'],
          testTimeout: 30_000,
        },
      },
    ],
  },
});
