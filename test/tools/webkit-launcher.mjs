// A launcher for WebKitGTK: Xvfb, WebKitWebDriver and MiniBrowser over plain WebDriver requests.
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync } from 'node:fs';
import net from 'node:net';

const ARCHITECTURE = process.arch === 'arm64' ? 'aarch64' : 'x86_64';
const MINI_BROWSERS = ['4.1', '4.0', '6.0'].map((version) => `/usr/lib/${ARCHITECTURE}-linux-gnu/webkit2gtk-${version}/MiniBrowser`);
const BUTTONS = ['left', 'middle', 'right'];
const KEYS = {
  Backspace: '\uE003', Tab: '\uE004', Enter: '\uE007', Shift: '\uE008', Control: '\uE009', Alt: '\uE00A', Escape: '\uE00C',
  ' ': ' ', Space: ' ', PageUp: '\uE00E', PageDown: '\uE00F', End: '\uE010', Home: '\uE011', ArrowLeft: '\uE012',
  ArrowUp: '\uE013', ArrowRight: '\uE014', ArrowDown: '\uE015', Delete: '\uE017',
};
const START_ATTEMPTS = 100;

async function freePort() {
  const server = net.createServer().listen(0, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address();
  await new Promise((done) => server.close(done));
  return port;
}

class WebKitLauncher {
  name = 'WebKitGTK';
  type = 'webdriver';
  concurrency = 1;
  #base = '';
  #urls = new Map();
  #children = [];
  #ready;

  async initialize() {
    process.once('exit', this.#kill);
  }

  #kill = () => {
    for (const child of this.#children.splice(0)) child.kill();
  };

  async #request(method, path, body) {
    const response = await fetch(this.#base + path, { method, body: body && JSON.stringify(body) });
    const { value } = await response.json();
    if (!response.ok) throw new Error(`WebDriver ${method} ${path}: ${value?.error} ${value?.message}`);
    return value;
  }

  async #display() {
    if (process.env.DISPLAY) return process.env.DISPLAY;
    const server = spawn('Xvfb', ['-displayfd', '3', '-screen', '0', '1280x900x24', '-nolisten', 'tcp'], {
      stdio: ['ignore', 'ignore', 'ignore', 'pipe'],
    });
    this.#children.push(server);
    const [number] = await once(server.stdio[3], 'data');
    return `:${String(number).trim()}`;
  }

  async #start() {
    const env = { ...process.env, DISPLAY: await this.#display(), GDK_BACKEND: 'x11' };
    const port = await freePort();
    this.#children.push(spawn('WebKitWebDriver', [`--port=${port}`], { stdio: 'ignore', env }));
    this.#base = `http://127.0.0.1:${port}`;
    for (let attempt = 0; ; attempt++) {
      try {
        await fetch(`${this.#base}/status`);
        break;
      } catch (error) {
        if (attempt > START_ATTEMPTS) throw error;
        await new Promise((done) => setTimeout(done, 50));
      }
    }
    const binary = process.env.MINIBROWSER_PATH ?? MINI_BROWSERS.find(existsSync);
    const { sessionId } = await this.#request('POST', '/session', {
      capabilities: { alwaysMatch: { 'webkitgtk:browserOptions': { binary, args: ['--automation'] } } },
    });
    this.#base += `/session/${sessionId}`;
  }

  async startSession(id, url) {
    await (this.#ready ??= this.#start());
    this.#urls.set(id, url);
    await this.#request('POST', '/url', { url });
  }

  isActive(id) {
    return this.#urls.has(id);
  }

  getBrowserUrl(id) {
    return this.#urls.get(id);
  }

  async stopSession(id) {
    await this.#request('POST', '/url', { url: 'about:blank' });
    this.#urls.delete(id);
    return {};
  }

  async stop() {
    try {
      if (this.#ready) {
        await this.#ready;
        await this.#request('DELETE', '');
      }
    } finally {
      this.#kill();
    }
  }

  // From here on: what @web/test-runner-commands calls for launchers of type 'webdriver'.

  async #pointer(...actions) {
    await this.#request('POST', '/actions', {
      actions: [{ type: 'pointer', id: 'mouse', parameters: { pointerType: 'mouse' }, actions }],
    });
  }

  sendMouseMove(_id, x, y) {
    return this.#pointer({ type: 'pointerMove', duration: 0, x, y });
  }

  sendMouseClick(_id, x, y, name = 'left') {
    const button = BUTTONS.indexOf(name);
    return this.#pointer({ type: 'pointerMove', duration: 0, x, y }, { type: 'pointerDown', button }, { type: 'pointerUp', button });
  }

  sendMouseDown(_id, name = 'left') {
    return this.#pointer({ type: 'pointerDown', button: BUTTONS.indexOf(name) });
  }

  sendMouseUp(_id, name = 'left') {
    return this.#pointer({ type: 'pointerUp', button: BUTTONS.indexOf(name) });
  }

  async resetMouse() {
    await this.#request('DELETE', '/actions');
    await this.sendMouseMove('', 0, 0);
  }

  async sendKeys(_id, keys) {
    const actions = keys.map((key) => KEYS[key] ?? key).flatMap((value) => [{ type: 'keyDown', value }, { type: 'keyUp', value }]);
    await this.#request('POST', '/actions', { actions: [{ type: 'key', id: 'keyboard', actions }] });
  }
}

export const webkitLauncher = () => new WebKitLauncher();
