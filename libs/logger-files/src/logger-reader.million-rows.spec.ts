import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import { describe, expect, it } from 'vitest';
import { createLoggerReader } from './logger-reader.js';

setFlagsFromString('--expose-gc');
const collectGarbage = runInNewContext('gc') as () => void;

const ROWS = 1_000_000;
/** A triangle wave of period 20 000 s between 300 and 400 °C; row by row, with one spike. */
const tenths = (row: number) => (row === 654_321 ? 4467 : 3000 + Math.floor(Math.abs((row % 20_000) - 10_000) / 10));

describe('A file of a million rows', () => {
  it('is read without being held: peak, time above, rate and gap come out right in the room of a short file', { timeout: 120_000 }, () => {
    const reader = createLoggerReader({ limitsC: [345] });
    reader.write('Elapsed (s);Core (°C)\r\n');
    let piece = '';
    let heldAfterTenth = 0;
    for (let row = 0; row < ROWS; row += 1) {
      const t = tenths(row);
      piece += `${row < 500_000 ? row : row + 3600};${Math.floor(t / 10)},${t % 10}\r\n`;
      if (row % 1000 === 999) {
        reader.write(piece);
        piece = '';
      }
      if (row + 1 === ROWS / 10) {
        collectGarbage();
        heldAfterTenth = process.memoryUsage().heapUsed;
      }
    }
    collectGarbage();
    expect(process.memoryUsage().heapUsed - heldAfterTenth).toBeLessThan(4_000_000);
    const found = reader.end();
    if (found.outcome !== 'read' || found.channels[0]?.outcome !== 'read') throw new Error('The file was not read.');
    const core = found.channels[0];
    expect(found.rows).toBe(ROWS);
    expect(core).toMatchObject({ samples: ROWS, peakC: 446.7, gapCount: 1, gapMinutes: 3601 / 60, peakAt: { line: 654_323 } });
    // of each wave the part above 345.0 is 11 000 of 20 000 s, a little less by the steps of a tenth
    expect((core.minutesAbove[0]!.minutes * 60) / (50 * 11_000)).toBeCloseTo(1, 2);
    // the wave rises by 1/100 K a second: 36 K/h; the spike lifts one mean of 60 readings by a sixtieth of itself
    const spike = (446.7 - tenths(654_320) / 10) / 60;
    expect(core.rampKPerH).toBeGreaterThan(36 + (spike * 3600) / 660 - 1);
    expect(core.rampKPerH).toBeLessThan(36 + (spike * 3600) / 600 + 1);
    expect(core.curve.length).toBeLessThanOrEqual(2000);
    expect(core.curve.some((p) => p.celsius === 446.7)).toBe(true);
    expect(found.problemCounts).toEqual({});
  });
});
