// Prints the sizes of the bundles in dist/ in the form of test/package/sizes.json.
import { bundleSizes } from './bundle-sizes.mjs';

console.log(JSON.stringify(bundleSizes(), null, 2));
