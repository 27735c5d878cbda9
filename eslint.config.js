import js from '@eslint/js'
import boundaries from 'eslint-plugin-boundaries'
import reactHooks from 'eslint-plugin-react-hooks'
import globals from 'globals'
import tseslint from 'typescript-eslint'

/** The rooms of the house. Which may import which stands in `policies` below and in DEVELOPERS.md. */
const elements = [
  { type: 'sim', pattern: 'sim' },
  { type: 'shared', pattern: 'shared' },
  { type: 'server-compute', pattern: 'server/compute' },
  { type: 'server', pattern: 'server' },
  { type: 'client-workers', pattern: 'client/workers' },
  { type: 'client-feature', pattern: 'client/features/*', capture: ['feature'] },
  { type: 'client-components', pattern: 'client/components' },
  { type: 'client-lib', pattern: 'client/lib' },
  { type: 'client-app', pattern: 'client/app' },
  { type: 'client-main', pattern: 'client' },
  { type: 'tests', pattern: 'tests' },
].map((element) => ({ ...element, partialMatch: false }))

const to = (...types) => types.map((type) => ({ to: { element: { type } } }))

const policies = [
  { from: { element: { type: 'shared' } }, allow: to('shared') },
  { from: { element: { type: 'sim' } }, allow: to('sim', 'shared') },
  { from: { element: { type: 'server-compute' } }, allow: to('server-compute', 'server', 'shared', 'sim') },
  { from: { element: { type: 'server' } }, allow: to('server', 'server-compute', 'shared') },
  {
    from: { element: { type: 'client-workers' } },
    allow: to('client-workers', 'client-lib', 'sim', 'shared'),
  },
  { from: { element: { type: 'client-lib' } }, allow: to('client-lib', 'shared') },
  {
    from: { element: { type: 'client-components' } },
    allow: to('client-components', 'client-lib', 'shared'),
  },
  {
    from: { element: { type: 'client-feature' } },
    allow: [
      ...to('client-components', 'client-lib', 'shared'),
      {
        to: {
          element: { type: 'client-feature', captured: { feature: '{{ from.element.captured.feature }}' } },
        },
      },
    ],
  },
  {
    from: { element: { type: 'client-app' } },
    allow: to('client-app', 'client-feature', 'client-components', 'client-lib', 'client-workers', 'shared'),
  },
  { from: { element: { type: 'client-main' } }, allow: to('client-app', 'client-lib') },
  {
    // Types of the engine's results may be named anywhere in the client; its code may not be loaded there.
    from: { element: { type: ['client-lib', 'client-components', 'client-feature', 'client-app'] } },
    allow: [{ to: { element: { type: 'sim' } }, dependency: { kind: 'type' } }],
  },
  {
    from: { element: { type: 'tests' } },
    allow: to(...elements.map((element) => element.type)),
  },
]

export default tseslint.config(
  { ignores: ['dist', 'node_modules', 'data', 'coverage'] },
  js.configs.recommended,
  {
    files: ['**/*.{ts,tsx}'],
    extends: [tseslint.configs.strict, tseslint.configs.stylistic],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/switch-exhaustiveness-check': 'error',
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/no-invalid-void-type': 'off',
      '@typescript-eslint/no-empty-function': ['error', { allow: ['arrowFunctions', 'methods'] }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', ignoreRestSiblings: true }],
      'max-lines': ['error', { max: 400 }],
      'no-console': ['error', { allow: ['error'] }],
      eqeqeq: 'error',
    },
  },
  {
    files: ['{client,server,sim,shared,tests}/**/*.{ts,tsx}'],
    plugins: { boundaries },
    settings: {
      'boundaries/elements': elements,
      'boundaries/include': ['{client,server,sim,shared,tests}/**/*'],
      'boundaries/dependency-nodes': ['import', 'dynamic-import', 'export'],
      'import/resolver': { typescript: { alwaysTryTypes: true, project: 'tsconfig.json' } },
    },
    rules: {
      'boundaries/dependencies': ['error', { default: 'disallow', checkAllOrigins: false, policies }],
    },
  },
  {
    files: ['client/**/*.{ts,tsx}'],
    languageOptions: { globals: globals.browser },
    plugins: { 'react-hooks': reactHooks },
    rules: {
      ...reactHooks.configs.flat['recommended-latest'].rules,
      // Says that the React compiler would skip a component; this project does not use the compiler.
      'react-hooks/incompatible-library': 'off',
    },
  },
  {
    files: ['sim/**/*.ts', 'shared/**/*.ts'],
    rules: {
      'no-restricted-globals': [
        'error',
        'window',
        'document',
        'process',
        'Buffer',
        'performance',
        'Date',
        'setTimeout',
      ],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'Draw from a seeded generator.' },
      ],
      'no-restricted-imports': ['error', { patterns: ['node:*'] }],
    },
  },
  { files: ['**/*.{js,mjs}'], languageOptions: { globals: globals.node } },
  {
    files: ['tests/bench/**', 'tests/support/**', 'server/main.ts', 'server/create-admin.ts'],
    rules: { 'no-console': 'off' },
  },
)
