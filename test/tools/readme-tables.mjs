/**
 * Writes the reference tables of README.md from the custom elements manifest, between the two reference marks.
 *
 *   node test/tools/readme-tables.mjs           writes README.md
 *   node test/tools/readme-tables.mjs --check   exits 1 when README.md is not up to date
 */
import { readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';

const START = '<!-- reference:start -->';
const END = '<!-- reference:end -->';
const file = (name) => fileURLToPath(new URL(`../../${name}`, import.meta.url));

const cell = (text) => String(text ?? '').replace(/\|/g, '\\|').replace(/\s+/g, ' ').trim();
const code = (text) => (text ? `\`${cell(text)}\`` : '');
const table = (head, rows) =>
  rows.length === 0 ? '' : `| ${head.join(' | ')} |\n| ${head.map(() => '---').join(' | ')} |\n${rows.map((row) => `| ${row.join(' | ')} |`).join('\n')}\n`;

/**
 * The tables of every custom element in a manifest, as Markdown.
 * @param {any} manifest
 * @returns {string}
 */
export function referenceTables(manifest) {
  const elements = manifest.modules
    .flatMap((module) => module.declarations ?? [])
    .filter((declaration) => declaration.customElement && declaration.tagName)
    .sort((a, b) => (a.tagName < b.tagName ? -1 : 1));
  return elements
    .map((element) => {
      const sections = [
        ['Attributes', table(['attribute', 'type', 'meaning'], (element.attributes ?? []).map(({ name, type, description }) => [code(name), code(type?.text), cell(description)]))],
        ['Events', table(['event', 'class', 'when'], (element.events ?? []).map(({ name, type, description }) => [code(name), code(type?.text), cell(description)]))],
        ['Slots', table(['slot', 'content'], (element.slots ?? []).map(({ name, description }) => [name ? code(name) : '(default)', cell(description)]))],
        ['Parts', table(['part', 'what it is'], (element.cssParts ?? []).map(({ name, description }) => [code(name), cell(description)]))],
        ['Custom properties', table(['property', 'what it sets'], (element.cssProperties ?? []).map(({ name, description }) => [code(name), cell(description)]))],
        ['States', table(['state', 'when'], (element.cssStates ?? []).map(({ name, description }) => [code(`:state(${name})`), cell(description)]))],
      ];
      const body = sections.filter(([, text]) => text !== '').map(([title, text]) => `**${title}**\n\n${text}`).join('\n');
      return `### \`<${element.tagName}>\`\n\n${cell(element.description)}\n\n${body}`;
    })
    .join('\n');
}

/**
 * README text with the tables replaced.
 * @param {string} readme
 * @param {string} tables
 * @returns {string}
 */
export function withTables(readme, tables) {
  const start = readme.indexOf(START);
  const end = readme.indexOf(END);
  if (start < 0 || end < start) throw new Error('README.md has lost its reference marks');
  return `${readme.slice(0, start + START.length)}\n\n${tables}\n${readme.slice(end)}`;
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const manifest = JSON.parse(readFileSync(file('dist/custom-elements.json'), 'utf8'));
  const readme = readFileSync(file('README.md'), 'utf8');
  const next = withTables(readme, referenceTables(manifest));
  if (!process.argv.includes('--check')) writeFileSync(file('README.md'), next);
  else if (next !== readme) {
    console.error('The tables of README.md are not those of the manifest: run npm run build && npm run readme');
    process.exit(1);
  }
}
