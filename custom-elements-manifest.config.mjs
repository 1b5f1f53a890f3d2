const shipped = (path) => path.replace(/^src\//, 'dist/lib/').replace(/\.ts$/, '.js');

/** Points every module of the manifest at the file that the package ships instead of its source. */
const shippedPaths = () => ({
  name: 'shipped-paths',
  packageLinkPhase({ customElementsManifest }) {
    const visit = (node) => {
      if (Array.isArray(node)) node.forEach(visit);
      else if (node !== null && typeof node === 'object') {
        for (const [key, value] of Object.entries(node)) {
          if ((key === 'path' || key === 'module') && typeof value === 'string') node[key] = shipped(value);
          else visit(value);
        }
      }
    };
    visit(customElementsManifest.modules);
  },
});

export default {
  globs: ['src/elements/**/*.ts', 'src/embed/**/*.ts', 'src/index.ts', 'src/define.ts'],
  outdir: 'dist',
  litelement: true,
  packagejson: false,
  plugins: [shippedPaths()],
};
