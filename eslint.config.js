import prettier from 'eslint-config-prettier'
import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript'
import imports from 'eslint-plugin-import-x'
import vue from 'eslint-plugin-vue'
import globals from 'globals'
import ts from 'typescript-eslint'

/** Which way imports may point: see "Where things live" in DEVELOPERS.md. */
const forbid = (files, patterns) => ({
  files,
  rules: {
    'no-restricted-imports': [
      'error',
      { patterns: patterns.map(([regex, message]) => ({ regex, message })) },
    ],
  },
})
const serverSide = ['^(express|typeorm|pg|pg-boss|pdfkit|node:.*)$|/server/', 'Nothing of the server here.']
const clientSide = ['^(vue|pinia|vue-router|ant-design-vue)$|^@/|/src/', 'Nothing of the client here.']
const ol = ['^ol(/|$)', 'Only src/map knows OpenLayers.']

export default ts.config(
  { ignores: ['dist/', '.data/', 'node_modules/', 'coverage/'] },
  ...ts.configs.recommended,
  ...vue.configs['flat/recommended'],
  {
    files: ['**/*.{ts,vue,js,mjs}'],
    languageOptions: { globals: { ...globals.browser, ...globals.node } },
    plugins: { 'import-x': imports },
    settings: {
      'import-x/resolver-next': [
        createTypeScriptImportResolver({ project: ['src/tsconfig.json', 'server/tsconfig.json'] }),
      ],
    },
    rules: {
      'import-x/no-cycle': ['error', { ignoreExternal: true }],
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      'no-console': 'error',
      'max-lines': ['warn', { max: 320, skipBlankLines: true, skipComments: true }],
    },
  },
  {
    files: ['**/*.vue'],
    languageOptions: { parserOptions: { parser: ts.parser, extraFileExtensions: ['.vue'] } },
    rules: {
      'vue/multi-word-component-names': 'off',
      'vue/block-order': ['error', { order: ['script', 'template', 'style'] }],
    },
  },
  forbid(['shared/**/*.ts'], [serverSide, clientSide, ol]),
  forbid(['server/**/*.ts'], [clientSide, ol]),
  forbid(['src/**/*.{ts,vue}'], [serverSide, ol]),
  forbid(['src/map/**/*.ts'], [serverSide, ['^@/editor|/editor/', 'The map knows nothing of the editor.']]),
  forbid(
    ['src/editor/**/*.ts'],
    [serverSide, ol, ['^(vue|pinia|ant-design-vue)$', 'The editor is plain TypeScript.']],
  ),
  { files: ['server/scripts/**', 'tests/run.mjs', 'tests/bench/**'], rules: { 'no-console': 'off' } },
  prettier,
)
