// Lint: the recommended TypeScript rules with type information, and the bans that keep the engine rooms pure.
import js from '@eslint/js';
import tseslint from 'typescript-eslint';

const pureRooms = [
  'base',
  'text',
  'prose',
  'tokens',
  'lexicon',
  'facts',
  'corpus',
  'mining',
  'termbase',
  'decisions',
].concat(['findings', 'rewrite', 'engine', 'report', 'ide']);

export default tseslint.config(
  { ignores: ['dist/', 'out/', 'node_modules/', '.vscode-host/', '.vscode-test/', 'server/src/lexicon/data/'] },
  js.configs.recommended,
  ...tseslint.configs.strictTypeChecked,
  {
    languageOptions: {
      parserOptions: { projectService: { allowDefaultProject: ['*.mjs'] }, tsconfigRootDir: import.meta.dirname },
    },
    rules: {
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true }],
      '@typescript-eslint/no-unnecessary-condition': ['error', { allowConstantLoopConditions: true }],
      '@typescript-eslint/prefer-literal-enum-member': ['error', { allowBitwiseExpressions: true }],
      '@typescript-eslint/consistent-type-imports': 'error',
      eqeqeq: 'error',
    },
  },
  {
    files: pureRooms.map((room) => `server/src/${room}/**/*.ts`),
    rules: {
      'no-restricted-imports': [
        'error',
        { patterns: [{ regex: '^(node:|fs$|path$|os$|vscode)', message: 'The engine does no I/O.' }] },
      ],
      'no-restricted-globals': [
        'error',
        'process',
        'setTimeout',
        'setInterval',
        'setImmediate',
        'performance',
        'Date',
        'navigator',
        'fetch',
        'console',
        'Buffer',
        'require',
      ],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'The engine knows no randomness.' },
      ],
      'no-restricted-syntax': [
        'error',
        {
          selector: 'MemberExpression[property.name=/^(localeCompare|toLocale.*)$/]',
          message: 'The engine knows no locale: compare code units.',
        },
      ],
    },
  },
  {
    files: ['**/*.mjs'],
    extends: [tseslint.configs.disableTypeChecked],
    languageOptions: {
      globals: {
        process: 'readonly',
        console: 'readonly',
        URL: 'readonly',
        setTimeout: 'readonly',
        clearTimeout: 'readonly',
        Buffer: 'readonly',
        document: 'readonly',
        window: 'readonly',
        performance: 'readonly',
        URLSearchParams: 'readonly',
        fetch: 'readonly',
      },
    },
  },
);
