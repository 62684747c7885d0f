import { describe, expect, it } from 'vitest';
import { createLoggerReader } from './logger-reader.js';
import type { ChannelRead, LoggerRead, LoggerSummary } from './logger-summary.js';
import { OutOfRangeError } from './out-of-range-error.js';
import type { LoggerReaderOptions } from './reader-options.js';

function summaryOf(text: string, options?: LoggerReaderOptions): LoggerSummary {
  const reader = createLoggerReader(options);
  reader.write(text);
  return reader.end();
}
function read(text: string, options?: LoggerReaderOptions): LoggerRead {
  const summary = summaryOf(text, options);
  if (summary.outcome !== 'read') throw new Error(summary.message);
  return summary;
}
function core(text: string, options?: LoggerReaderOptions): ChannelRead {
  const channel = read(text, options).channels[0]!;
  if (channel.outcome !== 'read') throw new Error(channel.message);
  return channel;
}
const codes = (text: string, options?: LoggerReaderOptions) => read(text, options).problems.map((p) => `${p.line} ${p.code}`);
const clock = (minute: number) => `${String(Math.floor(minute / 60)).padStart(2, '0')}:${String(minute % 60).padStart(2, '0')}`;
/** One row a minute from midnight. */
const perMinute = (celsius: readonly (number | string)[]) => `Time;Core (°C)\n${celsius.map((c, i) => `${clock(i)};${c}`).join('\n')}\n`;

// Source: the sample shop's burnouts, part peak and minutes above 345 °C; invented figures. The curves are straight lines made to have them.
describe('A burnout of the sample shop', () => {
  /** Up at 80 K/h to just under the mark, to the peak in ten minutes, held there, down again in ten minutes, and slowly to 200. */
  function burnout(peakC: number, minutesAbove345: number): string {
    const overTen = (10 * (peakC - 345)) / (peakC - 340);
    const hold = Math.round(minutesAbove345 - 2 * overTen);
    const up = Array.from({ length: 241 }, (_, i) => 20 + (320 * i) / 240);
    const climb = Array.from({ length: 10 }, (_, i) => 340 + ((peakC - 340) * (i + 1)) / 10);
    const down = Array.from({ length: 120 }, (_, i) => 340 - (140 * (i + 1)) / 120);
    return perMinute([...up, ...climb, ...Array.from({ length: hold }, () => peakC), ...climb.slice(0, -1).reverse(), 340, ...down].map((c) => c.toFixed(3)));
  }
  it.each([
    ['job 1', 351, 80],
    ['job 3', 356, 95],
    ['job 6', 371, 240],
    ['job 12, as the slipped sensor showed it', 368, 150],
    ['job 2, over the limit by 76', 446, 210],
  ])('%s: peak %d °C, %d minutes above 345 °C', (_job, peakC, minutes) => {
    const found = core(burnout(peakC, minutes), { limitsC: [345, 370] });
    expect(found.peakC).toBe(peakC);
    expect(found.minutesAbove[0]!.minutes).toBeGreaterThan(minutes - 1);
    expect(found.minutesAbove[0]!.minutes).toBeLessThan(minutes + 1);
    expect(found.minutesAbove[1]!.minutes > 0).toBe(peakC > 370);
    expect(found.gaps).toEqual([]);
  });
  it('job 12 with the thermocouple’s drift of −11 K put right peaks at 379 °C: over the limit', () => {
    const found = core(burnout(368, 150), { thermocoupleOffsetK: { Core: 11 }, limitsC: [370] });
    expect(found.peakC).toBe(379);
    expect(found.minutesAbove[0]!.minutes).toBeGreaterThan(100);
    expect(core(burnout(368, 150), { thermocoupleOffsetK: 11 }).peakC).toBe(379);
    expect(core(burnout(368, 150), { thermocoupleOffsetK: { Oven: 11 } }).peakC).toBe(368);
  });
  it('names the fastest heating and cooling in kelvin per hour', () => {
    const slow = core(perMinute(Array.from({ length: 181 }, (_, i) => (i <= 120 ? 20 + (80 * i) / 60 : 180 - (50 * (i - 120)) / 60).toFixed(4))));
    expect(slow.rampKPerH).toBeCloseTo(80, 2);
    expect(slow.coolKPerH).toBeCloseTo(50, 2);
  });
});

