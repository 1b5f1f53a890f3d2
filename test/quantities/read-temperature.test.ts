import assert from 'node:assert/strict';
import { describe, it } from 'node:test';
import { readTemperature } from '../../src/quantities/read-temperature.js';
import { SoluteError } from '../../src/quantities/solute-error.js';

describe('temperature', () => {
  it('is read in degrees Celsius, kelvin and degrees Fahrenheit', () => {
    // 0 °C is 273.15 K by definition (The International System of Units, 9th ed. 2019); 212 °F is 100 °C.
    for (const [typed, celsius] of [
      [25, 25], ['25', 25], [' 37 °C ', 37], ['37°C', 37], ['37 ℃', 37], ['37 C', 37], ['37 Cel', 37], ['20,5', 20.5], ['310.15 K', 37], ['273.15K', 0], ['298.15 K', 25], ['77 °F', 25], ['98.6 [degF]', 37], ['212 °F', 100], ['+5', 5], [0, 0], [100, 100], ['\u00a025\u00a0°C', 25],
    ] as const) assert.equal(readTemperature(typed), celsius, String(typed));
  });

  function problemOf(typed: number | string): SoluteError {
    try {
      readTemperature(typed);
    } catch (error) {
      assert.ok(error instanceof SoluteError);
      return error;
    }
    throw new assert.AssertionError({ message: `${typed} was read` });
  }

  it('outside liquid water is refused with the nearest valid one', () => {
    for (const [typed, nearest] of [[-1, '0 °C'], ['−5 °C', '0 °C'], ['200', '100 °C'], ['20 K', '0 °C'], ['451 °F', '100 °C'], [100.01, '100 °C']] as const) {
      const { code, suggestions } = problemOf(typed);
      assert.equal(code, 'temperature-out-of-range', String(typed));
      assert.equal(suggestions[0]!.value, nearest);
    }
  });

  it('that is none is refused', () => {
    for (const typed of ['', 'warm', '25 °X', '1e2', '25 °C 30', NaN, Infinity, '25..', '<b>25</b>']) assert.equal(problemOf(typed).code, 'temperature-unreadable', String(typed));
  });
});
