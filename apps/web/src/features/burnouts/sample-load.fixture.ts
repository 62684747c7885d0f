import type { LoadChannel, LoadView, WaitingJob } from '@shared/burnouts';

type Read = Extract<LoadChannel, { outcome: 'read' }>;

const channel = (more: Partial<Read>): Read => ({
  outcome: 'read',
  name: 'Core',
  unit: 'C',
  samples: 601,
  emptyCells: 0,
  onPart: true,
  peakC: 446,
  peakAt: { minute: 400, clock: '2026-11-09 08:40:00', line: 402 },
  minutesAbove: [{ limitC: 345, minutes: 210, unknownMinutes: 0 }, { limitC: 370, minutes: 182, unknownMinutes: 0 }],
  rampKPerH: 110,
  coolKPerH: 48,
  gaps: [],
  gapCount: 0,
  gapMinutes: 0,
  curve: [[0, 20], [300, 345], [400, 446], [510, 345], [900, 60]],
  ...more,
});

/** The overheated load of the sample shop, with a second job in it. */
export const overheated: LoadView = {
  id: '01a1c1e5-load-0003',
  number: 3,
  ovenId: 'O2',
  ovenName: 'O2',
  day: '2026-11-09',
  limitC: 370,
  limitReason: 'unknown',
  limitSource: 'ANSI/EASA AR100-2015 clause 3.3 (core plate)',
  limitStanding: 'to be confirmed',
  fileName: 'night.csv',
  peakC: 446,
  hottest: 'Core',
  minutesAboveLimit: 182.4,
  minutesAbove345C: 210.2,
  verdict: 'does-not-conform',
  reasons: [{ code: 'over-limit', channel: 'Core', peakC: 446, overK: 76 }],
  by: 'Jonas Feldt',
  createdAt: '2026-11-09T19:00:00.000Z',
  version: 2,
  remark: '',
  offsetK: 0,
  jobs: [
    { jobId: 'job-0000004', number: 'J2026-0004', machine: 'gang saw motor', customer: 'Fennholt Sawmills', ringsOff: false, limitC: 370, limitReason: 'unknown', overK: 76, limitChanged: false },
    { jobId: 'job-0000005', number: 'J2026-0005', machine: 'fan motor', customer: 'Lindhof', ringsOff: false, limitC: 450, limitReason: 'inorganic', overK: -4, limitChanged: true },
  ],
  file: {
    name: 'night.csv',
    sizeBytes: 33_000,
    sha256: 'a'.repeat(64),
    readAt: '2026-11-09T19:00:00.000Z',
    rows: 601,
    minutes: 900,
    startClock: '2026-11-09 02:00:00',
    endClock: '2026-11-09 17:00:00',
    stepS: 60,
    separator: ';',
    decimalMark: ',',
    channels: [channel({}), channel({ name: 'Oven air', onPart: false, peakC: 470 }), { outcome: 'no-readings', name: 'T.3', unit: 'C', samples: 0, emptyCells: 601, onPart: true }],
    problems: [{ code: 'text-in-number', line: 242, channel: 'Core', message: 'Line 242, Core: "open" is no temperature.' }],
    problemCount: 1,
  },
};

export const beforeItsFile: LoadView = { ...overheated, version: 1, fileName: null, peakC: null, hottest: null, minutesAboveLimit: null, minutesAbove345C: null, verdict: null, reasons: [], file: null, jobs: overheated.jobs.map((j) => ({ ...j, overK: null, limitChanged: false })) };

export const waiting: readonly WaitingJob[] = [
  { jobId: 'job-0000004', number: 'J2026-0004', machine: 'gang saw motor (FS-1184)', customer: 'Fennholt Sawmills', step: 'strip-and-burnout', onHold: false, own: { limitC: 370, limitReason: 'unknown' }, rings: false, loads: [] },
  { jobId: 'job-0000010', number: 'J2026-0010', machine: 'separator motor', customer: 'Senngrund Dairy', step: 'strip-and-burnout', onHold: false, own: { limitC: 300, limitReason: 'aluminium' }, rings: false, loads: [] },
  { jobId: 'job-0000011', number: 'J2026-0011', machine: 'hoist motor', customer: 'Hafenkran', step: 'core-test-after', onHold: true, own: { limitC: 370, limitReason: 'unknown' }, rings: true, loads: [2] },
];