describe('Time above a limit', () => {
  it('runs straight between two readings', () => {
    const found = core(perMinute([340, 350, 350, 340]), { limitsC: [345, 350, 300] });
    expect(found.minutesAbove.map((a) => a.minutes)).toEqual([2, 0, 3]);
  });
  it('is not counted over a gap, and says how much is unknown', () => {
    const found = core('Time;Core (°C)\n06:00;350\n06:01;350\n06:02;350\n06:32;350\n06:33;340\n', { limitsC: [345] });
    expect(found.minutesAbove).toEqual([{ limitC: 345, minutes: 2.5, unknownMinutes: 30 }]);
    expect(found.gaps).toEqual([{ fromMinute: 2, toMinute: 32 }]);
    expect([found.gapCount, found.gapMinutes]).toEqual([1, 30]);
  });
  it('counts an unplugged thermocouple as a gap to the end of the file', () => {
    const found = core('Time;Core (°C);Oven (°C)\n06:00;350;1\n06:01;350;1\n06:02;;1\n06:03;;1\n06:04;;1\n06:05;;1\n', { limitsC: [345] });
    expect(found.gaps).toEqual([{ fromMinute: 1, toMinute: 5 }]);
    expect(found.minutesAbove).toEqual([{ limitC: 345, minutes: 1, unknownMinutes: 4 }]);
    expect(found.emptyCells).toBe(4);
  });
  it('takes the length of a gap from the shop where it is told', () => {
    const text = 'Time;Core (°C)\n06:00;350\n06:01;350\n06:02;350\n06:32;350\n';
    expect(core(text, { gapAfterMinutes: 60 }).gaps).toEqual([]);
    expect(core(text, { gapAfterMinutes: 60, limitsC: [345] }).minutesAbove[0]).toEqual({ limitC: 345, minutes: 32, unknownMinutes: 0 });
  });
  it('cannot tell gaps where the file shows no pace', () => {
    expect(core('Time;Core (°C)\n06:00;350\n09:00;350\n').gaps).toBeNull();
  });
});

describe('One record, written by different loggers', () => {
  const expected = { peakC: 351.5, minutes: 3 };
  it.each([
    ['semicolons, decimal commas, CR LF and an encoding mark', '\ufeffTime;Core (°C)\r\n09.03.2026 06:00:00;340,5\r\n09.03.2026 06:01:00;351,5\r\n09.03.2026 06:02:00;350,0\r\n09.03.2026 06:03:00;349,5\r\n'],
    ['commas, decimal points, ISO time', 'time,Core °C\n2026-03-09T06:00:00Z,340.5\n2026-03-09T06:01:00Z,351.5\n2026-03-09T06:02:00Z,350.0\n2026-03-09T06:03:00Z,349.5'],
    ['tabs and minutes since the start', 'Elapsed (min)\tCore [degC]\n0\t340.5\n1\t351.5\n2\t350.0\n3\t349.5'],
    ['seconds since the start, everything in quotes', '"Time (s)","Core (°C)"\n"0","340,5"\n"60","351,5"\n"120","350,0"\n"180","349,5"'],
    ['Fahrenheit', 'Time;Core (°F)\n06:00;644.9\n06:01;664.7\n06:02;662.0\n06:03;661.1'],
    ['kelvin', 'Time;Core (K)\n06:00;613.65\n06:01;624.65\n06:02;623.15\n06:03;622.65'],
    ['a unit behind every figure', 'Time;Core\n06:00;340.5 °C\n06:01;351.5 °C\n06:02;350.0 °C\n06:03;349.5 °C'],
    ['date and time apart, numbered rows, a preamble', 'Device: K4\nSerial;0815\n\nNo;Date;Time;Core (°C)\n1;9.3.2026;6:00:00;340,5\n2;9.3.2026;6:01:00;351,5\n3;9.3.2026;6:02:00;350,0\n4;9.3.2026;6:03:00;349,5'],
    ['month first, half-day clock', 'Time;Core (°C)\n03/13/2026 11:58 PM;340.5\n03/13/2026 11:59 PM;351.5\n03/14/2026 12:00 AM;350.0\n03/14/2026 12:01 AM;349.5'],
    ['a clock over midnight', 'Time;Core (°C)\n23:58:00;340.5\n23:59:00;351.5\n00:00:00;350.0\n00:01:00;349.5'],
    ['newest first, over midnight', 'Time;Core (°C)\n00:01:00;349.5\n00:00:00;350.0\n23:59:00;351.5\n23:58:00;340.5'],
    ['rows in disorder', 'Time;Core (°C)\n06:01;351.5\n06:00;340.5\n06:03;349.5\n06:02;350.0'],
  ])('%s', (_how, text) => {
    const found = core(text, { limitsC: [340.5] });
    expect(found.peakC).toBeCloseTo(expected.peakC, 9);
    expect(found.minutesAbove[0]!.minutes).toBeCloseTo(expected.minutes, 6);
    expect(found.peakAt.minute).toBeCloseTo(1, 9);
    expect(read(text).minutes).toBeCloseTo(3, 9);
    expect(found.curve.map((p) => Number(p.celsius.toFixed(4)))).toEqual([340.5, 351.5, 350, 349.5]);
  });
  it('says when the peak was, as the file writes it', () => {
    expect(core('Date;Time;Core (°C)\n9.3.2026;6:00:00;340\n9.3.2026;6:01:00;351\n').peakAt).toEqual({ minute: 1, clock: '9.3.2026 6:01:00', line: 3 });
    expect(read('Time;Core (°C)\n06:00;340\n06:01;351\n')).toMatchObject({ rows: 2, startClock: '06:00', endClock: '06:01', minutes: 1 });
  });
  it('is the same whichever way the stream is cut', () => {
    const text = '\ufeffTime;Core (°C);Oven (°C)\r\n06:00;340,5;"350,0"\r\n06:01;OL;351,0\r\n06:02;351,5;\r\n';
    for (let size = 1; size < 20; size += 1) {
      const reader = createLoggerReader();
      for (let at = 0; at < text.length; at += size) reader.write(text.slice(at, at + size));
      expect(reader.end()).toEqual(summaryOf(text));
    }
  });
});

