import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { esbuildPlugin } from '@web/dev-server-esbuild';
import { defaultReporter } from '@web/test-runner';
import { chromeLauncher } from '@web/test-runner-chrome';
import { browserCounts } from './test/tools/count-reporters.mjs';
import { dataModule } from './test/tools/data-modules.mjs';
import { findChromium, findFirefox, findWebKitDriver } from './test/tools/ensure-browser.mjs';
import { webkitLauncher } from './test/tools/webkit-launcher.mjs';

const root = import.meta.dirname;
const named = (launcher, name) => Object.assign(launcher, { name });

const launchers = {
  chromium: () => named(chromeLauncher({
    launchOptions: {
      executablePath: findChromium(),
      args: [
        ...(process.getuid?.() === 0 ? ['--no-sandbox'] : []),
        '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync',
      ],
    },
  }), 'Chromium'),
  // puppeteer-core speaks WebDriver BiDi to a stock Firefox; background tabs are throttled, so one at a time.
  firefox: () => named(chromeLauncher({ concurrency: 1, launchOptions: { browser: 'firefox', executablePath: findFirefox() } }), 'Firefox'),
  webkit: webkitLauncher,
};

const present = ['chromium', ...(findFirefox() ? ['firefox'] : []), ...(findWebKitDriver() ? ['webkit'] : [])];
const wanted = process.env.BROWSERS?.split(',') ?? present;
const unknown = wanted.filter((name) => !(name in launchers));
if (unknown.length > 0) throw new Error(`BROWSERS names ${unknown.join(', ')}; known are ${Object.keys(launchers).join(', ')}`);

/** Serves the data files as the modules that the build makes of them. */
const data = {
  name: 'data-modules',
  async serve({ path }) {
    if (!/^\/data\/[\w.-]+\.json$/.test(path)) return undefined;
    return { body: dataModule(await readFile(join(root, path), 'utf8')), type: 'js' };
  },
};

export default {
  rootDir: root,
  files: 'test/**/*.browser.ts',
  nodeResolve: { exportConditions: ['development'] },
  plugins: [data, esbuildPlugin({ ts: true, tsconfig: join(root, 'tsconfig.json'), target: 'es2022' })],
  testFramework: { config: { timeout: 10000 } },
  browsers: wanted.map((name) => launchers[name]()),
  reporters: [defaultReporter(), browserCounts()],
  coverageConfig: {
    include: ['src/elements/**/*.ts', 'src/embed/**/*.ts'],
    reporters: ['text-summary', 'lcovonly'],
    threshold: { statements: 90, branches: 70, functions: 90, lines: 90 },
  },
};
