import path from 'node:path';
import next from 'eslint-config-next/core-web-vitals';
import tseslint from 'typescript-eslint';

const root = path.resolve(import.meta.dirname, '..');

/** A pattern of code that is refused, and why. */
const ban = (selector, message) => ({ selector, message });

const EVERYWHERE = [
  ban(
    "CallExpression[callee.property.name='commit']",
    'A hand-called commit resolves even when COMMIT failed: use the callback form, inTransaction.',
  ),
  ban(
    "CallExpression[callee.property.name='transaction'][arguments.length=0]",
    'A transaction without its work as a callback can be lost: use inTransaction.',
  ),
  ban("CallExpression[callee.property.name='transactionProvider']", 'Use inTransaction.'),
  ban(
    'CallExpression[callee.property.name=/^(raw|[a-z]+Raw)$/] > TemplateLiteral[expressions.length>0]',
    'Values are bound with ?, names with ??, never pasted into SQL.',
  ),
  ban(
    'CallExpression[callee.property.name=/^(raw|[a-z]+Raw)$/] > BinaryExpression:has(Identifier, CallExpression, TemplateLiteral)',
    'Values are bound with ?, names with ??, never pasted into SQL.',
  ),
  ban(
    "JSXAttribute[name.name='dangerouslySetInnerHTML'], Property[key.name='dangerouslySetInnerHTML']",
    'Text becomes elements in lib/server/markdown, never HTML.',
  ),
  ban('TSEnumDeclaration', 'States are named by a union of strings.'),
  ban(
    "CallExpression[callee.property.name='skipLocked']",
    'SKIP LOCKED does not hold across the nodes of a cluster: claim by a conditional update.',
  ),
  ban(
    'Literal[value=/GET_LOCK|RELEASE_LOCK|SKIP\\s+LOCKED|LOCK\\s+TABLES/i]',
    'Such locks do not hold across the nodes of a cluster: claim by a conditional update.',
  ),
  ban(
    'TemplateElement[value.raw=/GET_LOCK|RELEASE_LOCK|SKIP\\s+LOCKED|LOCK\\s+TABLES/i]',
    'Such locks do not hold across the nodes of a cluster: claim by a conditional update.',
  ),
];

const NO_DEFAULT_EXPORT = [
  ban('ExportDefaultDeclaration', 'Default exports only where Next or a tool wants one.'),
  ban("ExportSpecifier[exported.name='default']", 'Default exports only where Next or a tool wants one.'),
];

const PURE = [
  ban('ThrowStatement', 'The domain does not throw: what a user can cause is in the return type (assertNever for what cannot be).'),
  ban("NewExpression[callee.name='Date'][arguments.length=0]", 'The domain has no clock: the instant is an argument.'),
  ban("MemberExpression[object.name='Date'][property.name='now']", 'The domain has no clock: the instant is an argument.'),
  ban("MemberExpression[object.name='Math'][property.name='random']", 'The domain has no chance in it.'),
];

/** The options of a later block replace those of an earlier one, so each block names the whole list. */
const bans = (...lists) => ({ 'no-restricted-syntax': ['error', ...EVERYWHERE, ...lists.flat()] });

const SIZES = {
  'max-lines': ['error', { max: 250 }],
  'max-lines-per-function': ['error', { max: 50, skipBlankLines: true, skipComments: true, IIFEs: true }],
  complexity: ['error', { max: 8, variant: 'modified' }],
};
const NO_SIZES = { 'max-lines': 'off', 'max-lines-per-function': 'off', complexity: 'off' };

const BY_NEXT = ['app/**/*.{ts,tsx}', '*.{ts,mjs,cjs}', '.ci/**', 'tests/**/global.ts'];
const AS_ALLOWED = ['lib/*/schema.ts', 'lib/*/*-schema.ts', 'db/rows/**', 'tests/**', 'scripts/**'];
const IMPURE = [
  'process',
  'console',
  'fetch',
  'crypto',
  'performance',
  'setTimeout',
  'setInterval',
  'setImmediate',
  'queueMicrotask',
  'globalThis',
  'window',
  'document',
];

export default tseslint.config(
  { ignores: ['**/node_modules/', '.next*/', '.data/', 'next-env.d.ts', 'public/', 'tests/fixtures/'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  next,
  {
    rules: {
      ...SIZES,
      ...bans(NO_DEFAULT_EXPORT),
      'no-eval': 'error',
      'no-new-func': 'error',
      'no-implied-eval': 'error',
      eqeqeq: 'error',
      'no-var': 'error',
      'prefer-const': 'error',
    },
  },
  { rules: { '@next/next/no-html-link-for-pages': 'off' } }, // a plain link costs a page of words no script
  {
    files: ['**/*.{ts,tsx}'],
    extends: [tseslint.configs.strictTypeChecked],
    languageOptions: { parserOptions: { project: [path.join(root, '.ci/tsconfig.node.json')], tsconfigRootDir: root } },
    rules: {
      'no-implied-eval': 'off', // the typed rule of the same name is in the set above
      '@typescript-eslint/consistent-type-assertions': ['error', { assertionStyle: 'never' }],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/explicit-module-boundary-types': 'error',
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/switch-exhaustiveness-check': 'error',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', destructuredArrayIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
    },
  },
  { files: ['app/**', 'components/**', 'content/**', 'db/**', 'lib/**'], rules: { 'no-console': 'error' } },
  { files: ['**/*.tsx'], rules: { 'max-lines-per-function': ['error', { ...SIZES['max-lines-per-function'][1], max: 90 }] } },
  { files: BY_NEXT, rules: bans() },
  { files: AS_ALLOWED, rules: { '@typescript-eslint/consistent-type-assertions': 'off' } },
  { files: ['lib/*/domain/**'], rules: { ...bans(NO_DEFAULT_EXPORT, PURE), 'no-restricted-globals': ['error', ...IMPURE] } },
  // The tape and the diagrams read typed arrays at places they have counted out themselves.
  { files: ['lib/checks/domain/**'], rules: { '@typescript-eslint/no-non-null-assertion': 'off' } },
  { files: ['tests/**', 'db/migrations/**', 'content/**'], rules: NO_SIZES },
  { files: ['tests/**'], rules: { '@typescript-eslint/explicit-module-boundary-types': 'off' } },
  { files: ['*.ts', '.ci/**'], rules: { 'import/no-anonymous-default-export': 'off' } },
  // Here stand the patterns themselves, and examples of what they refuse.
  { files: ['.ci/**', 'tests/unit/house/**'], rules: { 'no-restricted-syntax': 'off' } },
);
