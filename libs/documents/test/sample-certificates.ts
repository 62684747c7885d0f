import { type BeforeTest, type CoreGeometry, type CoreTestInput, DEFAULT_CORE_LIMITS, evaluateCoreTest } from '@libs/core-loss';
import type { CertificateModel, CoreTestOnPaper, PaperSize, SignatureOnPaper, TestRowOnPaper } from '../src/index.js';
import { JOB, PLATE, base } from './sample-papers.js';

/** Certificates of the invented shop; results come from the calculation itself, as the server keeps them. */
const core = (od: number, bore: number, slotDepth: number, slots: number, stack: number, densityKgPerM3: number): CoreGeometry => ({
  kind: 'stator',
  outerDiameterM: od / 1000,
  innerDiameterM: bore / 1000,
  slotDepthM: slotDepth / 1000,
  slots,
  stackLengthM: stack / 1000,
  ducts: 0,
  ductWidthM: 0,
  stackingFactor: 0.95,
  densityKgPerM3,
});
const CORES = { 3: core(400, 225, 34, 36, 230, 7700), 7: core(466, 330, 36, 72, 300, 7750), 12: core(340, 218, 28, 48, 220, 7700) } as const;

interface Readings {
  readonly turns: readonly [exciting: number, search: number];
  readonly searchVoltsV: number;
  readonly excitingA: number;
  readonly wattsW: number;
  readonly temperatures: CoreTestInput['temperatures'];
}

function test(title: string, machine: keyof typeof CORES, phase: 'before' | 'after', testedAt: string, readings: Readings, before?: CoreTestOnPaper | 'waived'): CoreTestOnPaper {
  const input: CoreTestInput = {
    phase,
    geometry: CORES[machine],
    target: { basis: 'standard', fluxDensityT: 1.32 },
    frame: { state: 'in-frame', material: 'cast-iron' },
    cablePath: 'over-frame',
    massBasis: 'back-iron',
    reading: {
      excitingTurns: readings.turns[0],
      searchTurns: readings.turns[1],
      searchVoltsV: readings.searchVoltsV,
      voltmeter: 'average',
      excitingA: readings.excitingA,
      wattsW: readings.wattsW,
      wattmeterLead: 'search',
      frequencyHz: 50,
    },
    temperatures: readings.temperatures,
    instruments: { voltmeterId: 'v-1', ammeterId: 'a-1', wattmeterId: 'w-1', thermometerId: 't-1', wattmeterRange: '300 V 50 A', clampMeter: false },
    checks: { rotorOut: true, leadsOpen: true, parallelsOpened: true, onePointEarthed: true, throughBoltsMeasured: true, boreClear: true, barrierUp: true },
  };
  const against: BeforeTest | 'waived' | undefined = before === undefined || before === 'waived' ? before : { input: before.input, result: before.result };
  return { title, testedAt, testedBy: 'Jonas Reber', input, result: evaluateCoreTest(input, DEFAULT_CORE_LIMITS, against), remark: '' };
}

const heat = (ambientC: number, startC: number, minutes: number, meanC: number, hottestC: number, hottestSlot: number) => ({ ambientC, startC, minutes, meanC, hottestC, hottestSlot });

