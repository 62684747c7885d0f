import reactHooks from 'eslint-plugin-react-hooks';
import tseslint from 'typescript-eslint';

const writesOutsideTheUnit = [
  {
    selector: "CallExpression[callee.property.name=/^(transaction|createQueryRunner)$/]",
    message: 'Every write goes through UnitOfWork.run: one queue, one transaction at a time (docs/decisions/unit-of-work.md).',
  },
  {
    selector: "CallExpression[callee.object.name='Promise'][callee.property.name='all'] CallExpression[callee.object.name='manager']",
    message: 'No Promise.all inside a unit of work: the one connection runs statements one after the other.',
  },
];

export default tseslint.config(
  { ignores: ['dist/**', 'node_modules/**', 'coverage/**', 'data/**', '*.js', '.dependency-cruiser.cjs'] },
  ...tseslint.configs.recommended,
  {
    rules: {
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/consistent-type-imports': 'off',
    },
  },
  {
    files: ['apps/api/src/**/*.ts'],
    ignores: ['apps/api/src/database/**', '**/*.spec.ts'],
    rules: { 'no-restricted-syntax': ['error', ...writesOutsideTheUnit] },
  },
  {
    files: ['libs/**/*.ts'],
    ignores: ['**/*.spec.ts'],
    rules: {
      'no-restricted-globals': ['error', 'process', 'fetch', 'setTimeout', 'setInterval', 'localStorage'],
      'no-restricted-syntax': [
        'error',
        { selector: "NewExpression[callee.name='Date'][arguments.length=0]", message: 'Time comes in as an argument.' },
        { selector: "CallExpression[callee.object.name='Date'][callee.property.name='now']", message: 'Time comes in as an argument.' },
        { selector: "CallExpression[callee.object.name='Math'][callee.property.name='random']", message: 'Randomness comes in as an argument.' },
      ],
    },
  },
  {
    files: ['apps/web/**/*.{ts,tsx}'],
    plugins: { 'react-hooks': reactHooks },
    rules: {
      ...reactHooks.configs.recommended.rules,
      'no-restricted-imports': [
        'error',
        {
          paths: [
            { name: '@blueprintjs/core', importNames: ['Popover', 'NumericInput'], message: 'PopoverNext instead of Popover (it lands at 0,0 under React 19); QuantityField instead of NumericInput.' },
          ],
        },
      ],
    },
  },
);
