import svelte from 'eslint-plugin-svelte';
import tseslint from 'typescript-eslint';
import svelteConfig from './svelte.config.js';

/** Forms that a floor could leak through, or that leave work behind. */
const leaks = [
  {
    selector: 'TSQualifiedName > Identifier.left[name="Electron"]',
    message: 'Electron names belong in app/desktop and app/preload, imported by name.',
  },
  { selector: 'MemberExpression > Identifier.property[name="only"]', message: 'A test run alone hides the others.' },
];

/**
 * dependency-cruiser sees a component only after its types are gone, so the floors of the renderer are said once more
 * here for `.svelte` files, type imports included.
 */
const componentFloors = (konvaAllowed) => ({
  '@typescript-eslint/no-restricted-imports': [
    'error',
    {
      patterns: [
        ...(konvaAllowed ? [] : [{ regex: '^konva(/|$)', message: 'Konva belongs in renderer/board.' }]),
        { regex: '^electron(/|$)', message: 'Electron belongs in app/desktop and app/preload.' },
        { regex: '^node:', message: 'The page runs in a sandbox.' },
        { regex: '/app/(?!host[.]ts$)', message: 'The page knows its shell only by app/host.ts.' },
        { regex: '/app/host[.]ts$', allowTypeImports: true, message: 'app/host.ts holds types only.' },
      ],
    },
  ],
});

export default tseslint.config(
  { ignores: ['dist/', 'out/', 'coverage/', 'test-results/', 'playwright-report/'] },
  { linterOptions: { noInlineConfig: true } },
  tseslint.configs.strictTypeChecked,
  tseslint.configs.stylistic,
  svelte.configs.recommended,
  {
    languageOptions: {
      parserOptions: {
        projectService: { allowDefaultProject: ['eslint.config.js', 'svelte.config.js', '.dependency-cruiser.cjs'] },
        tsconfigRootDir: import.meta.dirname,
        extraFileExtensions: ['.svelte'],
      },
    },
    rules: {
      eqeqeq: 'error',
      'no-console': 'error',
      'no-constant-binary-expression': 'error',
      'no-constructor-return': 'error',
      'no-self-compare': 'error',
      'no-template-curly-in-string': 'error',
      'no-unsafe-finally': 'error',
      'no-useless-assignment': 'error',
      'no-var': 'error',
      'no-warning-comments': ['error', { terms: ['todo', 'fixme', 'xxx', 'hack'], location: 'anywhere' }],
      'max-lines': ['error', 350],
      'prefer-const': 'error',
      'no-restricted-syntax': ['error', ...leaks],
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-misused-spread': ['error', { allow: ['string'] }],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/no-confusing-void-expression': ['error', { ignoreArrowShorthand: true }],
      '@typescript-eslint/no-unnecessary-condition': [
        'error',
        { allowConstantLoopConditions: 'only-allowed-literals' },
      ],
      // `noUncheckedIndexedAccess` asks for a word at every indexed read; in a counted loop `!` is the honest one.
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/non-nullable-type-assertion-style': 'off',
      '@typescript-eslint/prefer-for-of': 'off',
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
    },
  },
  {
    files: ['**/*.svelte', '**/*.svelte.ts'],
    languageOptions: { parserOptions: { parser: tseslint.parser, svelteConfig } },
    // `let` is how a rune is declared, and a prop given no value is void on purpose. No stores are used.
    rules: {
      'prefer-const': 'off',
      'svelte/require-store-reactive-access': 'off',
      'svelte/prefer-const': ['error', { excludedRunes: ['$props', '$state', '$derived'] }],
    },
  },
  {
    // In a component's markup the linter takes what another component hands back for `any`; svelte-check knows better.
    files: ['**/*.svelte'],
    rules: {
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
    },
  },
  { files: ['renderer/**/*.svelte'], rules: componentFloors(false) },
  { files: ['renderer/board/**/*.svelte'], rules: componentFloors(true) },
  {
    files: ['core/**/*.ts'],
    rules: {
      // Types of packages may bring Node's or the page's globals in; the core uses none of them.
      'no-restricted-globals': [
        'error',
        ...['window', 'document', 'navigator', 'localStorage', 'self', 'process', 'Buffer', 'global', 'require'],
        ...['setTimeout', 'setInterval', 'queueMicrotask', 'fetch', 'console', 'performance', 'URL', 'Blob'],
      ],
    },
  },
  // Programs at a terminal speak through it.
  { files: ['app/cli/**', 'app/start.ts', 'app/build.ts', 'assets/**', 'tests/**'], rules: { 'no-console': 'off' } },
  {
    files: ['tests/**'],
    rules: { 'max-lines': ['error', 500], '@typescript-eslint/no-unsafe-assignment': 'off' },
  },
  { files: ['**/*.{js,cjs}'], extends: [tseslint.configs.disableTypeChecked] },
);
