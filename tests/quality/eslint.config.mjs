import { fileURLToPath } from 'node:url'
import next from 'eslint-config-next/core-web-vitals'
import typescript from 'eslint-config-next/typescript'
import boundaries from 'eslint-plugin-boundaries'
import { doors, pure, rooms } from './rooms.mjs'

const root = fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, '')
const code = '**/*.{ts,tsx,mjs}'

/** As few policies as can be: every import is held against every one, and that is most of the time of the stage. */
function policies(from, { rooms: open = [], packages = [], node }) {
  const whole = open.filter((name) => !doors[name])
  return [
    ...(whole.length > 0 ? [{ element: { type: whole } }] : []),
    ...open
      .filter((name) => doors[name])
      .map((name) => ({ element: { type: doors[name].room }, file: { categories: name } })),
    ...(packages.length > 0 ? [{ module: { origin: 'external', source: packages } }] : []),
    ...(node ? [{ module: { origin: 'core' } }] : []),
  ].map((to) => ({ from, allow: { to } }))
}

const oneWay = [
  ...Object.entries(rooms).flatMap(([type, room]) => policies({ element: { type } }, room)),
  ...Object.entries(doors).flatMap(([category, { room, ...reach }]) =>
    policies({ element: { type: room }, file: { categories: category } }, reach),
  ),
]

const banned = (names, message) => names.map((name) => ({ name, message }))

const sleepless = [
  {
    selector: "CallExpression[callee.property.name='waitForTimeout']",
    message: 'Wait for what is to be seen, not for time.',
  },
  {
    selector: "CallExpression[callee.name='setTimeout']",
    message: 'Wait for what is to be seen, not for time.',
  },
  {
    selector:
      'MemberExpression[object.name=/^(it|test|describe)$/][property.name=/^(skip|only|todo|fixme|fails|retry)$/]',
    message: 'Every test runs, every time.',
  },
]

const config = [
  {
    ignores: [
      'node_modules/',
      '.next*/',
      '.data/',
      'next-env.d.ts',
      'public/',
      'test-results/',
      'tests/quality/canaries/',
    ],
  },
  { linterOptions: { noInlineConfig: true } },
  ...next,
  ...typescript,
  {
    files: [code],
    rules: {
      // pictures here are made by the program itself, at their size
      '@next/next/no-img-element': 'off',
      'max-lines': ['error', 400],
      'no-warning-comments': [
        'error',
        { terms: ['todo', 'fixme', 'xxx', 'eslint-disable'], location: 'anywhere' },
      ],
      'prefer-const': 'error',
      eqeqeq: 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/ban-ts-comment': [
        'error',
        { 'ts-expect-error': true, minimumDescriptionLength: 0 },
      ],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
    },
  },
  {
    // a test's `useServer()` is no hook, a tool's config no module of the program
    files: ['tests/**/*', '*.mjs'],
    rules: {
      'react-hooks/rules-of-hooks': 'off',
      '@next/next/no-assign-module-variable': 'off',
      'import/no-anonymous-default-export': 'off',
    },
  },
  {
    // three's objects are changed in place, frame by frame: that is what they are for
    files: ['scene/webgl/**/*'],
    rules: { 'react-hooks/immutability': 'off' },
  },
  {
    files: ['{app,components,scene,lib,db}/**/*.{ts,tsx,mjs}'],
    plugins: { boundaries },
    settings: {
      'boundaries/root-path': root,
      'boundaries/elements': Object.entries(rooms).map(([type, { folder }]) => ({
        type,
        pattern: folder,
        partialMatch: false,
      })),
      'boundaries/files': Object.entries(doors).map(([category, { file }]) => ({ category, pattern: file })),
      'boundaries/dependency-nodes': ['import', 'dynamic-import', 'export', 'require'],
      // new Worker(new URL('…', import.meta.url)) is an import too
      'boundaries/additional-dependency-nodes': [
        {
          selector: "NewExpression[callee.name='Worker'] > NewExpression > Literal:first-child",
          kind: 'value',
          name: 'worker',
        },
      ],
      'boundaries/legacy-templates': false,
      'import/resolver': { typescript: { project: `${root}/tsconfig.json`, alwaysTryTypes: true } },
    },
    rules: {
      'boundaries/dependencies': [
        'error',
        { default: 'disallow', checkAllOrigins: true, checkUnknownLocals: true, policies: oneWay },
      ],
      'boundaries/no-unknown-files': 'error',
    },
  },
  {
    files: pure.map((folder) => `${folder}/${code}`),
    rules: {
      'no-restricted-globals': [
        'error',
        ...banned(
          ['Date', 'performance', 'setTimeout', 'setInterval', 'requestAnimationFrame'],
          'No clock here: time is handed in.',
        ),
        ...banned(['crypto'], 'No chance here: randomness is handed in.'),
        ...banned(
          [
            'window',
            'document',
            'navigator',
            'localStorage',
            'self',
            'fetch',
            'OffscreenCanvas',
            'HTMLElement',
          ],
          'No page here.',
        ),
        ...banned(['process', 'Buffer', 'global', 'globalThis', 'require'], 'No machine here.'),
      ],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'No chance here: randomness is handed in.' },
      ],
    },
  },
  {
    files: ['tests/**/*.{ts,tsx}'],
    rules: { 'no-restricted-syntax': ['error', ...sleepless] },
  },
]

export default config
