import litA11y from 'eslint-plugin-lit-a11y';
import { configs as lit } from 'eslint-plugin-lit';
import { configs as wc } from 'eslint-plugin-wc';
import tseslint from 'typescript-eslint';
import { ENGINE_LAYERS, layers } from './test/tools/lint-layers.mjs';

const engineFiles = ENGINE_LAYERS.flatMap((layer) => (layer === 'engine' ? ['src/engine.ts'] : [`src/${layer}/**/*.ts`]));
const elementFiles = ['src/elements/**/*.ts', 'src/embed/**/*.ts'];

const NETWORK = ['fetch', 'XMLHttpRequest', 'WebSocket', 'EventSource'].map((name) => ({
  name, message: 'The package never uses the network.',
}));
const DOM = [
  'window', 'self', 'globalThis', 'document', 'navigator', 'location', 'history', 'customElements', 'localStorage', 'sessionStorage',
  'indexedDB', 'Node', 'Element', 'HTMLElement', 'ShadowRoot', 'Event', 'CustomEvent', 'MessageEvent', 'postMessage',
  'setTimeout', 'setInterval', 'queueMicrotask', 'requestAnimationFrame', 'performance', 'process',
].map((name) => ({ name, message: 'The DOM and the clock belong to src/elements and src/embed.' }));
const UNREPRODUCIBLE = ['Date', 'Intl', 'crypto'].map((name) => ({
  name, message: 'The engine is pure: the same input gives the same record everywhere and always.',
}));

const MARKUP = ['innerHTML', 'outerHTML', 'insertAdjacentHTML', 'createContextualFragment'].map((property) => ({
  property, message: 'Text from outside is never markup.',
}));
const RANDOM = [{ object: 'Math', property: 'random', message: 'The engine is pure: the same input gives the same record.' }];
const LOCALE = ['localeCompare', 'toLocaleString', 'toLocaleLowerCase', 'toLocaleUpperCase'].map((property) => ({
  property, message: 'Its result depends on the locale of the machine.',
}));
const APPROXIMATED = [
  'acos', 'acosh', 'asin', 'asinh', 'atan', 'atan2', 'atanh', 'cbrt', 'cos', 'cosh', 'exp', 'expm1', 'hypot', 'log', 'log10',
  'log1p', 'log2', 'pow', 'sin', 'sinh', 'tan', 'tanh',
].map((property) => ({
  object: 'Math', property, message: 'Engines differ in its last digit: use quantities/reproducible-math.js.',
}));
const POWER = [
  { selector: 'BinaryExpression[operator="**"]', message: 'Engines differ in the last digit of a power: multiply, or use quantities/reproducible-math.js.' },
  { selector: 'AssignmentExpression[operator="**="]', message: 'Engines differ in the last digit of a power: multiply, or use quantities/reproducible-math.js.' },
];
const INLINE_STYLE = [
  {
    selector: 'TaggedTemplateExpression[tag.name=/^(html|svg)$/] TemplateElement[value.raw=/\\sstyle=|<style/]',
    message: 'A strict content security policy blocks styles in templates: use static styles or a class.',
  },
];

export default tseslint.config(
  { ignores: ['dist', 'coverage'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  ...tseslint.configs.recommendedTypeChecked,
  { languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } } },
  {
    rules: {
      eqeqeq: 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
    },
  },
  {
    files: ['**/*.{mjs,js}'],
    ...tseslint.configs.disableTypeChecked,
  },
  {
    files: ['src/**/*.ts'],
    plugins: { project: { rules: { layers } } },
    rules: {
      'project/layers': 'error',
      'no-console': 'error',
      'max-lines': ['error', { max: 400 }],
      'no-restricted-globals': ['error', ...NETWORK],
      'no-restricted-properties': ['error', ...MARKUP],
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
    },
  },
  {
    files: [...engineFiles, 'src/index.ts'],
    rules: { 'no-restricted-globals': ['error', ...NETWORK, ...DOM] },
  },
  {
    files: engineFiles,
    rules: {
      'no-restricted-globals': ['error', ...NETWORK, ...DOM, ...UNREPRODUCIBLE],
      'no-restricted-properties': ['error', ...MARKUP, ...RANDOM, ...LOCALE, ...APPROXIMATED],
      'no-restricted-syntax': ['error', ...POWER],
    },
  },
  {
    files: ['src/quantities/reproducible-math.ts'],
    rules: { 'no-restricted-properties': ['error', ...RANDOM, ...LOCALE], 'no-restricted-syntax': 'off' },
  },
  { files: elementFiles, ...lit['flat/recommended'] },
  { files: elementFiles, ...wc['flat/recommended'], settings: { wc: { elementBaseClasses: ['LitElement'] } } },
  {
    files: elementFiles,
    plugins: { 'lit-a11y': litA11y },
    rules: {
      ...litA11y.configs.recommended.rules,
      'no-restricted-syntax': ['error', ...INLINE_STYLE],
      // Lit binds the listeners of a template to their element.
      '@typescript-eslint/unbound-method': 'off',
    },
  },
  {
    files: ['test/**/*.ts'],
    rules: {
      '@typescript-eslint/no-floating-promises': ['error', {
        allowForKnownSafeCalls: [{ from: 'package', package: 'node:test', name: ['describe', 'it', 'suite', 'test', 'before', 'after', 'beforeEach', 'afterEach'] }],
      }],
      // Chai's assertions are expressions.
      '@typescript-eslint/no-unused-expressions': 'off',
      '@typescript-eslint/unbound-method': 'off',
    },
  },
  {
    files: ['test/**/*.browser.ts'],
    rules: {
      // The type of Chai's assertions pretends that every one is a promise; only this one is.
      '@typescript-eslint/no-floating-promises': 'off',
      'no-restricted-syntax': ['error', {
        selector: 'ExpressionStatement > CallExpression[callee.property.name="accessible"]',
        message: 'The accessibility check is asynchronous: await it.',
      }],
    },
  },
);
