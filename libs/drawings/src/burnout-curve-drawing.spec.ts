import { createLoggerReader } from '@libs/logger-files';
import { describe, expect, it } from 'vitest';
import { burnoutCurveDrawing, type BurnoutChannel, type BurnoutCurveInput } from './burnout-curve-drawing.js';
import { faultsOf, outOfFrame, wordsOf } from './drawn-extent.fixture.js';
import { overlapping } from './overlapping-words.fixture.js';

const LIMIT = { celsius: 370, words: 'limit 370 °C, core plate unknown' };
const core: BurnoutChannel = {
  name: 'Core',
  peakC: 446,
  points: [{ minute: 0, celsius: 20 }, { minute: 300, celsius: 340 }, { minute: 330, celsius: 400 }, { minute: 420, celsius: 446 }, { minute: 540, celsius: 340 }, { minute: 700, celsius: 120 }],
  gaps: [],
  aboveLimit: { minutes: 191, unknownMinutes: 0 },
};
const air: BurnoutChannel = { name: 'Chamber air', peakC: 380, points: [{ minute: 0, celsius: 25 }, { minute: 400, celsius: 380 }, { minute: 700, celsius: 90 }], gaps: [], aboveLimit: { minutes: 20, unknownMinutes: 0 } };
const drawn = (over: Partial<BurnoutCurveInput> = {}) => burnoutCurveDrawing({ channels: [air, core], limit: LIMIT, ...over });
const hatches = (drawing: ReturnType<typeof drawn>) => drawing.shapes.flatMap((s) => (s.kind === 'hatch' ? [s] : []));
const curves = (drawing: ReturnType<typeof drawn>) => drawing.shapes.flatMap((s) => (s.kind === 'path' && s.cap === 'round' ? [s] : []));
const perMinute = (drawing: ReturnType<typeof drawn>) => (drawing.width - 8 - 34) / 700;

describe('burnoutCurveDrawing', () => {
  it('draws the hottest channel strong, over the others', () => {
    expect(curves(drawn()).map((s) => s.stroke)).toEqual(['steel', 'copper']);
    expect(wordsOf(drawn())).toContain('446 °C');
    expect(drawn().description).toBe('Core, the hottest of 2: peak 446 °C; limit 370 °C, core plate unknown. 191 min above the limit, hatched.');
  });
  it('hatches the time above the limit, from crossing to crossing', () => {
    const [zone, ...more] = hatches(drawn());
    expect(more).toEqual([]);
    const crossedUp = 300 + 30 * (30 / 60);
    const crossedDown = 420 + 120 * (76 / 106);
    expect((zone!.x - 34) / perMinute(drawn())).toBeCloseTo(crossedUp, 4);
    expect(zone!.width / perMinute(drawn())).toBeCloseTo(crossedDown - crossedUp, 4);
  });
  it('draws in Fahrenheit for whoever reads that, on the same curve', () => {
    const fahrenheit = drawn({ fahrenheit: true, limit: { ...LIMIT, words: 'limit 698 °F' } });
    expect(wordsOf(fahrenheit)).toEqual(expect.arrayContaining(['°F', '698 °F', '835 °F']));
    expect(fahrenheit.description).toContain('peak 835 °F; limit 698 °F.');
    expect(fahrenheit.table?.columns[1]).toBe('peak, °F');
    const zone = (d: typeof fahrenheit) => hatches(d).map((h) => [h.x, h.width]);
    expect(zone(fahrenheit)[0]![0]).toBeCloseTo(zone(drawn())[0]![0]!, 6);
    expect(zone(fahrenheit)[0]![1]).toBeCloseTo(zone(drawn())[0]![1]!, 6);
    expect(outOfFrame(fahrenheit)).toEqual([]);
    expect(overlapping(fahrenheit)).toEqual([]);
  });
  it('has no hatch where the core stayed below, and says so', () => {
    const cool = drawn({ channels: [{ ...core, peakC: 356, points: core.points.map((p) => ({ ...p, celsius: Math.min(p.celsius, 356) })), aboveLimit: { minutes: 0, unknownMinutes: 0 } }] });
    expect(hatches(cool)).toEqual([]);
    expect(cool.description).toContain('Never above the limit while it was read.');
  });
  it('leaves gaps open, and says what is not known', () => {
    const gappy = drawn({ channels: [{ ...core, gaps: [{ fromMinute: 330, toMinute: 420 }], aboveLimit: { minutes: 101, unknownMinutes: 90 } }] });
    expect(curves(gappy)[0]!.d.match(/M/g)).toHaveLength(2);
    expect(hatches(gappy)).toHaveLength(2);
    expect(gappy.description).toContain('90 min beside it were not read');
  });
  it('draws without a limit where none is set', () => {
    const free = drawn({ limit: null, channels: [{ ...core, aboveLimit: null }] });
    expect(hatches(free)).toEqual([]);
    expect(free.description).toBe('Core: peak 446 °C. No limit is set.');
    expect(free.table?.rows).toEqual([['Core', '446.0', '–', '–']]);
  });
  it('keeps its words inside the frame, wide and on a phone', () => {
    const single = { ...core, peakC: 20, points: [{ minute: 0, celsius: 20 }] };
    for (const narrow of [false, true]) {
      for (const channels of [[air, core], [core], [single], [{ ...core, name: 'Thermocouple 3, tooth at the drive end, lower half' }], [{ ...core, peakC: -20, points: [{ minute: 5, celsius: -20 }, { minute: 9, celsius: -30 }] }]]) {
        const drawing = drawn({ narrow, channels });
        expect(outOfFrame(drawing)).toEqual([]);
        expect(overlapping(drawing)).toEqual([]);
        expect(faultsOf(drawing.shapes)).toEqual([]);
      }
    }
  });
  it('says so where nothing was read, and refuses a figure that is no number', () => {
    expect(wordsOf(drawn({ channels: [] }))).toEqual(['No temperature record of this burnout.']);
    expect(() => drawn({ channels: [{ ...core, points: [{ minute: Number.NaN, celsius: 20 }] }] })).toThrow(RangeError);
  });
  it('draws what the logger file says', () => {
    const reader = createLoggerReader({ limitsC: [370] });
    reader.write('Elapsed (min);Core (°C)\n');
    for (let minute = 0; minute < 5000; minute += 1) reader.write(`${minute};${(100 + 300 * Math.sin((minute / 5000) * Math.PI)).toFixed(1)}\n`);
    const found = reader.end();
    if (found.outcome !== 'read' || found.channels[0]?.outcome !== 'read') throw new Error('The file was not read.');
    const [channel] = [found.channels[0]];
    const drawing = drawn({ channels: [{ name: channel.name, peakC: channel.peakC, points: channel.curve, gaps: channel.gaps ?? [], aboveLimit: channel.minutesAbove[0]! }] });
    const wide = hatches(drawing).reduce((sum, h) => sum + h.width, 0);
    expect((wide / (drawing.width - 8 - 34)) * 4999).toBeCloseTo(channel.minutesAbove[0]!.minutes, -1);
    expect(outOfFrame(drawing)).toEqual([]);
  });
});
