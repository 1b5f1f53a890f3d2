/**
 * Renews the digest in data/release.json: SHA-256 over the RFC 8785 form of every table that predictions rest on.
 *
 *   node test/tools/data-release.mjs           writes it
 *   node test/tools/data-release.mjs --check   exits 1 when it is not up to date
 */
import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import canonicalize from 'canonicalize';

const folder = new URL('../../data/', import.meta.url);
const NOT_TABLES = new Set(['release.json', 'record.schema.json']);

/** Digest of the tables as they stand, hexadecimal. */
export function dataDigest() {
  const names = readdirSync(folder).filter((name) => name.endsWith('.json') && !NOT_TABLES.has(name)).sort();
  const tables = Object.fromEntries(names.map((name) => [name, JSON.parse(readFileSync(new URL(name, folder), 'utf8'))]));
  return createHash('sha256').update(canonicalize(tables)).digest('hex');
}

/**
 * The release as it is recorded.
 * @returns {{ engine: string, data: string, digest: string }}
 */
export const recordedRelease = () => JSON.parse(readFileSync(new URL('release.json', folder), 'utf8'));

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const release = recordedRelease();
  const digest = dataDigest();
  if (!process.argv.includes('--check')) writeFileSync(new URL('release.json', folder), `${JSON.stringify({ ...release, digest }, null, 2)}\n`);
  else if (release.digest !== digest) {
    console.error('data/release.json does not hold the digest of the tables: run node test/tools/data-release.mjs, and raise the data version');
    process.exit(1);
  }
}
