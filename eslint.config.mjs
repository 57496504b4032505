// Lint rules for all sources. Types are consulted in TypeScript files only; layout is prettier's business, and who may
// import whom is test/layout.test.ts's.
import eslint from 'typescript-eslint';

export default eslint.config(
  { ignores: ['dist/', 'coverage/', 'test-results/', 'node_modules/'] },
  {
    files: ['**/*.ts'],
    extends: [eslint.configs.recommendedTypeChecked],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      eqeqeq: ['error', 'always'],
      'prefer-const': 'error',
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
      '@typescript-eslint/no-non-null-assertion': 'error',
      // Numbers are written into messages everywhere, and the compiler already refuses what is not text.
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
    },
  },
  {
    files: ['**/*.mjs', '**/*.mts'],
    extends: [eslint.configs.base],
    rules: { eqeqeq: ['error', 'always'], 'prefer-const': 'error', 'no-undef': 'off' },
  },
);
