import js from '@eslint/js'
import prettier from 'eslint-config-prettier'
import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript'
import importX from 'eslint-plugin-import-x'
import vue from 'eslint-plugin-vue'
import globals from 'globals'
import tseslint from 'typescript-eslint'
import vueParser from 'vue-eslint-parser'

const DOMAIN = [
  'result',
  'quantities',
  'signal',
  'models',
  'shelf',
  'matcher',
  'checker',
  'patterns',
  'wording',
  'demo',
]

/** Who may import which package of ours; anything that is not listed is forbidden. */
const MAY_IMPORT = {
  result: [],
  quantities: ['result'],
  signal: ['result', 'quantities'],
  models: ['result', 'quantities', 'signal'],
  shelf: ['result', 'quantities', 'signal', 'models'],
  matcher: ['result', 'quantities', 'signal', 'models', 'shelf'],
  checker: ['result', 'quantities', 'signal', 'models', 'shelf'],
  patterns: ['result', 'quantities', 'signal', 'models'],
  wording: [],
  demo: ['result', 'quantities', 'signal', 'models', 'shelf'],
  contract: ['result', 'quantities', 'signal', 'models', 'shelf'],
}

const ALL_PACKAGES = [...Object.keys(MAY_IMPORT), 'database', 'api', 'catalogue', 'tests']

const FRAMEWORKS = [
  'express',
  'express-*',
  'knex',
  'mysql2',
  'passport*',
  'pino*',
  'vue',
  'vue-router',
  'pinia',
  'element-plus',
  'element-plus/*',
  'helmet',
]

const forbid = (groups) => ({
  'no-restricted-imports': ['error', { patterns: groups }],
})

const isForbiddenHere = (own, allowed) =>
  ALL_PACKAGES.filter((p) => p !== own && !allowed.includes(p)).map((p) => `@coaxwain/${p}`)

const packageFences = Object.entries(MAY_IMPORT).map(([own, allowed]) => ({
  files: [`packages/${own}/src/**/*.ts`],
  ignores: ['**/*.test.ts'],
  rules: forbid([
    { group: isForbiddenHere(own, allowed), message: 'Not in this direction.' },
    { group: ['node:*', ...FRAMEWORKS], message: 'Packages know no platform and no framework.' },
    ...(own === 'contract' ? [] : [{ group: ['zod', 'zod/*'], message: 'Only the contract.' }]),
  ]),
}))

const CLOCK_AND_CHANCE = [
  { object: 'Date', property: 'now', message: 'Pass the time in.' },
  { object: 'Math', property: 'random', message: 'Pass chance in.' },
  { object: 'performance', property: 'now', message: 'Pass the time in.' },
]

const size = (lines, perFunction) => ({
  'max-lines': ['error', { max: lines, skipBlankLines: true, skipComments: true }],
  'max-lines-per-function': [
    'error',
    { max: perFunction, skipBlankLines: true, skipComments: true, IIFEs: true },
  ],
})

const typed = {
  files: ['**/*.ts', '**/*.vue'],
  extends: [...tseslint.configs.recommendedTypeChecked],
  languageOptions: {
    parserOptions: {
      projectService: {
        allowDefaultProject: ['apps/catalogue/vite.config.ts'],
      },
      tsconfigRootDir: new URL('..', import.meta.url).pathname,
      extraFileExtensions: ['.vue'],
    },
  },
  rules: {
    '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
    '@typescript-eslint/no-explicit-any': 'error',
    '@typescript-eslint/no-floating-promises': 'error',
    '@typescript-eslint/no-unused-vars': [
      'error',
      { argsIgnorePattern: '^_', varsIgnorePattern: '^_' },
    ],
    '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
    '@typescript-eslint/no-base-to-string': 'off',
    '@typescript-eslint/switch-exhaustiveness-check': [
      'error',
      { considerDefaultExhaustiveForUnions: true },
    ],
  },
}

