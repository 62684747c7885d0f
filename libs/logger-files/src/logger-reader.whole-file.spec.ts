import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { createLoggerReader } from './logger-reader.js';
import { wholeSummary } from './whole-file.fixture.js';

type Cell = number | 'OL' | '';
interface Row {
  readonly seconds: number;
  readonly cells: readonly [Cell, Cell];
}
const FIRST = Date.UTC(2026, 2, 9, 21, 30) / 1000;
const LIMIT_C = 345;

const cell: fc.Arbitrary<Cell> = fc.oneof({ weight: 8, arbitrary: fc.integer({ min: 3000, max: 4000 }).map((n) => n / 10) }, fc.constantFrom<Cell>('OL', ''));
const rows: fc.Arbitrary<Row[]> = fc
  .array(fc.record({ step: fc.oneof({ weight: 9, arbitrary: fc.integer({ min: 30, max: 90 }) }, fc.constantFrom(0, 400, 3000)), cells: fc.tuple(cell, cell) }), { minLength: 1, maxLength: 55 })
  .map((steps) => {
    let seconds = 0;
    return [{ seconds, cells: [300.5, 320.5] as const }, ...steps.map(({ step, cells }) => ({ seconds: (seconds += step), cells }))];
  });
const form = fc.record({
  separator: fc.constantFrom(';', '\t', ','),
  mark: fc.constantFrom('.', ','),
  time: fc.constantFrom('iso', 'dotted', 'elapsed'),
  unit: fc.constantFrom('°C', '°F'),
  end: fc.constantFrom('\n', '\r\n', '\r'),
  order: fc.constantFrom('as it was', 'backwards', 'shuffled'),
  chunk: fc.integer({ min: 1, max: 400 }),
});
type Form = typeof form extends fc.Arbitrary<infer T> ? T : never;

function timeCell(seconds: number, kind: Form['time']): string {
  if (kind === 'elapsed') return String(seconds);
  const [date, clock] = new Date((FIRST + seconds) * 1000).toISOString().slice(0, 19).split('T') as [string, string];
  return kind === 'iso' ? `${date}T${clock}` : `${date.split('-').reverse().join('.')} ${clock}`;
}
const written = (c: Cell, f: Form) => (typeof c === 'string' ? c : (f.unit === '°F' ? c * 1.8 + 32 : c).toFixed(2).replace('.', f.mark));

/** What the file says, after it was rounded for writing. */
const meant = (c: Cell, f: Form) => (typeof c === 'string' ? null : f.unit === '°F' ? (Number((c * 1.8 + 32).toFixed(2)) - 32) / 1.8 : c);

function fileOf(all: readonly Row[], f: Form): string {
  const quote = (text: string) => (f.separator === ',' && f.mark === ',' ? `"${text}"` : text);
  const line = (cells: readonly string[]) => cells.map(quote).join(f.separator);
  const heading = line([f.time === 'elapsed' ? 'Time (s)' : 'Time', `Core (${f.unit})`, `Oven (${f.unit})`]);
  return [heading, ...all.map((r) => line([timeCell(r.seconds, f.time), ...r.cells.map((c) => written(c, f))])), ''].join(f.end);
}

describe('The stream and the whole file', () => {
  it('agree on peak, times, gaps and rates, whatever separator, mark, time, unit and order', () => {
    fc.assert(
      fc.property(rows, form, fc.infiniteStream(fc.nat(1000)), (inOrder, f, keys) => {
        const all = f.order === 'backwards' ? [...inOrder].reverse() : [...inOrder];
        if (f.order === 'shuffled') {
          const by = new Map(all.map((r) => [r, keys.next().value as number]));
          all.sort((a, b) => by.get(a)! - by.get(b)!);
        }
        const text = fileOf(all, f);
        const reader = createLoggerReader({ limitsC: [LIMIT_C] });
        for (let at = 0; at < text.length; at += f.chunk) reader.write(text.slice(at, at + f.chunk));
        const found = reader.end();
        if (found.outcome !== 'read') throw new Error(found.message);
        expect(found.rows).toBe(all.length);
        found.channels.forEach((channel, i) => {
          if (channel.outcome !== 'read') throw new Error(channel.message);
          const celsius = all.map((r) => meant(r.cells[i]!, f));
          const pacing = all.filter((r) => r.cells.some((c) => typeof c === 'number')).map((r) => r.seconds);
          const shift = f.time === 'elapsed' ? 0 : FIRST;
          const whole = wholeSummary({ times: all.map((r) => r.seconds + shift), celsius, pacing: pacing.map((t) => t + shift) }, LIMIT_C);
          expect(channel.samples).toBe(celsius.filter((c) => c !== null).length);
          expect(channel.emptyCells).toBe(all.filter((r) => r.cells[i] === '').length);
          expect(channel.peakC).toBeCloseTo(whole.peakC, 9);
          // the whole file is counted in thousandths of each step
          expect(Math.abs(channel.minutesAbove[0]!.minutes * 60 - whole.above)).toBeLessThanOrEqual(inOrder.at(-1)!.seconds / 1000 + 1e-6);
          expect(channel.minutesAbove[0]!.unknownMinutes * 60).toBeCloseTo(whole.unknown, 6);
          expect(channel.gapMinutes * 60).toBeCloseTo(whole.gaps, 6);
          expect(channel.rampKPerH === null).toBe(whole.rates === null);
          if (whole.rates) {
            expect(channel.rampKPerH).toBeCloseTo(whole.rates.heating, 6);
            expect(channel.coolKPerH).toBeCloseTo(whole.rates.cooling, 6);
          }
        });
      }),
      { numRuns: 300 },
    );
  });
});
