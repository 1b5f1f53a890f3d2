import assert from 'node:assert/strict';
import { execFileSync, spawnSync } from 'node:child_process';
import { existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { after, before, describe, it } from 'node:test';
import { publint } from 'publint';
import ts from 'typescript';

const root = join(import.meta.dirname, '..', '..');
const TAGS = ['solute-card', 'solute-conditions'];
const SCRIPTS_WITHOUT_DOM = ['solute-card', 'solute-card/define', 'solute-card/engine', 'solute-card/engine.min.js'];
const CONSUMER = `
import { SoluteCard } from 'solute-card';
import 'solute-card/define';
import { createRecord, predict, SoluteError, verifyRecord, type Prediction } from 'solute-card/engine';
import { predict as predictAlone } from 'solute-card/engine.min.js';

const prediction: Prediction = predict('0.10 mol/L NH4Cl', { temperature: 25 });
const pH: number = prediction.pH;
const first: string | undefined = prediction.cautions[0]?.code;
const alone: Prediction = predictAlone('0.10 mol/L NH4Cl');
const card: SoluteCard = document.createElement('solute-card');
card.addEventListener('solute-prediction', (event) => { const { record } = event.detail; void record; });
card.addEventListener('solute-problem', (event) => { const [problem] = event.detail.problems; void problem?.code; });
// @ts-expect-error an amount is no number
predict(5);
export { alone, card, createRecord, first, pH, SoluteError, verifyRecord };
`;

interface Manifest {
  exports: Record<string, string | { types: string; default: string }>;
  dependencies: Record<string, string>;
}

/** A project that depends on the package as npm would install it, with the dependencies linked instead of fetched. */
function makeConsumer(): string {
  const folder = mkdtempSync(join(tmpdir(), 'solute-card-consumer-'));
  const packed = JSON.parse(execFileSync('npm', ['pack', '--json', '--ignore-scripts', '--pack-destination', folder], {
    cwd: root, encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'], shell: process.platform === 'win32',
  })) as { filename: string }[] | Record<string, { filename: string }>;
  const [tarball] = Object.values(packed);
  const target = join(folder, 'node_modules', 'solute-card');
  mkdirSync(target, { recursive: true });
  execFileSync('tar', ['-xzf', join(folder, tarball!.filename), '-C', target, '--strip-components=1']);
  const { dependencies } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8')) as Manifest;
  for (const name of Object.keys(dependencies)) {
    const link = join(folder, 'node_modules', name);
    mkdirSync(dirname(link), { recursive: true });
    symlinkSync(join(root, 'node_modules', name), link, 'junction');
  }
  writeFileSync(join(folder, 'package.json'), '{ "type": "module", "private": true }');
  return folder;
}

describe('the packed package', () => {
  let consumer = '';
  let installed = '';
  before(() => {
    assert.ok(existsSync(join(root, 'dist', 'engine.min.js')), 'dist/ is missing: run "npm run build" first');
    consumer = makeConsumer();
    installed = join(consumer, 'node_modules', 'solute-card');
  });
  after(() => { rmSync(consumer, { recursive: true, force: true }); });

  const files = () => readdirSync(installed, { recursive: true, encoding: 'utf8' }).map((name) => name.replaceAll('\\', '/'));

  /** Runs a module in plain Node inside the consumer; gives what it prints. */
  function node(code: string): string {
    const { status, stdout, stderr } = spawnSync(process.execPath, ['--input-type=module', '--eval', code], {
      cwd: consumer, encoding: 'utf8', env: { ...process.env, NODE_OPTIONS: '' },
    });
    assert.equal(status, 0, stderr);
    return stdout.trim();
  }

  it('holds what it needs and nothing else', () => {
    assert.deepEqual(readdirSync(installed).sort(), ['LICENSE', 'README.md', 'data', 'dist', 'package.json']);
    assert.deepEqual(readdirSync(join(installed, 'data')), ['record.schema.json']);
  });

  it('resolves every entry to a file that is there, with its types', () => {
    const { exports } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8')) as Manifest;
    for (const [specifier, target] of Object.entries(exports)) {
      for (const path of typeof target === 'string' ? [target] : Object.values(target)) {
        assert.ok(existsSync(join(installed, path)), `${specifier} leads to ${path}`);
      }
      const name = specifier.replace('.', 'solute-card');
      assert.ok(node(`console.log(import.meta.resolve(${JSON.stringify(name)}))`).startsWith('file:'), name);
    }
  });

  for (const specifier of SCRIPTS_WITHOUT_DOM) {
    it(`imports ${specifier} in plain Node`, () => {
      assert.notEqual(node(`console.log(Object.keys(await import('${specifier}')).length)`), '0');
    });
  }

  it('registers nothing on import of the classes, and every element on import of define', () => {
    const registered = `console.log(JSON.stringify(${JSON.stringify(TAGS)}.filter((tag) => globalThis.customElements?.get(tag))))`;
    assert.deepEqual(JSON.parse(node(`await import('solute-card'); ${registered}`)), []);
    assert.deepEqual(JSON.parse(node(`await import('solute-card/define'); ${registered}`)), TAGS);
  });

  it('predicts the same in both engine files', () => {
    const predict = (specifier: string) => node(
      `import { predict } from '${specifier}'; console.log(JSON.stringify(predict('0.10 mol/L NH4Cl; 20 mmol/L Na2HPO4')))`,
    );
    const prediction = predict('solute-card/engine');
    assert.equal(typeof (JSON.parse(prediction) as { pH: unknown }).pH, 'number');
    assert.equal(predict('solute-card/engine.min.js'), prediction);
  });

  it('leaves Lit out of the engine', () => {
    const engine = readFileSync(join(installed, 'dist', 'engine.min.js'), 'utf8');
    assert.ok(!/lit-html|lit-element|reactive-element|LitElement|customElements|createPolicy/.test(engine));
    const reached = new Set<string>();
    const visit = (path: string) => {
      if (reached.has(path)) return;
      reached.add(path);
      for (const [, specifier] of readFileSync(path, 'utf8').matchAll(/(?:from|import)\s*\(?\s*'([^']+)'/g)) {
        assert.doesNotMatch(specifier!, /^(lit|@lit)(\/|$)/, `${path} imports ${specifier}`);
        if (specifier!.startsWith('.')) visit(join(dirname(path), specifier!));
      }
    };
    visit(join(installed, 'dist', 'lib', 'engine.js'));
    assert.ok(reached.size > 1);
  });

  it('names its Trusted Types policy in the self-contained file, and leaves no mark of Lit on the page', () => {
    const bundle = readFileSync(join(installed, 'dist', 'solute-card.min.js'), 'utf8');
    assert.ok(/createPolicy\(["']solute-card["']/.test(bundle));
    assert.ok(!/createPolicy\(["']lit-html["']|(litHtml|litElement|reactiveElement)Versions/.test(bundle));
  });

  it('imports nothing in the single files', () => {
    for (const name of ['solute-card.min.js', 'engine.min.js']) {
      const { importedFiles } = ts.preProcessFile(readFileSync(join(installed, 'dist', name), 'utf8'), true, true);
      assert.deepEqual(importedFiles.map(({ fileName }) => fileName), [], name);
    }
  });

  it('ships no documentation of its constants', () => {
    const modules = files().filter((name) => /^dist\/lib\/data\/.*\.js$/.test(name));
    assert.ok(modules.length > 0);
    for (const file of modules) assert.ok(!/[{,]\s*"?(note|choice|check)"?:/.test(readFileSync(join(installed, file), 'utf8')), file);
  });

  it('has types that name no data file and no package but its dependencies', () => {
    const { dependencies } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8')) as Manifest;
    const types = files().filter((name) => name.endsWith('.d.ts'));
    assert.ok(types.length > 0);
    for (const file of types) {
      for (const [, specifier] of readFileSync(join(installed, file), 'utf8').matchAll(/(?:from|import)\s*\(?\s*['"]([^'"]+)['"]/g)) {
        const [scope, name] = specifier!.split('/');
        const known = specifier!.startsWith('.') ? !specifier!.endsWith('.json') : (scope!.startsWith('@') ? `${scope}/${name}` : scope!) in dependencies;
        assert.ok(known, `${file} names ${specifier}: declare the type of what is exported instead of leaving it to inference`);
      }
    }
  });

  it('lists its elements with the files that it ships', () => {
    const { modules } = JSON.parse(readFileSync(join(installed, 'dist', 'custom-elements.json'), 'utf8')) as {
      modules: { path: string; declarations?: { tagName?: string }[] }[];
    };
    for (const { path } of modules) assert.ok(existsSync(join(installed, path)), path);
    const tags = modules.flatMap(({ declarations }) => declarations ?? []).flatMap(({ tagName }) => tagName ?? []);
    assert.deepEqual([...new Set(tags)].sort(), TAGS);
  });

  it('satisfies the publication checks', async () => {
    const { messages } = await publint({ pkgDir: installed, pack: false, strict: true });
    assert.deepEqual(messages.map(({ code, path }) => `${code} at ${path.join('.')}`), []);
  });

  for (const [module, moduleResolution] of [['nodenext', 'nodenext'], ['esnext', 'bundler']]) {
    it(`compiles in a strict consumer under moduleResolution ${moduleResolution}`, () => {
      writeFileSync(join(consumer, 'consumer.ts'), CONSUMER);
      writeFileSync(join(consumer, 'tsconfig.json'), JSON.stringify({
        compilerOptions: {
          target: 'es2022', module, moduleResolution, lib: ['es2022', 'dom', 'dom.iterable'], types: [], noEmit: true,
          strict: true, exactOptionalPropertyTypes: true, noUncheckedIndexedAccess: true, skipLibCheck: false,
        },
        files: ['consumer.ts'],
      }));
      const { status, stdout } = spawnSync(process.execPath, [join(root, 'node_modules', 'typescript', 'bin', 'tsc')], {
        cwd: consumer, encoding: 'utf8',
      });
      assert.equal(status, 0, stdout);
    });
  }
});
