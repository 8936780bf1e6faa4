import boundaries from 'eslint-plugin-boundaries';
import next from 'eslint-config-next/core-web-vitals';
import nextTypescript from 'eslint-config-next/typescript';
import prettier from 'eslint-config-prettier';

/**
 * Who may import whom: an arrow goes only downward. app → components → lib/client, lib/editor → lib/contracts, lib/layout →
 * lib/kinematics; app/api and workers → lib/server → models. `remedy` is what the reader of a fault should do. The first
 * pattern that fits a file decides, so the narrower ones stand first.
 */
const shared = ['contracts', 'layout', 'kinematics'];
const LAYERS = {
  kinematics: {
    files: 'lib/kinematics/**',
    knows: [],
    remedy: 'The computation stands alone: hand in what it needs as plain arguments.',
  },
  layout: {
    files: 'lib/layout/**',
    knows: ['kinematics'],
    remedy: 'The layout document knows only lib/kinematics: move what you need down into lib/layout.',
  },
  contracts: {
    files: 'lib/contracts/**',
    knows: ['layout', 'kinematics'],
    remedy: 'Contracts are shared by both ends: build them from lib/layout and lib/kinematics alone.',
  },
  editor: {
    files: 'lib/editor/**',
    knows: shared,
    not: ['react', 'react-dom', 'konva', 'react-konva', 'next', 'swr'],
    remedy:
      'The editor has no React, canvas, DOM or server: take what you need through an interface that the sheet fills in.',
  },
  client: {
    files: 'lib/client/**',
    knows: ['editor', ...shared],
    remedy: 'The client speaks to the server through lib/contracts and fetch only.',
  },
  ui: {
    files: 'components/ui/**',
    knows: [],
    remedy: 'The primitives of components/ui know no domain: pass words and values in as properties.',
  },
  components: {
    files: 'components/**',
    knows: ['ui', 'client', 'editor', ...shared],
    not: ['sequelize', 'pg', 'pg-boss'],
    remedy: 'Components read through the hooks of lib/client; take the data from there or as a property.',
  },
  models: {
    files: 'models/**',
    knows: shared,
    remedy: 'A model holds columns and associations: what acts on it belongs into lib/server.',
  },
  server: {
    files: 'lib/server/**',
    knows: ['models', ...shared],
    remedy: 'The server knows neither the pages nor the workers: let them call it.',
  },
  migrations: {
    files: 'migrations/**',
    knows: [],
    remedy: 'A migration imports nothing: the code it would import changes, and it must not.',
  },
  workers: {
    files: 'workers/**',
    knows: ['server', 'models', ...shared],
    remedy: 'Workers act through lib/server: what they share with the pages belongs into lib/layout or lib/contracts.',
  },
  api: {
    files: 'app/api/**',
    knows: ['server', ...shared],
    remedy: 'A route only hands a checked request to lib/server and answers what comes back.',
  },
  app: {
    files: 'app/**',
    knows: ['components', 'ui', 'client', 'editor', 'server', ...shared],
    remedy: 'Pages put components together: models are reached through lib/server alone.',
  },
};

const layers = Object.entries(LAYERS);

const layerRules = {
  plugins: { boundaries },
  // Tests look into everything; models/index.ts is where the models meet the connection.
  ignores: ['**/*.test.ts', '**/*.test.tsx', 'models/index.ts'],
  settings: {
    'import/resolver': { typescript: { project: 'tsconfig.json' } },
    'boundaries/elements': layers.map(([type, { files }]) => ({ type, pattern: files, partialMatch: false })),
  },
  rules: {
    'boundaries/dependencies': [
      'error',
      {
        default: 'allow',
        policies: layers.map(([type, { knows, remedy }]) => {
          const beyond = layers.map(([other]) => other).filter((other) => other !== type && !knows.includes(other));
          const from = { element: { type } };
          return { from, disallow: { to: { element: { types: { anyOf: beyond } } } }, message: remedy };
        }),
      },
    ],
  },
};

const packageRules = layers
  .filter(([, { not }]) => not)
  .map(([, { files, not, remedy }]) => ({
    files: [files],
    ignores: layerRules.ignores,
    rules: {
      'no-restricted-imports': [
        'error',
        { patterns: [{ group: not.flatMap((name) => [name, `${name}/**`]), message: remedy }] },
      ],
    },
  }));

// No component lives there, and looking for one in every file is what takes the linter longest.
const withoutReact = {
  files: [
    'lib/{contracts,editor,kinematics,layout,server}/**',
    'models/**',
    'migrations/**',
    'workers/**',
    'app/api/**',
    'tests/**',
    '**/*.test.ts',
  ],
  rules: Object.fromEntries(
    next
      .flatMap(({ rules = {} }) => Object.keys(rules))
      .filter((name) => /^(react|react-hooks|jsx-a11y|@next\/next)\//.test(name))
      .map((name) => [name, 'off']),
  ),
};

const config = [
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
  withoutReact,
  layerRules,
  ...packageRules,
  {
    // A promise that nobody waits for outlives its transaction and takes its failure with it.
    files: ['lib/server/**/*.ts', 'app/api/**/*.ts', 'workers/**/*.ts'],
    languageOptions: { parserOptions: { projectService: true } },
    rules: { '@typescript-eslint/no-floating-promises': 'error' },
  },
];

export default config;
