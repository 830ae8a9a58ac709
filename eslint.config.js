import js from '@eslint/js';
import svelte from 'eslint-plugin-svelte';
import globals from 'globals';
import tseslint from 'typescript-eslint';

/** Numbers and dates are written by the program's own functions, so that every machine prints the same texts. */
const NO_LOCALE = [
  'toLocaleString',
  'toLocaleDateString',
  'toLocaleTimeString',
  'toLocaleUpperCase',
  'toLocaleLowerCase',
];

const SAME_EVERYWHERE = {
  'no-restricted-properties': [
    'error',
    ...NO_LOCALE.map((property) => ({ property, message: 'It depends on the locale of the machine.' })),
    { object: 'Intl', property: 'NumberFormat', message: 'It depends on the locale of the machine.' },
    { object: 'Intl', property: 'DateTimeFormat', message: 'It depends on the locale of the machine.' },
  ],
  'no-restricted-syntax': [
    'error',
    {
      selector: 'CallExpression[callee.property.name="localeCompare"][arguments.length<2]',
      message: 'Name the locale, or compare code units.',
    },
  ],
};

const STRICT = {
  eqeqeq: 'error',
  'no-console': 'off',
  'max-lines': ['error', { max: 400 }],
  'no-warning-comments': ['error', { terms: ['todo', 'fixme', 'xxx', 'hack'], location: 'anywhere' }],
  'prefer-const': 'error',
  // File names and cohort files hold control characters, and must be cleaned of them.
  'no-control-regex': 'off',
  ...SAME_EVERYWHERE,
};

const TYPED = {
  '@typescript-eslint/no-explicit-any': 'error',
  '@typescript-eslint/consistent-type-imports': 'error',
  '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
  '@typescript-eslint/no-floating-promises': 'error',
  '@typescript-eslint/ban-ts-comment': 'error',
  '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
  '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
  '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true }],
  // Index signatures are read with brackets, as the compiler option noPropertyAccessFromIndexSignature would have it.
  '@typescript-eslint/dot-notation': 'off',
  '@typescript-eslint/no-generated-empty-object-type': 'off',
  '@typescript-eslint/no-unsafe-class-instance-assignment': 'off',
  // Code points are what is meant where a text is spread.
  '@typescript-eslint/no-misused-spread': 'off',
};

export default tseslint.config(
  { ignores: ['node_modules/', 'dist/', 'release/', '.cache/', 'test-results/'] },
  { linterOptions: { noInlineConfig: true, reportUnusedDisableDirectives: 'error' } },
  js.configs.recommended,
  { rules: STRICT },
  {
    files: ['**/*.ts'],
    extends: [tseslint.configs.strictTypeChecked],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: TYPED,
  },
  {
    files: ['**/*.svelte', '**/*.svelte.ts'],
    extends: [tseslint.configs.strict, svelte.configs.recommended],
    languageOptions: { globals: globals.browser, parserOptions: { parser: tseslint.parser } },
    rules: { '@typescript-eslint/consistent-type-imports': 'error' },
  },
  {
    // Tests read what the program wrote, whose shape is what they find out, and name methods without calling them.
    files: ['test/**/*.ts'],
    rules: {
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
      '@typescript-eslint/no-confusing-void-expression': 'off',
      '@typescript-eslint/no-meaningless-void-operator': 'off',
      '@typescript-eslint/unbound-method': 'off',
    },
  },
  { files: ['src-renderer/**/*.ts'], languageOptions: { globals: globals.browser } },
  { files: ['**/*.mjs', '*.js'], languageOptions: { globals: globals.node } },
);