describe('A file with slips', () => {
  it('names the line of text in a number cell, of a row without time, of cells too many or too few', () => {
    const text = 'Time;Core (°C);Oven (°C)\n06:00;20.5;21.0\n06:01;OL;22.0\nsensor changed\n06:02;24.5\n06:03;25.5;23.0;x\n06:04;26,5;24.0\n06:05;27.5;25.0;\n';
    expect(codes(text)).toEqual(['3 text-in-number', '4 row-not-read', '5 cells-missing', '6 cells-extra', '7 other-decimal-mark']);
    expect(read(text).problems[0]).toEqual({ code: 'text-in-number', line: 3, channel: 'Core', message: 'Line 3, Core: "OL" is no temperature.' });
    expect(core(text).samples).toBe(4);
  });
  it('does not take an open thermocouple for a peak', () => {
    const found = read('Time;Core (°C)\n06:00;340\n06:01;1372\n06:02;-200\n06:03;341\n');
    expect(found.channels[0]).toMatchObject({ peakC: 341, samples: 2 });
    expect(found.problemCounts).toEqual({ 'implausible-reading': 2 });
    expect(core('Time;Core (°C)\n06:00;340\n06:01;1372\n', { plausibleC: { lowest: -50, highest: 1400 } }).peakC).toBe(1372);
  });
  it('of two readings of one time counts the higher, and says so', () => {
    const text = 'Time;Core (°C)\n06:00;340\n06:01;341\n06:01;356\n06:01;342\n06:02;343\n';
    expect(codes(text)).toEqual(['4 duplicate-time', '5 duplicate-time']);
    expect(core(text, { limitsC: [349.5] }).minutesAbove[0]!.minutes).toBeCloseTo(6.5 / 16 + 6.5 / 13, 9);
  });
  it('puts a row in its place and says where it stood', () => {
    expect(codes('Time;Core (°C)\n06:00;20\n06:02;22\n06:01;21\n06:03;23\n')).toEqual(['4 wrong-order']);
  });
  it('counts a row that comes far too late for the peak only', () => {
    const minutes = Array.from({ length: 200 }, (_, i) => `${clock(i + 60)};${300}`);
    const text = `Time;Core (°C)\n${minutes.join('\n')}\n01:30;420\n`;
    expect(codes(text)).toEqual(['202 too-late']);
    const found = core(text, { limitsC: [345] });
    expect(found.peakC).toBe(420);
    expect(found.minutesAbove[0]).toEqual({ limitC: 345, minutes: 0, unknownMinutes: 0 });
    expect(Math.max(...found.curve.map((p) => p.celsius))).toBe(420);
  });
  it('says when the newest row came first, and what was assumed', () => {
    expect(codes('Time;Core\n06:02;22\n06:01;21\n06:00;20\n')).toEqual(['2 unit-assumed', '2 newest-first']);
    expect(core('Time;Core\n06:00;698\n06:01;698\n', { unit: 'F' }).peakC).toBe(370);
    expect(codes('Time;Core (°C);Note\n03/04/2026 06:00;20;a\n03/04/2026 06:01;21;b\n')).toEqual(['2 column-left-out', '2 date-order-assumed']);
  });
  it('keeps twenty problems of a kind and counts all', () => {
    const found = read(perMinute([20, ...Array.from({ length: 300 }, () => 'OL')]));
    expect(found.problems).toHaveLength(20);
    expect(found.problemCounts).toEqual({ 'text-in-number': 300 });
  });
  it('leaves out a line that is no row at all', () => {
    const found = read(`Time;Core (°C)\n06:00;20\n06:01;21${'x'.repeat(30_000)}\n06:02;22\n`);
    expect(found.problems).toMatchObject([{ code: 'line-too-long', line: 3 }]);
    expect(found.rows).toBe(2);
  });
  it('reads a decimal comma that only comes after two hundred whole figures', () => {
    const found = read(perMinute([...Array.from({ length: 300 }, (_, i) => 20 + i), '351,5']));
    expect(found.channels[0]).toMatchObject({ peakC: 351.5 });
    expect([found.decimalMark, found.problems]).toEqual([',', []]);
  });
  it('says so where a channel was never plugged in', () => {
    const found = read('Time;Core (°C);Oven (°C)\n06:00;20;\n06:01;21;OL\n');
    expect(found.channels[1]).toEqual({ outcome: 'no-readings', name: 'Oven', unit: 'C', samples: 0, emptyCells: 1, message: 'Oven has no reading in this file. Check that the thermocouple was plugged in.' });
  });
  it('does not tell a rate where the readings end too soon', () => {
    expect(core(perMinute([20, 40, 60]))).toMatchObject({ rampKPerH: null, coolKPerH: null });
    expect(core(perMinute([20, 40, 60]), { rateOverMinutes: 1 }).rampKPerH).toBeCloseTo(1200, 9);
  });
});

