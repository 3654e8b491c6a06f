import js from '@eslint/js'
import globals from 'globals'
import pluginVue from 'eslint-plugin-vue'
import tseslint from 'typescript-eslint'

/** One import rule for a folder: each pattern says what may not be imported there, and why. */
const forbid = (files, patterns, ignores = []) => ({
  files,
  ignores,
  rules: {
    'no-restricted-imports': ['error', { patterns: patterns.map(([regex, message]) => ({ regex, message })) }],
  },
})

const fromShared = [
  ['^(?!\\.{1,2}/|zod$|flatqueue$|jsbarcode$)', 'shared/ is pure: it imports itself, zod, flatqueue and jsbarcode'],
  ['/(src|server|tests|fixtures)/', 'shared/ knows neither client nor server'],
]
const fromClient = [
  ['/server/', 'the client does not import the server'],
  ['^(express|drizzle-orm|mysql2|exceljs|pdfkit|node:)', 'a server library'],
]
const vueFlow = ['^@vue-flow/', 'Vue Flow only in features/riser']
const fromServer = [
  ['/src/', 'the server does not import the client'],
  ['^(vue|pinia|naive-ui|vue-router|@vue-flow)', 'a client library'],
]
const drizzle = ['^drizzle-orm', 'SQL only in *Repo.ts and server/db']

/** A feature may use features/job and features/session, and no other feature. */
const features = ['catalog', 'checks', 'company', 'field', 'jobs', 'labels', 'riser', 'schedule']
const featureRules = features.map((name) => {
  const others = features.filter((other) => other !== name).join('|')
  return forbid(
    [`src/features/${name}/**/*.{ts,vue}`],
    [
      ...fromClient,
      ...(name === 'riser' ? [] : [vueFlow]),
      [`^\\.\\./(\\.\\./)*(features/)?(${others})/`, 'a feature reads features/job and features/session, no other feature'],
    ],
  )
})

export default tseslint.config(
  { ignores: ['dist/**', 'coverage/**', 'drizzle/**', '.tsbuild/**', '.mudring/**', 'reports/**', 'node_modules/**'] },
  js.configs.recommended,
  ...tseslint.configs.strict,
  ...pluginVue.configs['flat/recommended'],
  { files: ['**/*.vue'], languageOptions: { parserOptions: { parser: tseslint.parser } } },
  { languageOptions: { globals: { ...globals.browser, ...globals.node } } },
  {
    rules: {
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      'no-undef': 'off',
      'vue/max-attributes-per-line': 'off',
      'vue/singleline-html-element-content-newline': 'off',
      'vue/html-self-closing': ['error', { html: { void: 'any', normal: 'always' } }],
      'vue/multi-word-component-names': 'off',
      'vue/require-default-prop': 'off',
      'vue/attributes-order': 'off',
      'vue/html-indent': 'off',
      'vue/html-closing-bracket-newline': 'off',
      'vue/first-attribute-linebreak': 'off',
      'vue/multiline-html-element-content-newline': 'off',
      'no-console': ['error', { allow: ['error', 'warn'] }],
    },
  },
  { files: ['server/start/**', 'tests/**'], rules: { 'no-console': 'off' } },
  forbid(['shared/**/*.ts'], fromShared),
  forbid(['src/**/*.{ts,vue}'], [...fromClient, vueFlow], ['src/features/**']),
  forbid(['src/features/{job,session}/**/*.{ts,vue}'], [...fromClient, vueFlow]),
  ...featureRules,
  forbid(['server/**/*.ts'], [...fromServer, drizzle], ['server/**/*Repo.ts', 'server/db/**']),
  forbid(['server/**/*Repo.ts', 'server/db/**/*.ts'], fromServer),
)
