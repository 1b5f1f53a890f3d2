import resolve from '@rollup/plugin-node-resolve';
import terser from '@rollup/plugin-terser';
import { readFileSync } from 'node:fs';
import esbuild from 'rollup-plugin-esbuild';
import { dataModules } from './test/tools/data-modules.mjs';

const { dependencies } = JSON.parse(readFileSync(new URL('package.json', import.meta.url), 'utf8'));
const external = Object.keys(dependencies).map((name) => new RegExp(`^${name.replace('.', '\\.')}(/|$)`));

const source = () => [dataModules(), resolve(), esbuild({ target: 'es2022', tsconfig: 'tsconfig.json' })];
const minified = () =>
  terser({ ecma: 2022, module: true, compress: { passes: 2, unsafe_arrows: true }, format: { comments: false } });

/**
 * Gives the self-contained file's copy of Lit a Trusted Types policy of its own, so that it can stand beside another
 * copy under a policy list without 'allow-duplicates', and keeps Lit's version marks out of the page's global scope.
 */
function ownCopyOfLit() {
  const replaceExactly = (context, code, pattern, replacement, times) => {
    const found = code.match(pattern)?.length ?? 0;
    if (found !== times) context.error(`${String(pattern)} occurs ${found} times in the bundle, expected ${times}`);
    return code.replace(pattern, replacement);
  };
  return {
    name: 'own-copy-of-lit',
    renderChunk(code) {
      let own = replaceExactly(this, code, /createPolicy\((["'])lit-html\1/g, 'createPolicy("solute-card"', 1);
      own = replaceExactly(
        this, own, /\([\w$]+\.(?:litHtml|litElement|reactiveElement)Versions\s*\?\?=\s*\[\]\)\.push\((["'])[\d.]+\1\)/g, '0', 3,
      );
      return { code: own, map: null };
    },
  };
}

/** Stops the build when a module that must run without a DOM has reached Lit. */
function withoutLit() {
  return {
    name: 'without-lit',
    buildEnd() {
      const lit = [...this.getModuleIds()].filter((id) => /node_modules\/(lit|lit-html|lit-element|@lit)\//.test(id));
      if (lit.length > 0) this.error(`the engine imports Lit: ${lit.join(', ')}`);
    },
  };
}

const oneFile = (file) => ({ file, format: 'es', sourcemap: true, inlineDynamicImports: true });

export default [
  {
    input: ['src/index.ts', 'src/define.ts', 'src/engine.ts'],
    external,
    output: { dir: 'dist/lib', format: 'es', preserveModules: true, preserveModulesRoot: 'src', entryFileNames: ({ name }) => `${name.replace(/\.json$/, '')}.js` },
    plugins: source(),
  },
  {
    input: 'src/define.ts',
    output: oneFile('dist/solute-card.min.js'),
    plugins: [...source(), ownCopyOfLit(), minified()],
  },
  {
    input: 'src/engine.ts',
    output: oneFile('dist/engine.min.js'),
    plugins: [...source(), withoutLit(), minified()],
  },
];
