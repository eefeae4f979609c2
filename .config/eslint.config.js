import js from '@eslint/js';
import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

/**
 * The rooms of the house and who may import whom. Rooms of the core stand in rows: a room may import the rows above it
 * and never a sibling. Change this by a numbered decision in DEVELOPERS.md.
 */
const coreRows = [
  ['numeric'],
  ['distributions'],
  ['series', 'model'],
  ['reading', 'identification', 'estimation'],
  ['uncertainty'],
  ['diagnostics', 'prediction'],
  ['selection', 'monitoring', 'averaging', 'control', 'forensics'],
  ['verdict', 'handover'],
];
const coreRooms = coreRows.flat();

const rooms = (names) => `(^|/)(${names.join('|')})/`;
const packages = (names) => `^(${names.join('|')})($|/)`;
const imports = (patterns) => ({ 'no-restricted-imports': ['error', { patterns }] });

const coreRules = coreRows.flatMap((row, index) =>
  row.map((room) => {
    const allowed = new Set([...coreRows.slice(0, index).flat(), room]);
    const barred = coreRooms.filter((other) => !allowed.has(other));
    const patterns = [
      {
        regex: rooms([...barred, 'entry']),
        message: `workers/${room} may import only contract and the rows above it, never a sibling or a later row (DEVELOPERS.md, map of rooms).`,
      },
      { regex: '(^|/)src/', message: 'The core runs headless: it never imports from src.' },
      {
        regex: packages(['react', 'react-dom', 'comlink', 'plotly\\.js', 'jspdf', 'idb']),
        message: 'The core is pure computation: no screen, no messaging.',
      },
    ];
    return {
      files: [`workers/${room}/**/*.ts`],
      ignores: room === 'numeric' ? ['workers/numeric/matrix.ts'] : [],
      rules: imports([
        ...patterns,
        {
          regex: packages(['ml-matrix']),
          message: 'ml-matrix is used in workers/numeric/matrix.ts alone, so that it can be swapped.',
        },
      ]),
    };
  }),
);

const noDom = [
  {
    regex: packages(['react', 'react-dom']),
    message: 'This room knows neither React nor the DOM: it turns plain data into plain data.',
  },
  {
    regex: rooms(['state', 'workerClient', 'panels', 'components']),
    message: 'This room is pure: it may import workers/contract and the other pure rooms only.',
  },
];
const contractOnly = {
  regex: `(^|/)workers/(${[...coreRooms, 'entry'].join('|')})/`,
  message: 'src may import workers/contract only; computation crosses the thread boundary through workerClient.',
};

export default tseslint.config(
  { ignores: ['dist/**', 'node_modules/**', '.out/**', 'public/**'] },
  js.configs.recommended,
  {
    files: ['**/*.ts', '**/*.tsx'],
    extends: [...tseslint.configs.strictTypeChecked],
    languageOptions: {
      parserOptions: {
        projectService: true,
        tsconfigRootDir: new URL('..', import.meta.url).pathname,
      },
    },
    linterOptions: { reportUnusedDisableDirectives: 'error' },
    rules: {
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/no-unnecessary-condition': 'off',
      '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
    },
  },
  {
    files: ['.tools/**/*.mjs', '.config/**/*.js', 'test/**/*.mjs', 'public/**/*.mjs'],
    languageOptions: {
      globals: {
        process: 'readonly',
        console: 'readonly',
        URL: 'readonly',
        setTimeout: 'readonly',
        clearTimeout: 'readonly',
        fetch: 'readonly',
        Buffer: 'readonly',
        performance: 'readonly',
      },
    },
  },
  {
    files: ['workers/contract/**/*.ts'],
    rules: imports([{ regex: '^(?!\\./)', message: 'workers/contract is plain data and imports nothing but itself.' }]),
  },
  {
    files: ['workers/**/*.ts'],
    ignores: ['workers/entry/**'],
    rules: {
      'no-restricted-globals': [
        'error',
        { name: 'console', message: 'The core says nothing: return a warning or a failure as data.' },
      ],
      'no-restricted-properties': [
        'error',
        { object: 'Date', property: 'now', message: 'The core has no clock: time is an argument.' },
        {
          object: 'Math',
          property: 'random',
          message: 'Randomness is an argument: use workers/numeric/random.ts with a seed.',
        },
      ],
    },
  },
  ...coreRules,
  {
    files: ['workers/entry/**/*.ts'],
    rules: imports([
      {
        regex: rooms(['numeric', 'distributions']),
        message: 'Entry files hold no arithmetic: unpack, call one orchestrator, mark transfers.',
      },
    ]),
  },
  {
    files: ['src/**/*.ts', 'src/**/*.tsx'],
    plugins: { 'react-hooks': reactHooks },
    rules: { ...reactHooks.configs.recommended.rules, ...imports([contractOnly]) },
  },
  {
    files: ['src/{figures,format,import,sessionUrl}/**/*.ts', 'src/export/report/**/*.ts'],
    rules: imports([contractOnly, ...noDom]),
  },
  {
    files: ['src/{panels,components}/**/*.{ts,tsx}'],
    rules: imports([
      contractOnly,
      { regex: rooms(['workerClient']), message: 'Panels never call workerClient: actions do.' },
    ]),
  },
  {
    files: ['src/**/*.{ts,tsx}'],
    ignores: ['src/workerClient/**'],
    rules: {
      'no-restricted-globals': [
        'error',
        { name: 'Worker', message: 'src/workerClient is the only place that makes a Worker.' },
      ],
    },
  },
);
