import { correctLoadSchema, createLoadSchema } from '@shared/burnouts';
import { describe, expect, it } from 'vitest';
import { atTheirTicks, channelKey, chosenJobs, correctionOf, emptyLoad, formLimit, readCorrection, readLoad } from './load-form.js';
import { reasonWords, sinceStart, verdictLines } from './load-words.js';
import { beforeItsFile, overheated, waiting } from './sample-load.fixture.js';

const [saw, dairy, hoist] = waiting.map((w) => w.jobId) as [string, string, string];
const filled = { ...emptyLoad('2026-11-09'), ovenId: 'O1', chosen: { [saw]: true, [dairy]: true }, countedAndSampled: true };

describe('a new load, read from its form', () => {
  it('sends what is ticked, and what is said of rings', () => {
    expect(createLoadSchema.parse(readLoad({ ...filled, chosen: { [hoist]: true }, ringsOff: { [hoist]: true, [saw]: true } }, waiting)).jobs).toEqual([{ jobId: hoist, ringsOff: true }]);
  });
  it('a job that is gone meanwhile takes its tick with it', () => {
    expect(chosenJobs({ chosen: { [saw]: true, gone: true } }, waiting).map((j) => j.jobId)).toEqual([saw]);
  });
  it('shows the lowest limit of what is ticked, and whose it is', () => {
    expect(formLimit(chosenJobs(filled, waiting))).toEqual({ limitC: 300, limitReason: 'aluminium', number: 'J2026-0010' });
    expect(formLimit([])).toBeNull();
  });
  it('puts the server’s words at the tick of the job they are about', () => {
    const sent = [{ jobId: saw }, { jobId: hoist }];
    expect(atTheirTicks([{ path: 'jobs.1.ringsOff', message: 'Rings.' }, { path: 'jobs.0.jobId', message: 'Gone.' }, { path: 'ovenId', message: 'Which?' }, { path: 'jobs', message: 'None.' }], sent)).toEqual([
      { path: `ringsOff.${hoist}`, message: 'Rings.' },
      { path: `chosen.${saw}`, message: 'Gone.' },
      { path: 'ovenId', message: 'Which?' },
      { path: 'jobs', message: 'None.' },
    ]);
  });
});

describe('a correction, read from its form', () => {
  it('opened and sent again says the same as before, whatever the thermocouples are called', () => {
    const { candidate, problems } = readCorrection({ ...correctionOf(overheated, 'si'), reason: 'Looked again.' }, overheated);
    expect(problems).toEqual([]);
    expect(correctLoadSchema.parse(candidate)).toMatchObject({ version: 2, partChannels: ['Core', 'T.3'], offsetK: 0, jobs: [{ jobId: 'job-0000004' }, { jobId: 'job-0000005' }] });
  });
  it('takes an offset in the person’s units', () => {
    const values = { ...correctionOf(overheated, 'inch-pound'), reason: 'Sensor.', offsetK: { text: '18', system: 'inch-pound' as const } };
    expect(readCorrection(values, overheated).candidate.offsetK).toBeCloseTo(10, 9);
  });
  it('of a load without a file names no thermocouples', () => {
    expect(readCorrection(correctionOf(beforeItsFile, 'si'), beforeItsFile).candidate.partChannels).toBeNull();
  });
  it('a thermocouple taken off the part is not sent', () => {
    const values = correctionOf(overheated, 'si');
    expect(readCorrection({ ...values, onPart: { ...values.onPart, [channelKey(2)]: false } }, overheated).candidate.partChannels).toEqual(['Core']);
  });
});

describe('the verdict of a load in words', () => {
  it('over: by how much, and that the core test decides', () => {
    expect(verdictLines(overheated, 'si')).toEqual(['Core came to 446 °C: 76 K over the limit.', 'Every job of this load is marked. The core test after decides.']);
  });
  it('within: how far below', () => {
    expect(verdictLines({ verdict: 'conforms', reasons: [], hottest: 'Core', peakC: 356, limitC: 370 }, 'si')).toEqual(['Core came to 356 °C: 14 K below the limit.']);
  });
  it('a gap is told by hours and minutes from the start', () => {
    expect(reasonWords({ code: 'gap-may-hide-it', channel: 'Core', fromMinute: 285, toMinute: 315.4, reachC: 371.6 }, 'si')).toBe('Core was not read from 4:45 to 5:15; it may have come to 372 °C meanwhile.');
    expect(reasonWords({ code: 'gap-may-hide-it', channel: 'Core', fromMinute: 0, toMinute: 5, reachC: null }, 'si')).toContain('cannot be told');
    expect(sinceStart(59.9)).toBe('1:00');
  });
  it('in inch-pound in degrees Fahrenheit', () => {
    expect(verdictLines(overheated, 'inch-pound')[0]).toBe('Core came to 835 °F: 137 °F over the limit.');
  });
  it('nothing on the part, never hot, too few rows: each says what is the matter', () => {
    const said = ([{ code: 'nothing-on-the-part' }, { code: 'never-hot', channel: 'Core', peakC: 120 }, { code: 'too-few-rows', channel: 'Core' }] as const).map((r) => reasonWords(r, 'si'));
    expect(new Set(said).size).toBe(3);
    expect(said[1]).toContain('120 °C');
  });
});
