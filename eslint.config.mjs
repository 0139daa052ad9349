import js from '@eslint/js'
import prettier from 'eslint-config-prettier'
import vue from 'eslint-plugin-vue'
import globals from 'globals'
import tseslint from 'typescript-eslint'
import vueParser from 'vue-eslint-parser'

const RUNNERS = ['it', 'test', 'describe']

/** A test that is left out, or that leaves the others out, is not a test. */
const noTestLeftOut = RUNNERS.flatMap((object) =>
  ['only', 'skip', 'todo', 'skipIf', 'runIf'].map((property) => ({
    object,
    property,
    message: 'Every test runs, always.',
  })),
)

export default tseslint.config(
  { ignores: ['dist/', 'node_modules/', '.data/', 'coverage/'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error', noInlineConfig: true } },
  js.configs.recommended,
  ...tseslint.configs.recommended,
  ...vue.configs['flat/recommended'],
  {
    files: ['**/*.vue'],
    languageOptions: {
      parser: vueParser,
      parserOptions: { parser: tseslint.parser, extraFileExtensions: ['.vue'], sourceType: 'module' },
    },
  },
  {
    languageOptions: { ecmaVersion: 2023, sourceType: 'module' },
    rules: {
      eqeqeq: 'error',
      'no-var': 'error',
      'prefer-const': 'error',
      'object-shorthand': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      'vue/block-lang': ['error', { script: { lang: 'ts' } }],
      'vue/component-api-style': ['error', ['script-setup']],
    },
  },
  // TypeScript itself knows which names exist.
  { files: ['**/*.ts', '**/*.vue'], rules: { 'no-undef': 'off' } },
  { files: ['**/*.mjs'], languageOptions: { globals: globals.node } },
  {
    files: ['src/**', 'shared/**', 'src-server/**'],
    rules: { 'no-console': 'error', 'no-restricted-syntax': ['error', 'ExportAllDeclaration'] },
  },
  {
    files: ['tests/**'],
    rules: {
      'no-restricted-properties': [
        'error',
        {
          property: 'toBeCloseTo',
          message: 'Its second argument is digits; use expectWithin, which names the unit.',
        },
        ...noTestLeftOut,
      ],
    },
  },
  prettier,
)
