import next from 'eslint-config-next/core-web-vitals';
import nextTypescript from 'eslint-config-next/typescript';
import prettier from 'eslint-config-prettier';

/**
 * Who may import whom: an arrow goes only downward. app → components → lib/client, lib/editor → lib/contracts, lib/layout →
 * lib/kinematics; app/api and workers → lib/server → models.
 */
const layer = (files, forbidden, message, ignores = []) => ({
  files,
  ignores,
  rules: {
    'no-restricted-imports': [
      'error',
      { patterns: forbidden.map((group) => ({ group: Array.isArray(group) ? group : [group], message })) },
    ],
  },
});

const anyOf = (...folders) => folders.flatMap((folder) => [`@/${folder}`, `@/${folder}/**`]);

export default [
  { ignores: ['node_modules/', '.next*/', '.data/', 'next-env.d.ts', 'test-results/'] },
  ...next,
  ...nextTypescript,
  prettier,
  {
    rules: {
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/no-explicit-any': 'error',
      'no-console': 'off',
      eqeqeq: ['error', 'always'],
    },
  },
  layer(
    ['lib/kinematics/**'],
    [['@/**', '!@/lib/kinematics', '!@/lib/kinematics/**']],
    'The computation stands alone: hand in what it needs as plain arguments.',
    ['**/*.test.ts'],
  ),
  layer(
    ['lib/layout/**'],
    [['@/**', '!@/lib', '!@/lib/layout', '!@/lib/layout/**', '!@/lib/kinematics', '!@/lib/kinematics/**']],
    'The layout document knows only lib/kinematics: move what you need down into lib/layout.',
    ['**/*.test.ts'],
  ),
  layer(
    ['lib/contracts/**'],
    [anyOf('app', 'components', 'lib/client', 'lib/editor', 'lib/server', 'models', 'workers')],
    'Contracts are shared by both ends: build them from lib/layout and lib/kinematics alone.',
    ['**/*.test.ts'],
  ),
  layer(
    ['lib/editor/**'],
    [
      anyOf('app', 'components', 'lib/client', 'lib/server', 'models', 'workers'),
      ['react', 'react-dom', 'konva', 'react-konva', 'next', 'next/**', 'swr'],
    ],
    'The editor has no React, canvas, DOM or server: take what you need through an interface that the sheet fills in.',
    ['**/*.test.ts'],
  ),
  layer(
    ['lib/client/**'],
    [anyOf('app', 'components', 'lib/server', 'models', 'workers')],
    'The client speaks to the server through lib/contracts and fetch only.',
    ['**/*.test.ts', '**/*.test.tsx'],
  ),
  layer(
    ['components/**'],
    [anyOf('app', 'lib/server', 'models', 'workers'), ['sequelize', 'pg']],
    'Components read through the hooks of lib/client; take the data from there or as a property.',
    ['**/*.test.tsx'],
  ),
  layer(
    ['components/ui/**'],
    [anyOf('lib/contracts', 'lib/editor', 'lib/client', 'lib/layout', 'lib/kinematics', 'lib/server', 'models')],
    'The primitives of components/ui know no domain: pass words and values in as properties.',
    ['**/*.test.tsx'],
  ),
  layer(
    ['lib/server/**', 'models/**'],
    [anyOf('app', 'components', 'lib/client', 'lib/editor', 'workers')],
    'The server knows neither the pages nor the workers: let them call it.',
    ['**/*.test.ts'],
  ),
  layer(
    ['migrations/**'],
    [anyOf('lib', 'models', 'workers', 'app', 'components')],
    'A migration imports nothing: the code it would import changes, and it must not.',
  ),
];
