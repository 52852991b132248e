const accessibility = require('eslint-plugin-jsx-a11y');
const hooks = require('eslint-plugin-react-hooks');
const typescript = require('typescript-eslint');
const describedDisable = require('./.lint/described-disable');
const fileName = require('./.lint/file-name');

const CODE = ['**/*.{ts,tsx}'];
const PLAIN = ['**/*.{js,cjs,mjs}'];
const CLIENT = ['app/**/*.tsx', 'features/**/*.{ts,tsx}', 'tests/features/**/*.{ts,tsx}'];
/** The only places that turn text into doubles and doubles into text. */
const DIGIT_FOLDERS = [
  'server/{numerics,formulas,checks}/**',
  'server/config.ts',
  'features/{plot,notation}/**',
  'tests/**',
];
const ENTRY_POINTS = [
  ...['server/*.ts', 'server/{setup,cluster}/**', 'schemas/generate.ts', 'tests/support/**'],
  ...['tests/bench/*.ts', 'tests/reference/verify-dataset.ts'],
];

const lines = (max) => ['error', { max, skipBlankLines: true, skipComments: true }];

const digits = [
  {
    selector: ":matches(CallExpression, NewExpression)[callee.name='Number']",
    message: 'Number(…) rounds to 17 digits: numbers are parsed in server/formulas and set by features/notation.',
  },
  {
    selector: "CallExpression[callee.name='parseFloat'], CallExpression[callee.property.name='parseFloat']",
    message: 'parseFloat rounds to 17 digits: numbers are parsed in server/formulas and set by features/notation.',
  },
  {
    selector: "CallExpression[callee.property.name='toFixed']",
    message: 'toFixed drops digits: numbers are set by features/notation.',
  },
];

module.exports = typescript.config(
  {
    ignores: ['node_modules/', 'dist/', '.data/', '.expo/', 'coverage/', 'expo-env.d.ts', '**/generated/**'],
  },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  {
    files: [...CODE, ...PLAIN],
    plugins: { house: { rules: { 'described-disable': describedDisable, 'file-name': fileName } } },
    rules: {
      'house/described-disable': 'error',
      'house/file-name': 'error',
      'max-lines': lines(300),
      'max-lines-per-function': lines(60),
      'max-params': ['error', 4],
      'no-console': 'error',
      'no-restricted-syntax': ['error', ...digits],
      eqeqeq: 'error',
    },
  },
  {
    files: CODE,
    extends: [typescript.configs.strictTypeChecked],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: __dirname } },
    rules: {
      // A default clause is a decision too.
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
      // A number or a boolean in a template reads as meant; objects stay forbidden.
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true, allowBoolean: true }],
      // `() => work()` as a callback that returns nothing is the shortest way to say it.
      '@typescript-eslint/no-confusing-void-expression': [
        'error',
        { ignoreArrowShorthand: true, ignoreVoidOperator: true },
      ],
      // Indexed access is checked by the compiler; inside a kernel the bound is the loop's.
      '@typescript-eslint/no-non-null-assertion': 'off',
      // The compiler asks for process.env['NAME'].
      '@typescript-eslint/dot-notation': 'off',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      'max-params': 'off',
      '@typescript-eslint/max-params': ['error', { max: 4 }],
    },
  },
  {
    files: CLIENT,
    plugins: { 'react-hooks': hooks },
    extends: [accessibility.flatConfigs.strict],
    rules: { 'react-hooks/rules-of-hooks': 'error', 'react-hooks/exhaustive-deps': 'error' },
  },
  {
    files: CODE,
    ignores: ['app/**', '*.config.ts'],
    rules: {
      'no-restricted-syntax': [
        'error',
        ...digits,
        { selector: 'ExportDefaultDeclaration', message: 'Export by name: only routes in app/ have a default.' },
      ],
    },
  },
  {
    files: DIGIT_FOLDERS,
    rules: {
      'no-restricted-syntax': [
        'error',
        { selector: 'ExportDefaultDeclaration', message: 'Export by name: only routes in app/ have a default.' },
      ],
    },
  },
  { files: ENTRY_POINTS, rules: { 'no-console': 'off' } },
  { files: ['app/**/*.tsx'], rules: { 'max-lines': lines(25) } },
  { files: ['features/**/*-screen.tsx'], rules: { 'max-lines': lines(180) } },
  { files: ['migrations/*.ts'], rules: { 'max-lines': lines(80) } },
  {
    files: ['tests/**'],
    rules: {
      // A `describe` is one function, however many tests it holds.
      'max-lines-per-function': 'off',
      // Bodies of responses and rows of ad hoc queries have no type; the assertions say what is in them.
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
    },
  },
  { files: PLAIN, ...typescript.configs.disableTypeChecked },
);
