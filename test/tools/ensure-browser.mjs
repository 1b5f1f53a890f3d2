// Prints the path of a Chromium to test with; installs one when it may; else says what to do and exits 1.
import { spawnSync } from 'node:child_process';
import { accessSync, constants, existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { pathToFileURL } from 'node:url';

const runs = (path) => {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
};

/** The path of a program by its name, looked up as a shell does. */
export const onPath = (name) =>
  (process.env.PATH ?? '').split(delimiter).map((folder) => join(folder, name)).find(runs);

const NAMES = [
  'chromium-headless-shell', 'chromium', 'chromium-browser', 'google-chrome-stable', 'google-chrome', 'chrome', 'msedge',
];
const FIXED = [
  '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
  '/Applications/Chromium.app/Contents/MacOS/Chromium',
  ...[process.env.PROGRAMFILES, process.env['PROGRAMFILES(X86)'], process.env.LOCALAPPDATA].filter(Boolean)
    .map((folder) => join(folder, 'Google', 'Chrome', 'Application', 'chrome.exe')),
];

export function findChromium() {
  const given = process.env.CHROME_PATH;
  if (given) {
    if (!runs(given)) throw new Error(`CHROME_PATH is set to ${given}, which is no executable file`);
    return given;
  }
  return NAMES.map(onPath).find(Boolean) ?? FIXED.find(runs);
}

export function findFirefox() {
  return process.env.FIREFOX_PATH ?? onPath('firefox-esr') ?? onPath('firefox');
}

export function findWebKitDriver() {
  return process.env.DISPLAY || onPath('Xvfb') ? onPath('WebKitWebDriver') : undefined;
}

export function ensureChromium() {
  const found = findChromium();
  if (found) return found;
  const root = process.getuid?.() === 0;
  const mayInstall = root && existsSync('/etc/debian_version') && onPath('apt-get') && process.env.NO_BROWSER_INSTALL !== '1';
  if (mayInstall) {
    const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
    for (const args of [['update', '-q'], ['install', '-y', '-q', '--no-install-recommends', 'chromium']]) {
      const { status } = spawnSync('apt-get', args, { env, stdio: ['ignore', 2, 2] });
      if (status !== 0) break;
    }
    const installed = findChromium();
    if (installed) return installed;
  }
  throw new Error([
    'No Chrome or Chromium found for the browser tests.',
    '  Set CHROME_PATH to one, or install it:',
    '    Debian/Ubuntu   sudo apt-get install chromium',
    '    macOS           brew install --cask google-chrome',
    '    Windows         winget install Google.Chrome',
    mayInstall ? '  (apt-get was tried and failed; its output is above.)' : root ? '' : '  (As root on Debian this script runs apt-get itself.)',
  ].filter(Boolean).join('\n'));
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  try {
    console.log(ensureChromium());
  } catch (error) {
    console.error(error.message);
    process.exit(1);
  }
}