export default tseslint.config(
  {
    ignores: ['**/node_modules/**', '**/dist/**', '**/.data/**', '**/coverage/**', '**/*.d.mts'],
  },
  js.configs.recommended,
  typed,
  {
    files: ['**/*.ts', '**/*.vue', '**/*.mjs', '**/*.js'],
    plugins: { 'import-x': importX },
    settings: {
      'import-x/resolver-next': [
        createTypeScriptImportResolver({ alwaysTryTypes: true, project: 'tsconfig.base.json' }),
      ],
    },
    rules: {
      eqeqeq: 'error',
      'no-console': 'error',
      complexity: ['error', 12],
      'max-params': ['error', 4],
      'max-depth': ['error', 3],
      'no-eval': 'error',
      'no-implied-eval': 'error',
      'no-new-func': 'error',
      'import-x/no-default-export': 'error',
      'import-x/no-duplicates': 'error',
    },
  },
  {
    files: ['packages/**/*.ts', 'apps/**/*.ts', 'database/**/*.ts', 'apps/**/*.vue'],
    ignores: ['**/*.test.ts', '**/vite.config.ts'],
    rules: { 'import-x/no-extraneous-dependencies': ['error', { devDependencies: false }] },
  },
  { files: ['packages/**/*.ts'], rules: size(400, 60) },
  { files: ['apps/api/**/*.ts'], rules: size(350, 60) },
  {
    // A factory holds its methods; what they may grow to is held by the size of the file.
    files: [
      'apps/api/src/*/{service,repository}.ts',
      'apps/api/src/*/*.{service,repository}.ts',
      'apps/api/src/compose.ts',
    ],
    rules: { 'max-lines-per-function': 'off' },
  },
  {
    // Knex gives rows without types, and its builders look like promises where they are only built.
    files: ['apps/api/src/**/*repository.ts', 'apps/api/src/db/*.ts', 'tests/**/*.ts'],
    rules: {
      '@typescript-eslint/no-unnecessary-type-assertion': 'off',
      '@typescript-eslint/no-misused-promises': [
        'error',
        { checksVoidReturn: { arguments: false } },
      ],
    },
  },
  {
    // A table of data, which is to stay in one place.
    files: ['packages/contract/src/routes.ts', 'packages/wording/src/messages/*.ts'],
    rules: { 'max-lines': 'off' },
  },
  {
    files: DOMAIN.map((d) => `packages/${d}/src/**/*.ts`),
    ignores: ['**/*.test.ts'],
    rules: {
      'no-restricted-properties': ['error', ...CLOCK_AND_CHANCE],
      'no-restricted-globals': ['error', 'process', 'window', 'document', 'fetch', 'setTimeout'],
    },
  },
  ...packageFences,
  {
    files: ['apps/api/src/**/*.ts'],
    ignores: [
      'apps/api/src/{http,db}/**',
      'apps/api/src/{app,compose,server,prepare,add-owner}.ts',
    ],
    rules: forbid([
      { group: ['express', 'express-*', 'passport*'], message: 'Only http/ and app know Express.' },
      { group: ['vue', 'element-plus', 'pinia'], message: 'This is the server.' },
      { group: ['@coaxwain/catalogue'], message: 'Applications never import each other.' },
    ]),
  },
  {
    files: ['apps/api/src/*/{routes,service,mapper,*.service}.ts'],
    rules: forbid([
      { group: ['knex', 'mysql2', 'express', 'express-*'], message: 'Not in this layer.' },
    ]),
  },
  {
    files: ['database/migrations/*.ts'],
    rules: forbid([{ group: ['@coaxwain/*'], message: 'Migrations import nothing of ours.' }]),
  },
  {
    files: ['apps/catalogue/src/**/*.{ts,vue}'],
    rules: forbid([
      {
        group: ['express', 'knex', 'mysql2', 'node:*', '@coaxwain/api', '@coaxwain/database'],
        message: 'This is the browser.',
      },
    ]),
  },
  ...vue.configs['flat/recommended'].map((c) => ({ ...c, files: c.files ?? ['**/*.vue'] })),
  {
    files: ['**/*.vue'],
    languageOptions: {
      parser: vueParser,
      globals: globals.browser,
      parserOptions: { parser: tseslint.parser },
    },
    rules: {
      'vue/component-api-style': ['error', ['script-setup']],
      'vue/block-order': ['error', { order: ['script', 'template', 'style'] }],
      'vue/define-macros-order': 'error',
      'vue/match-component-file-name': 'error',
      'vue/max-lines-per-block': [
        'error',
        { script: 150, template: 120, style: 80, skipBlankLines: true },
      ],
      'vue/max-template-depth': ['error', { maxDepth: 12 }],
      'vue/no-undef-components': ['error', { ignorePatterns: ['^El', '^Router'] }],
      'vue/no-ref-object-reactivity-loss': 'error',
      'vue/require-typed-ref': 'error',
      'vue/no-v-html': 'error',
      // An optional prop of TypeScript says so by its type.
      'vue/require-default-prop': 'off',
      'vue/multi-word-component-names': ['error', { ignores: ['App'] }],
      'import-x/no-default-export': 'off',
    },
  },
  {
    files: ['apps/catalogue/**/*.ts'],
    languageOptions: { globals: globals.browser },
  },
  {
    files: ['scripts/**/*.{mjs,js}', '**/*.cjs'],
    languageOptions: { globals: globals.node },
    rules: { 'max-lines': ['error', 400] },
  },
  {
    files: [
      '**/*.config.ts',
      '**/*.config.js',
      '**/*.cjs',
      '**/global-*.ts',
      '**/*.d.ts',
      '**/*.d.mts',
    ],
    rules: { 'import-x/no-default-export': 'off', '@typescript-eslint/no-require-imports': 'off' },
  },
  {
    // One program for everything but the client: a program for each workspace reads the same files again.
    files: ['{packages,database,tests}/**/*.ts', 'apps/api/**/*.ts', 'scripts/**/*.d.mts'],
    languageOptions: {
      parserOptions: { projectService: false, project: ['scripts/tsconfig.lint.json'] },
    },
  },
  {
    files: ['**/*.test.ts', 'tests/**/*.ts'],
    rules: {
      'max-lines-per-function': 'off',
      'max-lines': ['error', { max: 600, skipBlankLines: true, skipComments: true }],
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
    },
  },
  {
    // The translation of a case is to be one file, which imports nothing of what judges the answer.
    files: ['tests/cases/translate.ts'],
    rules: { 'max-lines': 'off' },
  },
  { files: ['**/*.js', '**/*.mjs', '**/*.cjs'], extends: [tseslint.configs.disableTypeChecked] },
  prettier,
)
