import next from 'eslint-config-next/core-web-vitals';
import typescript from 'eslint-config-next/typescript';

const config = [
  ...next,
  ...typescript,
  {
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_' },
      ],
      eqeqeq: ['error', 'smart'],
      'no-console': 'error',
    },
  },
  {
    files: ['lib/headless/**', 'tests/**', 'db/*.ts'],
    rules: { 'no-console': 'off' },
  },
  { ignores: ['.next/**', 'drizzle/**', 'fixtures/**', 'next-env.d.ts', 'data/**'] },
];

export default config;
