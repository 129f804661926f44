import js from '@eslint/js';
import prettier from 'eslint-config-prettier';
import vue from 'eslint-plugin-vue';
import globals from 'globals';
import ts from 'typescript-eslint';

const never = (patterns, message) => ({
  'no-restricted-imports': ['error', { patterns: [{ regex: patterns, message }] }],
});

export default ts.config(
  { ignores: ['node_modules/', 'dist/', '.data*/', '.cache/', 'coverage/', 'drizzle/', 'test-results/'] },
  js.configs.recommended,
  ...ts.configs.recommended,
  ...vue.configs['flat/recommended'],
  {
    languageOptions: { globals: { ...globals.browser, ...globals.node } },
    rules: {
      'no-undef': 'off',
      'max-lines-per-function': ['error', { max: 60, skipBlankLines: true, skipComments: true }],
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-non-null-assertion': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      '@typescript-eslint/consistent-type-imports': 'error',
      'no-restricted-exports': ['error', { restrictDefaultExports: { direct: true } }],
      eqeqeq: 'error',
    },
  },
  { files: ['**/*.vue'], languageOptions: { parserOptions: { parser: ts.parser } } },
  {
    files: ['**/*.vue'],
    rules: { 'vue/no-v-html': 'error', 'vue/multi-word-component-names': 'off' },
  },
  {
    files: ['shared/**'],
    rules: never('^(node:|vue|express|@/|#server)', 'shared/ is pure: no DOM, no Node, no framework.'),
  },
  { files: ['src/**'], rules: never('(^|/)server/|^#server|^node:', 'The client never imports the server.') },
  { files: ['server/**'], rules: never('(^|/)src/|^@/', 'The server never imports the client.') },
  { files: ['*.config.{js,ts}', 'src/**/*.d.ts'], rules: { 'no-restricted-exports': 'off' } },
  { files: ['tests/**'], rules: { 'max-lines-per-function': 'off' } },
  prettier,
);