const before12 = test('before', 12, 'before', '2026-11-15T09:10:00.000Z', { turns: [16, 4], searchVoltsV: 8.096, excitingA: 26.5, wattsW: 40.01, temperatures: heat(21, 21, 20, 27.2, 31, 7) });
const after12 = test('after burnout', 12, 'after', '2026-11-19T13:25:00.000Z', { turns: [16, 4], searchVoltsV: 8.084, excitingA: 26.6, wattsW: 47.31, temperatures: heat(22, 22, 20, 29.4, 35.5, 7) }, before12);
const before3 = test('before', 3, 'before', '2026-10-30T09:10:00.000Z', { turns: [20, 4], searchVoltsV: 13.72, excitingA: 23.4, wattsW: 65.73, temperatures: heat(19, 19, 12, 23, 47.3, 13) });
const strip3 = test('after strip', 3, 'after', '2026-11-02T09:10:00.000Z', { turns: [20, 4], searchVoltsV: 13.7, excitingA: 23.3, wattsW: 64.76, temperatures: heat(21, 22, 12, 26, 48.8, 13) }, before3);
const repair3 = test('after core repair', 3, 'after', '2026-11-04T09:10:00.000Z', { turns: [20, 4], searchVoltsV: 13.71, excitingA: 23.3, wattsW: 61.91, temperatures: heat(21, 21, 20, 27.3, 31.7, 2) }, before3);
const only7 = test('after', 7, 'after', '2026-11-18T09:10:00.000Z', { turns: [20, 4], searchVoltsV: 10.71, excitingA: 31.4, wattsW: 80.76, temperatures: heat(21, 21, 20, 29.4, 32.4, 44) }, 'waived');

const signature = (act: SignatureOnPaper['act'], name: string, role: string, at: string, contentHash: string): SignatureOnPaper => ({ act, name, role, at, contentHash });
const SIGNATURES = [
  signature('tested', 'Jonas Reber', 'technician', '2026-11-26T15:40:00.000Z', 'a3f09c1e77b24d10ff00'),
  signature('released', 'Hanne Ruoff', 'manager', '2026-11-27T12:58:00.000Z', '77c1d4e5a0b93f22aa10'),
];

const row = (test: string, reading: string, limit: string, source: string, standing: string): TestRowOnPaper => ({ test, reading, limit, verdict: 'conforms', source, standing });
const FINAL_TESTS: readonly TestRowOnPaper[] = [
  row('Winding resistance', '152.1 / 152.6 / 152.4 mΩ at 24 °C, four-wire', '2 % of mean', 'quoted from AR100', 'P'),
  row('Insulation resistance', '2400 MΩ, 1 min at 500 V, 24 °C', '5 MΩ at 40 °C', 'IEEE 43', 'S'),
  row('High potential', '1800 V AC held 1 min, once', '2U + 1000 V', 'AR100, IEC 60034-1, MG 1', 'S'),
  row('Surge comparison', 'difference 4 %', '10 %', 'common practice', 'P'),
  row('No-load run', '401 / 400 / 399 V 50 Hz: 22.2 / 22.0 / 21.9 A, 960 W, 1497 rpm', 'amps within 5 %', 'common practice', 'P'),
  row('Vibration', '1.4 / 1.1 / 0.9 mm/s rms, free suspension', '1.8 mm/s', 'IEC 60034-14 grade A', 'S'),
  row('Bearings', '62 / 58 °C after 90 min, ambient 24 °C, change 1 K in 30 min', 'rise 45 K, stable', 'common practice', 'P'),
];

const common = (paperSize: PaperSize) =>
  ({
    ...base(paperSize),
    ...JOB,
    kind: 'certificate',
    route: 'rewind',
    receivedAt: '2026-11-10T08:00:00.000Z',
    replaces: null,
    supersededBy: null,
    verification: { code: 'K7QX-3MNP-V2RT-8HWD', checkUrl: 'https://ambach.example/check/K7QX-3MNP-V2RT-8HWD' },
    limits: { version: 3, publishedAt: '2026-09-01T06:00:00.000Z', decisionRule: 'ask', coverageFactor: 2 },
    coreBetween: [],
    missingBefore: null,
    statements: [],
    burnouts: [],
    winding: [],
    finalTests: [],
    instruments: [],
    signatures: SIGNATURES,
    remark: '',
  }) as const;

