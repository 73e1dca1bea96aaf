import astro from 'eslint-plugin-astro';
import a11y from 'eslint-plugin-jsx-a11y';
import hooks from 'eslint-plugin-react-hooks';
import ts from 'typescript-eslint';

/** Imports a layer must not make; the table stands in DEVELOPERS.md. dependency-cruiser holds it for .ts and .tsx, this for .astro too. */
const keepOut = (files, groups, message) => ({
  files,
  rules: { 'no-restricted-imports': ['error', { patterns: [{ group: groups, message }] }] },
});

export default ts.config(
  {
    ignores: [
      'dist/**',
      'node_modules/**',
      '.astro/**',
      'data/**',
      'public/**',
      'test-results/**',
      'playwright-report/**',
    ],
  },
  ...ts.configs.strict,
  ...astro.configs.recommended,
  ...astro.configs['jsx-a11y-strict'],
  // eslint-plugin-astro brings its own copy of the jsx-a11y plugin for every file, so only the rules are added here.
  { files: ['**/*.tsx'], rules: a11y.flatConfigs.strict.rules },
  { files: ['**/*.tsx'], plugins: { 'react-hooks': hooks }, rules: hooks.configs.recommended.rules },
  {
    rules: {
      'no-console': ['error', { allow: ['error', 'warn'] }],
      eqeqeq: 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/no-redeclare': 'off',
    },
  },
  { files: ['scripts/**', 'server.mjs', 'tests/**'], rules: { 'no-console': 'off' } },
  { files: ['tests/**'], rules: { '@typescript-eslint/no-non-null-assertion': 'off' } },
  keepOut(
    ['src/domain/**'],
    ['@/server/*', '@/components/*', '@/layouts/*', '@db/*', 'sequelize', 'astro*', 'react*', 'node:*'],
    'Domain rules are pure.',
  ),
  keepOut(
    ['db/**'],
    ['@/server/*', '@/components/*', '@/layouts/*', 'astro*', 'react*'],
    'db holds data, no use cases.',
  ),
  keepOut(['src/server/**'], ['@/components/*', '@/layouts/*', 'react*'], 'The server knows no screens.'),
  keepOut(
    ['src/components/**'],
    ['@/server/*', '@db/*', '@/layouts/*'],
    'Components reach data through the API or their props.',
  ),
);
