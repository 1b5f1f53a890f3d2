import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { families, read, repeated } from './read.js';
import { gases } from './tables.js';

const cautions = read<{ toxicGases: { species: string }[] }>('cautions.json');
const neutral = new Set(families.flatMap(({ states }) => states).filter(({ charge }) => charge === 0).map(({ id }) => id));

describe('the gases', () => {
  it('are neutral states of an acid–base family, each once', () => {
    assert.deepEqual(gases.filter(({ species }) => !neutral.has(species)).map(({ id }) => id), []);
    assert.deepEqual(repeated(gases.map(({ id }) => id)), []);
    assert.deepEqual(repeated(gases.map(({ species }) => species)), []);
  });

  it('cover the toxic gases that dissolve as such', () => {
    const known = new Set(gases.map(({ species }) => species));
    assert.deepEqual(cautions.toxicGases.map(({ species }) => species).filter((species) => !known.has(species)), ['HClO']);
  });

  it('leave the solution when it is warmed', () => {
    for (const { id, temperatureDependence } of gases) assert.ok(temperatureDependence === undefined || temperatureDependence > 0, id);
  });
});