describe('A file that cannot be read', () => {
  it.each([
    ['', 'empty-file', 'The file is empty.'],
    ['\n\n \n', 'empty-file', 'The file is empty.'],
    ['P\u0000\u0003', 'not-text', /Export the curve as CSV/],
    ['{"not": "a table"}', 'no-table', /one row for each reading/],
    ['0;20\n60;21\n', 'elapsed-unit-unknown', /seconds, minutes or hours/],
    ['Time,Core,Oven\n06:00,20,5,21,0\n06:01,22,5,31,0\n', 'decimal-comma-and-separator', /semicolons/],
  ])('%j: %s', (text, code, message) => {
    expect(summaryOf(text)).toMatchObject({ outcome: 'unreadable', code, message: expect.stringMatching(message) });
  });
  it('because the dates turn out to name the month first', () => {
    const evening = Array.from({ length: 220 }, (_, i) => `03/12/2026 ${clock(1200 + i)};300`);
    const text = (next: string) => `Time;Core (°C)\n${evening.join('\n')}\n${next};300\n`;
    expect(summaryOf(text('03/13/2026 00:00'))).toMatchObject({ outcome: 'unreadable', code: 'date-order-contradicted' });
    expect(summaryOf(text('04/12/2026 00:00'))).toMatchObject({ outcome: 'read' });
    expect(summaryOf(text('03/13/2026 00:00'), { dateOrder: 'mdy' })).toMatchObject({ outcome: 'read', minutes: 240 });
    const early = Array.from({ length: 220 }, (_, i) => `03/11/2026 ${clock(1200 + i)};300`);
    expect(summaryOf(`Time;Core (°C)\n${early.join('\n')}\n03/12/2026 00:00;300\n`)).toMatchObject({ code: 'date-order-contradicted' });
  });
  it('because it is a table of another kind', () => {
    const wide = Array.from({ length: 70 }, () => '20').join(';');
    expect(summaryOf(`06:00;${wide}\n06:01;${wide}\n`)).toMatchObject({ code: 'too-many-channels', message: expect.stringContaining('70') });
  });
  it('still takes the rest of the stream, without reading it', () => {
    const reader = createLoggerReader();
    for (let i = 0; i < 1000; i += 1) reader.write('no table here\n');
    expect(reader.end()).toMatchObject({ code: 'no-table' });
  });
});

describe('The reader', () => {
  it.each([
    { limitsC: [345, Number.NaN] }, { thermocoupleOffsetK: Number.NaN }, { thermocoupleOffsetK: { Core: Infinity } }, { gapAfterMinutes: 0 }, { rateOverMinutes: -1 },
    { plausibleC: { lowest: 10, highest: 10 } }, { plausibleC: { lowest: Number.NaN, highest: 10 } },
  ])('refuses what it cannot use: %j', (options) => {
    expect(() => createLoggerReader(options)).toThrow(OutOfRangeError);
  });
  it('takes nothing after the end', () => {
    const reader = createLoggerReader();
    reader.end();
    expect(() => reader.write('x')).toThrow(/has ended/);
    expect(() => reader.end()).toThrow(/has ended/);
    expect(() => createLoggerReader().write(new Uint8Array(2) as never)).toThrow(/must be text/);
  });
});
