import { describe, expect, it } from 'vitest';
import { findLayout, type Layout, type LayoutHints, type NoLayout } from './layout.js';

const find = (text: string, hints: LayoutHints = {}) => findLayout(text.split('\n').map((line, i) => ({ text: line, line: i + 1 })), hints);
function layout(text: string, hints?: LayoutHints): Layout {
  const found = find(text, hints);
  if ('code' in found) throw new Error(found.message);
  return found;
}
const refusal = (text: string, hints?: LayoutHints) => (find(text, hints) as NoLayout).code;
const channels = (text: string, hints?: LayoutHints) => layout(text, hints).channels.map((c) => `${c.name}/${c.unit ?? '?'}`);

describe('The layout of a logger file', () => {
  it('with semicolons and decimal commas', () => {
    const found = layout('Logger 4711\nTime;Core (°C);Oven (°C)\n09.03.2026 06:00:00;20,5;21,0\n09.03.2026 06:01:00;22,5;31,0\n09.03.2026 06:02:00;24,5;41,0');
    expect(found).toMatchObject({ separator: ';', decimalMark: ',', time: { kind: 'stamp', column: 0, order: 'dmy', orderAssumed: false }, width: 3, firstDataLine: 3, stepS: 60, newestFirst: false });
    expect(found.channels).toEqual([{ column: 1, name: 'Core', unit: 'C' }, { column: 2, name: 'Oven', unit: 'C' }]);
  });
  it('with commas and decimal points, with tabs, with bars', () => {
    expect(layout('t,a\n2026-03-09T06:00:00,20.5\n2026-03-09T06:01:00,21.5')).toMatchObject({ separator: ',', decimalMark: '.' });
    expect(layout('2026-03-09 06:00\t20,5\n2026-03-09 06:01\t21,5')).toMatchObject({ separator: '\t', decimalMark: ',' });
    expect(layout('2026-03-09 06:00|20|21\n2026-03-09 06:01|21|22')).toMatchObject({ separator: '|', decimalMark: null });
  });
  it('with commas and quoted decimal commas', () => {
    expect(layout('"Time","Core"\n"09.03.2026 06:00","20,5"\n"09.03.2026 06:01","21,5"')).toMatchObject({ separator: ',', decimalMark: ',' });
  });
  it('with date and time in two columns behind a row number', () => {
    const text = 'No.;Date;Time;Core\n1;09.03.2026;06:00:00;20,5\n2;09.03.2026;06:00:30;21,5';
    expect(layout(text).time).toMatchObject({ kind: 'day-and-clock', column: 1, clockColumn: 2, order: 'dmy' });
    expect(channels(text)).toEqual(['Core/?']);
  });
  it.each([
    ['Time (s);Core\n0;20\n30;21', 1],
    ['Elapsed min;Core\n0;20\n30;21', 60],
    ['t [h];Core\n0;20\n0,5;21', 3600],
    ['Seconds;Core\n0;20\n30;21', 1],
    ['Core;Time (min)\n20;0\n21;30', 60],
  ])('with time counted since the start: %s', (text, secondsPerUnit) => {
    expect(layout(text.replace('Core;Time', 'Core (°C);Time')).time).toMatchObject({ kind: 'elapsed', secondsPerUnit });
  });
  it('with a clock that knows no day', () => {
    expect(layout('06:00:00;20\n06:01:00;21').time).toEqual({ kind: 'clock', column: 0 });
  });
  it('asks for the unit of a time that is only numbers', () => {
    expect(refusal('0;20\n30;21')).toBe('elapsed-unit-unknown');
    expect(refusal('Time;Core\n0;20\n30;21')).toBe('elapsed-unit-unknown');
    expect(layout('0;20\n30;21', { elapsedUnit: 'min' }).time).toEqual({ kind: 'elapsed', column: 0, secondsPerUnit: 60 });
  });
  it('takes month first where only that makes dates, or where it keeps the rows together', () => {
    expect(layout('03/13/2026 06:00;20\n03/13/2026 06:01;21').time).toMatchObject({ order: 'mdy', orderAssumed: false });
    expect(layout('03/11/2026 23:59;20\n03/12/2026 00:00;21').time).toMatchObject({ order: 'mdy', orderAssumed: false });
    expect(layout('11/03/2026 23:59;20\n12/03/2026 00:00;21').time).toMatchObject({ order: 'dmy', orderAssumed: false });
    expect(layout('03/11/2026 23:58;20\n03/11/2026 23:59;21').time).toMatchObject({ order: 'dmy', orderAssumed: true });
    expect(layout('03/11/2026 23:58;20\n03/11/2026 23:59;21', { dateOrder: 'mdy' }).time).toMatchObject({ order: 'mdy', orderAssumed: false });
  });
  it('leaves out what is no temperature, and says so', () => {
    const text = 'Time;Core °C;Humidity (%RH);Status;\n09.03.2026 06:00;20,5;41;ok;\n09.03.2026 06:01;21,5;40;ok;';
    expect(channels(text)).toEqual(['Core/C']);
    expect(layout(text).leftOut).toEqual(['Humidity', 'Status']);
  });
  it('reads a row of units below the names', () => {
    expect(channels('Time;Core;Oven\n;°F;°F\n09.03.2026 06:00;70;71\n09.03.2026 06:01;70;71')).toEqual(['Core/F', 'Oven/F']);
    expect(channels('Time;°C;°F\n09.03.2026 06:00;70;71\n09.03.2026 06:01;70;71')).toEqual(['Channel 1/C', 'Channel 2/F']);
  });
  it('names what has no name, and tells two of one name apart', () => {
    expect(channels('06:00;20;21\n06:01;20;21')).toEqual(['Channel 1/?', 'Channel 2/?']);
    expect(channels('Time;Core;Core\n06:00;20;21\n06:01;20;21')).toEqual(['Core/?', 'Core (2)/?']);
  });
  it('keeps a channel whose first rows are all open', () => {
    expect(channels('Time;Core (°C);Oven (°C)\n06:00;OL;21\n06:01;;21')).toEqual(['Core/C', 'Oven/C']);
  });
  it('begins with the first row that has a time, even while all thermocouples are open', () => {
    expect(layout('Time;Core (°C)\n06:00;OL\n06:01;\n06:02;21').firstDataLine).toBe(2);
  });
  it('is not made wider by one row with a cell too many', () => {
    expect(layout('Time;Core\n06:00;20\n06:01;21;x\n06:02;22')).toMatchObject({ width: 2, needed: 2, leftOut: [] });
  });
  it('sees that the newest row comes first', () => {
    expect(layout('06:02;20\n06:01;21\n06:00;22')).toMatchObject({ newestFirst: true, stepS: 60 });
  });
  it('does not guess where a comma is both separator and decimal mark', () => {
    expect(refusal('Time,Core,Oven\n06:00:00,20,5,21,0\n06:01:00,22,5,31,0')).toBe('decimal-comma-and-separator');
  });
  it('says in words why a file cannot be read', () => {
    expect(findLayout([], {})).toEqual({ code: 'empty-file', message: 'The file is empty.' });
    expect(refusal('P\u0000K\u0003')).toBe('not-text');
    expect(refusal('Dear Sir,\nthe oven is warm.')).toBe('no-table');
    expect(refusal('Time;Core\n')).toBe('no-table');
    expect(refusal('09.03.2026 06:00;ok\n09.03.2026 06:01;ok')).toBe('no-table');
    expect(refusal('2026-03-09 06:00,20.5', { separator: ';' })).toBe('no-table');
  });
});
