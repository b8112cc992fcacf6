import angular from 'angular-eslint';
import prettier from 'eslint-config-prettier/flat';
import { defineConfig, globalIgnores } from 'eslint/config';
import tseslint from 'typescript-eslint';

const specs = ['**/*.spec.ts', '**/testing/**/*.ts', 'e2e/**/*.ts'];

const noEnum = {
  selector: 'TSEnumDeclaration',
  message: 'No enums: a const object (or array) and a union type.',
};

const focusedOrSkipped = ['fdescribe', 'fit', 'xdescribe', 'xit', 'pending'].map((name) => ({
  name,
  message: 'Every spec runs, always: no focused and no skipped specs.',
}));

/** What would make `shared/` depend on where or when it runs. The compiler has no types for most of it either. */
const hostGlobals = [
  'window',
  'document',
  'navigator',
  'location',
  'self',
  'globalThis',
  'process',
  'require',
  'Buffer',
  'console',
  'fetch',
  'performance',
  'crypto',
  'localStorage',
  'setTimeout',
  'setInterval',
  'setImmediate',
  'requestAnimationFrame',
  'Intl',
].map((name) => ({
  name,
  message: 'shared/ knows no host, no clock and no locale: take it as an argument.',
}));

export default defineConfig(
  globalIgnores([
    'node_modules/',
    'dist/',
    '.angular/',
    'data/',
    'coverage/',
    'test-results/',
    '**/*.generated.ts',
    'shared/pattern/kernel/assembly/',
  ]),
  { linterOptions: { reportUnusedDisableDirectives: 'error', reportUnusedInlineConfigs: 'error' } },

  {
    files: ['**/*.{ts,js,mjs,cjs}'],
    rules: {
      eqeqeq: 'error',
      'no-debugger': 'error',
      'no-eval': 'error',
      'no-implied-eval': 'error',
      'no-new-func': 'error',
      'no-constant-binary-expression': 'error',
      'no-param-reassign': ['error', { props: false }],
      'no-self-compare': 'error',
      'no-unmodified-loop-condition': 'error',
      'no-unsafe-finally': 'error',
      'no-useless-assignment': 'error',
      'no-var': 'error',
      'object-shorthand': 'error',
      'prefer-const': 'error',
    },
  },
  {
    files: ['**/*.{js,mjs,cjs}'],
    extends: [tseslint.configs.base],
    rules: { 'max-lines': ['error', 400], '@typescript-eslint/no-unused-vars': 'error' },
  },

  {
    files: ['**/*.ts'],
    extends: [tseslint.configs.strictTypeChecked],
    languageOptions: {
      parserOptions: {
        project: [
          'shared/tsconfig.spec.json',
          'server/tsconfig.spec.json',
          'src/tsconfig.spec.json',
          'src/tsconfig.worker.json',
          'e2e/tsconfig.json',
        ],
        tsconfigRootDir: import.meta.dirname,
      },
    },
    rules: {
      'max-lines': ['error', 400],
      'no-restricted-syntax': ['error', noEnum],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-confusing-void-expression': [
        'error',
        { ignoreArrowShorthand: true, ignoreVoidReturningFunctions: true },
      ],
      '@typescript-eslint/no-dynamic-delete': 'off',
      '@typescript-eslint/no-extraneous-class': ['error', { allowWithDecorator: true, allowEmpty: true }],
      // Dear, and of no use without enums and with plain data.
      '@typescript-eslint/no-unsafe-class-instance-assignment': 'off',
      '@typescript-eslint/no-unsafe-enum-assignment': 'off',
      // A string spread into its characters is fine where the text is ours: figures, fractions, units.
      '@typescript-eslint/no-misused-spread': 'off',
      '@typescript-eslint/no-unnecessary-condition': [
        'error',
        { allowConstantLoopConditions: 'only-allowed-literals' },
      ],
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      // A kind of step without fields of its own is one.
      '@typescript-eslint/no-generated-empty-object-type': 'off',
      // Writes out whole types to compare them and overflows the stack on typed forms.
      '@typescript-eslint/no-unnecessary-type-parameters': 'off',
      '@typescript-eslint/prefer-readonly': 'error',
      '@typescript-eslint/restrict-template-expressions': [
        'error',
        { allowNumber: true, allowBoolean: true },
      ],
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true, requireDefaultForNonUnion: false },
      ],
      '@typescript-eslint/unbound-method': ['error', { ignoreStatic: true }],
    },
  },

  {
    files: ['shared/**/*.ts'],
    rules: {
      '@typescript-eslint/explicit-module-boundary-types': 'error',
      'no-restricted-globals': ['error', ...hostGlobals, ...focusedOrSkipped],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'Random numbers come from a seed.' },
        { object: 'Date', property: 'now', message: 'The time comes in as an argument.' },
        ...['toLocaleString', 'toLocaleDateString', 'toLocaleTimeString'].map((property) => ({
          property,
          message: 'The same design reads the same on every machine: format through shared/units.',
        })),
      ],
      'no-restricted-syntax': [
        'error',
        noEnum,
        {
          selector: 'NewExpression[callee.name="Date"][arguments.length=0]',
          message: 'The time comes in as an argument.',
        },
        { selector: 'CallExpression[callee.name="Date"]', message: 'The time comes in as an argument.' },
        {
          selector: 'ImportDeclaration[source.value="zod"] > ImportSpecifier[imported.name="z"]',
          message: "import * as z: the named export brings every language's messages into the page.",
        },
      ],
    },
  },

  {
    files: ['server/**/*.ts'],
    rules: {
      // The log goes through pino, so that secrets are redacted and a request can be followed.
      'no-console': 'error',
      // `return next(error)` is how a handler hands on.
      '@typescript-eslint/no-confusing-void-expression': 'off',
    },
  },

  {
    files: ['src/**/*.ts'],
    extends: [angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    rules: {
      'no-console': 'error',
      // `http.delete<void>()` is how Angular says that an answer has no body.
      '@typescript-eslint/no-invalid-void-type': 'off',
      '@angular-eslint/component-selector': ['error', { type: 'element', prefix: 'lw', style: 'kebab-case' }],
      '@angular-eslint/directive-selector': [
        'error',
        { type: 'attribute', prefix: 'lw', style: 'camelCase' },
      ],
      '@angular-eslint/no-async-lifecycle-method': 'error',
      '@angular-eslint/no-uncalled-signals': 'error',
      '@angular-eslint/prefer-host-metadata-property': 'error',
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@angular-eslint/prefer-output-readonly': 'error',
      '@angular-eslint/prefer-signals': 'error',
      '@angular-eslint/relative-url-prefix': 'error',
    },
  },
  {
    files: ['src/**/*.html'],
    extends: [angular.configs.templateRecommended, angular.configs.templateAccessibility],
    rules: {
      '@angular-eslint/template/button-has-type': 'error',
      '@angular-eslint/template/no-any': 'error',
      '@angular-eslint/template/no-duplicate-attributes': ['error', { allowStylePrecedenceDuplicates: true }],
      '@angular-eslint/template/no-empty-control-flow': 'error',
      '@angular-eslint/template/no-inline-styles': ['error', { allowBindToStyle: true, allowNgStyle: false }],
      '@angular-eslint/template/no-positive-tabindex': 'error',
      '@angular-eslint/template/prefer-control-flow': 'error',
    },
  },

  {
    files: specs,
    ignores: ['shared/**'],
    rules: { 'no-restricted-globals': ['error', ...focusedOrSkipped] },
  },
  {
    files: specs,
    rules: {
      // `expect(double.method)` and what a page or an HTTP answer holds are the business of a spec.
      '@typescript-eslint/unbound-method': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
      '@typescript-eslint/no-non-null-assertion': 'off',
    },
  },

  prettier,
);