/** Machine 12: inconclusive increase, released by a manager with the customer's answer. Everything a certificate can hold. */
export const certificate12 = (paperSize: PaperSize = 'A4'): CertificateModel => ({
  ...common(paperSize),
  number: 'C-2026-0088',
  replaces: { number: 'C-2026-0085', issuedAt: '2026-11-26T10:00:00.000Z', reason: 'the serial number was misread' },
  coreBefore: before12,
  coreAfter: after12,
  statements: [
    {
      kind: 'inconclusive-release',
      about: 'Core test after, 19 November 2026',
      words: 'The limit lies inside the interval of the increase. Hot spots conform; the customer wants the motor back in service and takes a repeat at the next overhaul.',
      customerAnswer: { choice: 'accept with concession', by: 'Irena Młynarska', channel: 'phone', at: '2026-11-20T10:12:00.000Z', words: 'Go on, and note it on the certificate.' },
      signature: signature('conceded', 'Hanne Ruoff', 'manager', '2026-11-20T11:00:00.000Z', 'b81f00aa7c3e9915aa00'),
    },
  ],
  burnouts: [
    {
      method: 'Oven O2',
      startedAt: '2026-11-17T08:00:00.000Z',
      partPeakC: 368,
      limitC: 370,
      limitReason: 'core plate unknown, counts as organic',
      minutesAbove: { thresholdC: 345, minutes: 150 },
      verdict: 'conforms',
      remark: 'Within by the record; the control sensor was found to read 11 °C low two days later.',
    },
  ],
  winding: [
    { item: 'Connection', asFound: 'delta, 2 circuits', asWound: 'delta, 2 circuits' },
    { item: 'Coils, span', asFound: '48, 1–11', asWound: '48, 1–11' },
    { item: 'Turns a coil', asFound: '12', asWound: '12' },
    { item: 'Wire', asFound: '4 × 1.06 mm', asWound: '3 × 1.25 mm' },
  ],
  finalTests: FINAL_TESTS,
  instruments: [
    { use: 'Search-coil volts', name: 'Voltmeter V1, average-sensing', serial: 'V-0331', calibratedOn: '2026-03-02', dueOn: '2027-03-02' },
    { use: 'Watts', name: 'Wattmeter W1', serial: 'W-1187', calibratedOn: '2026-03-02', dueOn: '2027-03-02' },
    { use: 'Temperatures', name: 'Thermal camera T2', serial: 'T-20', calibratedOn: null, dueOn: null },
  ],
});

/** Machine 3: the increase conforms throughout, the hot spot only after the repair. In inch-pound on Letter. */
export const certificate3 = (paperSize: PaperSize = 'Letter'): CertificateModel => ({
  ...common(paperSize),
  number: 'C-2026-0090',
  customer: { name: 'Oberau Water Board', contactName: '', addressLines: ['Am Wehr 2', 'Oberau'], taxNumber: '' },
  machine: { description: '55 kW 2-pole pump motor', nameplate: { ...PLATE, maker: '', model: '', serial: '250M-7', ratedPowerW: 55_000, ratedSpeedRpm: 2970, ratedCurrentA: 95.4, poles: 2, frame: '250M', mounting: 'B35' } },
  coreBefore: before3,
  coreBetween: [strip3],
  coreAfter: repair3,
  finalTests: FINAL_TESTS.slice(0, 3),
  supersededBy: { number: 'C-2026-0091', issuedAt: '2026-11-28T10:00:00.000Z' },
});

/** Machine 7: came in stripped, so no core test before; next to nothing else on record. */
export const certificate7 = (paperSize: PaperSize = 'A4'): CertificateModel => ({
  ...common(paperSize),
  number: 'C-2026-0094',
  customer: { name: 'Murgen Paperboard', contactName: '', addressLines: [], taxNumber: '' },
  machine: { description: '75 kW 6-pole pulper motor', nameplate: null },
  coreBefore: null,
  coreAfter: only7,
  missingBefore: {
    reason: 'came-in-stripped',
    words: 'Stripped by another shop; oven and temperature not known.',
    askedBy: 'Jonas Reber',
    askedAt: '2026-11-18T07:10:00.000Z',
    countersignature: signature('countersigned', 'Hanne Ruoff', 'manager', '2026-11-18T07:40:00.000Z', 'cc01d4e5a0b93f22aa01'),
  },
  signatures: SIGNATURES.slice(0, 1),
});
