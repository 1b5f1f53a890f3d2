import { posix } from 'node:path';

/** Every layer of src/ with the layers it may import; a layer may always import itself. */
const MAY_IMPORT = {
  data: [],
  quantities: ['data'],
  substances: ['quantities', 'data'],
  equilibrium: ['quantities', 'data'],
  prediction: ['equilibrium', 'substances', 'quantities', 'data'],
  engine: ['prediction', 'equilibrium', 'substances', 'quantities', 'data'],
  elements: ['engine', 'prediction', 'equilibrium', 'substances', 'quantities'],
  embed: ['elements', 'engine', 'prediction', 'equilibrium', 'substances', 'quantities'],
  index: ['embed', 'elements', 'engine', 'prediction', 'equilibrium', 'substances', 'quantities'],
  define: ['index', 'embed', 'elements', 'engine'],
};

/** Layers that must run without a DOM, with the packages they may use. */
export const ENGINE_LAYERS = ['quantities', 'substances', 'equilibrium', 'prediction', 'engine'];
const ENGINE_PACKAGES = /^(decimal\.js|canonicalize|@noble\/hashes\/.+)$/;
const ELEMENT_PACKAGES = /^(lit|lit\/.+|@lit\/context)$/;
/** Directives that write styles or markup, which a strict content security policy blocks or which trust foreign text. */
const REFUSED_DIRECTIVES = /^lit\/(directives\/(style-map|unsafe-html|unsafe-svg|unsafe-mathml)\.js|static-html\.js)$/;

/** The layer of a path relative to the project: a folder of src/, a file directly in it, or data. */
function layerOf(path) {
  if (path.startsWith('data/')) return 'data';
  return /^src\/([\w-]+)(?:\/|\.\w+$)/.exec(path)?.[1];
}

function problemOf(layer, file, specifier) {
  if (specifier.startsWith('.')) {
    const target = layerOf(posix.join(posix.dirname(file), specifier));
    if (target === layer || MAY_IMPORT[layer].includes(target)) return undefined;
    return `${layer} must not import ${target ?? specifier}: imports run one way`;
  }
  if (ENGINE_LAYERS.includes(layer)) {
    return ENGINE_PACKAGES.test(specifier) ? undefined : `${layer} must not import ${specifier}: the engine is free of the DOM and of Lit`;
  }
  if (REFUSED_DIRECTIVES.test(specifier)) return `${specifier} breaks under a strict content security policy or turns text into markup`;
  return ELEMENT_PACKAGES.test(specifier) ? undefined : `${layer} must not import ${specifier}`;
}

/** ESLint rule: imports run one way, and each layer uses only its own packages. */
export const layers = {
  meta: { type: 'problem', schema: [], messages: { layer: '{{problem}}' } },
  create(context) {
    const file = posix.normalize(posix.relative(context.cwd.replaceAll('\\', '/'), context.filename.replaceAll('\\', '/')));
    const layer = layerOf(file);
    if (!(layer in MAY_IMPORT)) return {};
    const check = ({ source }) => {
      if (source === null) return;
      const problem =
        source.type === 'Literal' ? problemOf(layer, file, String(source.value)) : 'what is imported must be a plain string';
      if (problem) context.report({ node: source, messageId: 'layer', data: { problem } });
    };
    return { ImportDeclaration: check, ExportNamedDeclaration: check, ExportAllDeclaration: check, ImportExpression: check };
  },
};
