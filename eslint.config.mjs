import { defineConfig } from 'eslint/config';
import js from '@eslint/js';
import ts from 'typescript-eslint';
import astro from 'eslint-plugin-astro';
import reactHooks from 'eslint-plugin-react-hooks';
import { roomRules } from './scripts/build/rooms.mjs';

export default defineConfig(
  { ignores: ['dist*/**', '.astro', 'node_modules', 'public', 'uploads', 'tests/output', 'tests/fixtures', 'samples/**/*.json'] },
  js.configs.recommended,
  ts.configs.recommended,
  astro.configs.recommended,
  { files: ['src/components/**/*.{ts,tsx}'], ...reactHooks.configs.flat['recommended-latest'] },
  {
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports', prefer: 'type-imports' }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
    },
  },
  {
    files: ['**/*.mjs'],
    languageOptions: { globals: { process: 'readonly', console: 'readonly', URL: 'readonly', setTimeout: 'readonly', Buffer: 'readonly' } },
  },
  {
    files: ['src/env.d.ts'],
    rules: { '@typescript-eslint/triple-slash-reference': 'off', '@typescript-eslint/consistent-type-imports': 'off' },
  },
  ...roomRules,
);
