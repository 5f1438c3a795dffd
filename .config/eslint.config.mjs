import js from '@eslint/js';
import prettier from 'eslint-config-prettier';
import tseslint from 'typescript-eslint';

export default tseslint.config(
  { ignores: ['dist/**', 'var/**', 'node_modules/**', 'src/persistence/generated/**'] },
  js.configs.recommended,
  ...tseslint.configs.recommendedTypeChecked,
  {
    languageOptions: { parserOptions: { project: './tsconfig.json', tsconfigRootDir: `${import.meta.dirname}/..` } },
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'separate-type-imports' }],
      '@typescript-eslint/no-import-type-side-effects': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      '@typescript-eslint/require-await': 'off',
      'no-console': 'error',
      'max-lines': ['error', { max: 400, skipBlankLines: true }],
      eqeqeq: 'error',
      curly: ['error', 'multi-line'],
    },
  },
  {
    files: ['src/core/**/*.ts'],
    rules: {
      'no-restricted-globals': ['error', 'process', 'Date', 'globalThis'],
      'no-restricted-properties': ['error', { object: 'Math', property: 'random', message: 'Chance is a parameter.' }],
    },
  },
  {
    files: ['src/**/*.ts', 'jobs/**/*.ts', 'reports/**/*.ts', 'prisma/**/*.ts'],
    ignores: ['src/platform/env.ts', 'src/platform/embedded/**', 'prisma/prisma.config.ts'],
    rules: {
      'no-restricted-syntax': [
        'error',
        {
          selector: "MemberExpression[object.name='process'][property.name='env']",
          message: 'Only env.ts reads the environment.',
        },
      ],
    },
  },
  {
    // Tests look at answers of the API as they come.
    files: ['test/**/*.ts'],
    rules: {
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
    },
  },
  { files: ['**/*.mjs'], ...tseslint.configs.disableTypeChecked },
  { files: ['**/*.mjs'], languageOptions: { globals: { process: 'readonly', URL: 'readonly', console: 'readonly' } } },
  prettier,
);
