import assert from 'node:assert/strict';
import { join } from 'node:path';
import { describe, it } from 'node:test';
import { ESLint } from 'eslint';
import tseslint from 'typescript-eslint';

const root = join(import.meta.dirname, '..', '..');

/** The project's own rules; typed rules are left out because the files here exist in name only. */
const eslint = new ESLint({
  cwd: root,
  overrideConfig: [
    { ...tseslint.configs.disableTypeChecked, files: ['**/*.ts'] },
    { files: ['**/*.ts'], languageOptions: { parserOptions: { projectService: false } }, rules: { '@typescript-eslint/switch-exhaustiveness-check': 'off' } },
  ] as never,
});

async function rulesBroken(path: string, code: string): Promise<string[]> {
  const [result] = await eslint.lintText(code, { filePath: join(root, path) });
  return result!.messages.map(({ ruleId, message }) => ruleId ?? message).filter((rule) => rule !== '@typescript-eslint/no-unused-vars');
}

/** Code that must be reported in one file, and a file where the same code is right. */
const CASES: { rule: string; code: string; refused: string[]; allowed: string[] }[] = [
  {
    rule: 'project/layers',
    code: "import { parse } from '../substances/parse.js';\nparse();",
    refused: ['src/equilibrium/virtual.ts', 'src/quantities/virtual.ts'],
    allowed: ['src/prediction/virtual.ts'],
  },
  {
    rule: 'project/layers',
    code: "export { predict } from '../prediction/predict.js';",
    refused: ['src/equilibrium/virtual.ts', 'src/substances/virtual.ts', 'src/quantities/virtual.ts'],
    allowed: ['src/elements/virtual.ts', 'src/embed/virtual.ts'],
  },
  {
    rule: 'project/layers',
    code: "export * from '../elements/solute-card.js';",
    refused: ['src/prediction/virtual.ts', 'src/equilibrium/virtual.ts'],
    allowed: ['src/embed/virtual.ts'],
  },
  {
    rule: 'project/layers',
    code: "export * from './elements/solute-card.js';",
    refused: ['src/engine.ts'],
    allowed: ['src/index.ts', 'src/define.ts'],
  },
  {
    rule: 'project/layers',
    code: "import water from '../../data/water.json';\nexport { water };",
    refused: ['src/elements/virtual.ts', 'src/embed/virtual.ts'],
    allowed: ['src/equilibrium/virtual.ts', 'src/prediction/deeper.ts'],
  },
  {
    rule: 'project/layers',
    code: "export { html } from 'lit';",
    refused: ['src/engine.ts', 'src/prediction/virtual.ts', 'src/equilibrium/virtual.ts', 'src/substances/virtual.ts', 'src/quantities/virtual.ts'],
    allowed: ['src/elements/virtual.ts'],
  },
  {
    rule: 'project/layers',
    code: "export const context = import('@lit/context');",
    refused: ['src/engine.ts', 'src/prediction/virtual.ts'],
    allowed: ['src/elements/virtual.ts'],
  },
  {
    rule: 'project/layers',
    code: "export { styleMap } from 'lit/directives/style-map.js';",
    refused: ['src/elements/virtual.ts'],
    allowed: [],
  },
  ...['document', 'window', 'HTMLElement', 'customElements', 'navigator', 'localStorage'].map((name) => ({
    rule: 'no-restricted-globals',
    code: `export const found = ${name};`,
    refused: ['src/engine.ts', 'src/index.ts', 'src/prediction/virtual.ts', 'src/equilibrium/virtual.ts', 'src/substances/virtual.ts', 'src/quantities/virtual.ts'],
    allowed: ['src/elements/virtual.ts', 'src/embed/virtual.ts', 'src/define.ts'],
  })),
  {
    rule: 'no-restricted-globals',
    code: "export const answer = fetch('x');",
    refused: ['src/engine.ts', 'src/elements/virtual.ts', 'src/embed/virtual.ts', 'src/define.ts'],
    allowed: ['test/virtual.ts'],
  },
  ...['Date.now()', 'new Date()', "new Intl.NumberFormat('en')"].map((expression) => ({
    rule: 'no-restricted-globals',
    code: `export const value = ${expression};`,
    refused: ['src/engine.ts', 'src/prediction/virtual.ts', 'src/equilibrium/virtual.ts', 'src/substances/virtual.ts', 'src/quantities/virtual.ts'],
    allowed: ['src/elements/virtual.ts'],
  })),
  ...['Math.random()', "'a'.localeCompare('b')"].map((expression) => ({
    rule: 'no-restricted-properties',
    code: `export const value = ${expression};`,
    refused: ['src/engine.ts', 'src/prediction/virtual.ts', 'src/quantities/reproducible-math.ts'],
    allowed: ['src/elements/virtual.ts'],
  })),
  ...['Math.exp(1)', 'Math.log(2)', 'Math.log10(2)', 'Math.pow(2, 3)', 'Math.sinh(1)'].map((expression) => ({
    rule: 'no-restricted-properties',
    code: `export const value = ${expression};`,
    refused: ['src/equilibrium/virtual.ts', 'src/prediction/virtual.ts', 'src/quantities/virtual.ts', 'src/substances/virtual.ts', 'src/engine.ts'],
    allowed: ['src/quantities/reproducible-math.ts', 'test/virtual.ts'],
  })),
  {
    rule: 'no-restricted-properties',
    code: 'export const { exp } = Math;',
    refused: ['src/equilibrium/virtual.ts'],
    allowed: ['test/virtual.ts'],
  },
  {
    rule: 'no-restricted-syntax',
    code: 'export const square = (x: number) => x ** 2;',
    refused: ['src/equilibrium/virtual.ts', 'src/prediction/virtual.ts', 'src/quantities/virtual.ts'],
    allowed: ['src/quantities/reproducible-math.ts', 'test/virtual.ts'],
  },
  {
    rule: 'no-restricted-syntax',
    code: "import { html } from 'lit';\nexport const bar = (style: string) => html`<p style=${style}></p>`;",
    refused: ['src/elements/virtual.ts', 'src/embed/virtual.ts'],
    allowed: [],
  },
  {
    rule: 'no-restricted-properties',
    code: "export const fill = (element: Element) => { element.innerHTML = '<b>x</b>'; };",
    refused: ['src/elements/virtual.ts', 'src/embed/virtual.ts'],
    allowed: ['test/virtual.ts'],
  },
  {
    rule: 'no-restricted-syntax',
    code: 'expect(element).to.be.accessible();',
    refused: ['test/virtual.browser.ts'],
    allowed: ['test/virtual.test.ts'],
  },
  {
    rule: 'max-lines',
    code: `export const lines = 1;\n${'// more\n'.repeat(400)}`,
    refused: ['src/prediction/virtual.ts'],
    allowed: ['test/virtual.ts'],
  },
];

describe('the rules of the linter', () => {
  for (const { rule, code, refused, allowed } of CASES) {
    const shown = code.split('\n').find((line) => !line.startsWith('import { html }'))!;
    it(`${rule} refuses ${shown}`, async () => {
      for (const path of refused) assert.ok((await rulesBroken(path, code)).includes(rule), `not reported in ${path}`);
      for (const path of allowed) assert.deepEqual(await rulesBroken(path, code), [], `reported in ${path}`);
    });
  }
});
