import { describe, expect, it } from 'vitest';
import { judgeLoad, reachInGap } from './judge-load.js';
import { thinned, type KeptChannel } from './kept-read.js';
import { loadLimit } from './load-limit.js';
import { guessPartChannels } from './part-channels.js';

const LIMIT = 370;
function channel(more: Partial<Extract<KeptChannel, { outcome: 'read' }>> = {}): KeptChannel {
  return {
    outcome: 'read',
    name: 'Core',
    unit: 'C',
    samples: 100,
    emptyCells: 0,
    peakC: 356,
    peakAt: { minute: 300, clock: '05:00', line: 302 },
    minutesAbove: [{ limitC: 345, minutes: 95, unknownMinutes: 0 }, { limitC: LIMIT, minutes: 0, unknownMinutes: 0 }],
    rampKPerH: 60,
    coolKPerH: 60,
    gaps: [],
    gapCount: 0,
    gapMinutes: 0,
    curve: [[0, 20], [240, 350], [300, 356], [360, 350], [700, 60]],
    ...more,
  };
}
const judged = (channels: readonly KeptChannel[], onPart: readonly string[] = ['Core']) => judgeLoad({ channels }, LIMIT, onPart);

describe('a load, judged by the thermocouples on its parts', () => {
  it('on its limit is within it', () => {
    expect(judged([channel({ peakC: 370 })]).verdict).toBe('conforms');
    expect(judged([channel({ peakC: 370.1 })]).verdict).toBe('does-not-conform');
  });
  it('names every thermocouple that went over, and goes by the hottest', () => {
    const found = judged([channel({ peakC: 372 }), channel({ name: 'Tooth', peakC: 401 }), channel({ name: 'Air', peakC: 480 })], ['Core', 'Tooth']);
    expect(found).toMatchObject({ hottest: 'Tooth', peakC: 401, reasons: [{ channel: 'Core', overK: 2 }, { channel: 'Tooth', overK: 31 }] });
  });
  it('takes the longest time above of all that hung on the parts', () => {
    const longer = channel({ name: 'Tooth', peakC: 350, minutesAbove: [{ limitC: 345, minutes: 120, unknownMinutes: 0 }] });
    expect(judged([channel(), longer], ['Core', 'Tooth']).minutesAbove345C).toBe(120);
  });
  it('with no reading from the part it cannot be told, and no figure stands for it', () => {
    expect(judged([{ outcome: 'no-readings', name: 'Core', unit: 'C', samples: 0, emptyCells: 600 }])).toMatchObject({ verdict: 'not-valid', peakC: null, minutesAboveLimit: null });
  });
  it('three rows without a pace do not show that it kept within its limit', () => {
    expect(judged([channel({ gaps: null })])).toMatchObject({ verdict: 'inconclusive', reasons: [{ code: 'too-few-rows' }] });
  });
  it('over its limit it is over, whatever the gaps', () => {
    expect(judged([channel({ peakC: 400, gaps: [{ fromMinute: 0, toMinute: 90 }] })]).verdict).toBe('does-not-conform');
  });
});

describe('what a part can have come to in a gap', () => {
  const reach = (gap: { fromMinute: number; toMinute: number }, more: object = {}) => reachInGap({ rampKPerH: 60, coolKPerH: 60, curve: [[0, 20], [240, 350], [300, 356], [700, 60]], ...more }, gap);
  it('up from its start and down to its end, no faster than elsewhere', () => {
    // 350 up at 1 K/min, down to 356 at 1 K/min, an hour between: met after 33 min
    expect(reach({ fromMinute: 240, toMinute: 300 })).toBeCloseTo(383, 6);
  });
  it('never less than its ends', () => {
    expect(reach({ fromMinute: 240, toMinute: 300 }, { rampKPerH: 0, coolKPerH: 0 })).toBe(356);
  });
  it('unplugged while hot it may have gone on heating; unplugged cold it was over', () => {
    expect(reach({ fromMinute: 300, toMinute: 400 }, { curve: [[0, 20], [300, 356]] })).toBe(456);
    expect(reach({ fromMinute: 700, toMinute: 1400 })).toBe(60);
  });
  it('is not told where the record shows no rates', () => {
    expect(reach({ fromMinute: 240, toMinute: 300 }, { rampKPerH: null })).toBeNull();
  });
});

describe('small decisions about a load', () => {
  it('the part that stands least heat sets the limit', () => {
    const limit = (limitC: number) => ({ limitC, limitReason: 'unknown' as const, limitSource: '', limitStanding: '' });
    expect(loadLimit([limit(400), limit(300), limit(370)]).limitC).toBe(300);
  });
  it.each([
    [['Core 1', 'Tooth DE', 'Chamber air', 'Setpoint'], ['Core 1', 'Tooth DE']],
    [['T1', 'T2', 'afterburner'], ['T1', 'T2']],
    [['oven_air', 'part'], ['part']],
    [['SP', 'Core'], ['Core']],
    [['Back iron', 'Spider'], ['Back iron', 'Spider']],
  ])('of %j these hung on the parts at a first guess: %j', (names, onPart) => {
    expect(guessPartChannels(names)).toEqual(onPart);
  });
  it('a curve made thinner keeps its peak and its order', () => {
    const curve = Array.from({ length: 5000 }, (_, minute) => ({ minute, celsius: minute === 3217 ? 446 : 300 + Math.sin(minute) }));
    const thin = thinned(curve, 400);
    expect(thin.length).toBeLessThanOrEqual(400);
    expect(thin).toContainEqual({ minute: 3217, celsius: 446 });
    expect(thin.map((p) => p.minute)).toEqual([...thin.map((p) => p.minute)].sort((a, b) => a - b));
  });
});
