import { DEFAULT_CORE_LIMITS, evaluateCoreTest, type CoreGeometry, type CoreTestInput } from '@libs/core-loss';
import { DEFAULT_MACHINE_TEST_LIMITS } from '@libs/machine-tests';
import type { CoreTestReadings } from '@shared/core-tests';
import type { BayView } from '@shared/instruments';
import type { JobSheet } from '@shared/jobs';
import { DEFAULT_BURNOUT_LIMITS, type LimitsSet } from '@shared/limits';
import type { RecordView } from '@shared/records';
import type { Me } from '@shared/session';
import { permissionsOf } from '@shared/roles';

/** Two motors of the invented sample shop, for specs: a 37 kW one that stays inconclusive and a 90 kW one burnt by its oven. */
const stator = (od: number, bore: number, depth: number, slots: number, stack: number): CoreGeometry => ({
  kind: 'stator',
  outerDiameterM: od / 1000,
  innerDiameterM: bore / 1000,
  slotDepthM: depth / 1000,
  slots,
  stackLengthM: stack / 1000,
  ducts: 0,
  ductWidthM: 0,
  stackingFactor: 0.95,
  densityKgPerM3: 7700,
});
const CORES = { 12: stator(340, 218, 28, 48, 220), 2: stator(445, 280, 38, 60, 290) } as const;
const NAMES = { 12: '37 kW 4-pole extruder motor', 2: '90 kW 4-pole saw motor' } as const;
export type SampleMachine = keyof typeof CORES;

export const METER_IDS = { voltmeterId: 'inst-v-01', ammeterId: 'inst-a-01', wattmeterId: 'inst-w-01', thermometerId: 'inst-t-01' } as const;
const BEFORE = {
  12: { excitingTurns: 16, searchTurns: 4, searchVoltsV: 8.096, excitingA: 26.5, wattsW: 40.01, ambientC: 21, startC: 21, meanC: 27.2, hottestC: 31 },
  2: { excitingTurns: 24, searchTurns: 4, searchVoltsV: 14.38, excitingA: 22, wattsW: 67.7, ambientC: 20, startC: 20, meanC: 26.8, hottestC: 30.8 },
} as const;

export function sampleBefore(machine: SampleMachine): CoreTestReadings {
  const { excitingTurns, searchTurns, searchVoltsV, excitingA, wattsW, ambientC, startC, meanC, hottestC } = BEFORE[machine];
  return {
    geometry: CORES[machine],
    target: { basis: 'standard', fluxDensityT: 1.32 },
    frame: { state: 'in-frame', material: 'cast-iron' },
    cablePath: 'over-frame',
    massBasis: 'back-iron',
    reading: { excitingTurns, searchTurns, searchVoltsV, voltmeter: 'average', excitingA, wattsW, wattmeterLead: 'search', frequencyHz: 50 },
    temperatures: { ambientC, startC, meanC, hottestC, hottestSlot: 7, minutes: 20 },
    instruments: { ...METER_IDS, wattmeterRange: '1 A / 30 V', clampMeter: false },
    checks: { rotorOut: true, leadsOpen: true, parallelsOpened: true, onePointEarthed: true, throughBoltsMeasured: true, boreClear: true, barrierUp: true },
    setup: { supplyId: 's1', cableId: 'c10', parallelCables: 1 },
    remark: '',
  };
}

export function keptTest(kind: 'core-test-before' | 'core-test-after', readings: CoreTestReadings, before?: CoreTestReadings, id = `rec-${kind}`): RecordView {
  const { setup: _setup, remark: _remark, ...rest } = readings;
  const phase = kind === 'core-test-before' ? 'before' : 'after';
  const input: CoreTestInput = { phase, ...rest };
  const held = before ? { input: inputBefore(before), result: evaluateCoreTest(inputBefore(before), DEFAULT_CORE_LIMITS) } : undefined;
  const result = evaluateCoreTest(input, DEFAULT_CORE_LIMITS, held);
  return {
    id,
    jobId: 'job-0012',
    kind,
    ordinal: 1,
    revision: 1,
    verdict: result.verdict,
    readings: readings as unknown as Record<string, unknown>,
    entered: {},
    result: result as unknown as Record<string, unknown>,
    calculation: result.calculation,
    limitsVersion: 1,
    instruments: [],
    reason: '',
    by: 'Jonas Wirth',
    at: '2026-03-18T09:12:00.000Z',
    contentHash: 'a'.repeat(64),
    version: 1,
  };
}
function inputBefore(readings: CoreTestReadings): CoreTestInput {
  const { setup: _setup, remark: _remark, ...rest } = readings;
  return { phase: 'before', ...rest };
}

export const SAMPLE_LIMITS: LimitsSet = { core: DEFAULT_CORE_LIMITS, machine: DEFAULT_MACHINE_TEST_LIMITS, burnout: DEFAULT_BURNOUT_LIMITS };

const meter = (id: string, tag: string, kind: BayView['instruments'][number]['kind'], description: string, standing: BayView['instruments'][number]['standing'] = 'in-calibration') => ({
  id,
  tag,
  kind,
  description,
  serial: '',
  percentOfReading: 0.5,
  percentOfRange: 0.2,
  rangeText: '',
  calibratedOn: '2025-11-04',
  dueOn: '2026-11-04',
  certificateNumber: 'K-2231',
  version: 1,
  standing,
});
/** The bay of the sample shop: one variable transformer, two drums of cable, two ovens. */
export const SAMPLE_BAY: BayView = {
  supplies: [{ id: 's1', name: 'S1', kind: 'variable', minVoltsV: 0, maxVoltsV: 260, maxAmpsA: 40, frequencyHz: 50 }],
  cables: [
    { id: 'c10', name: '10 mm²', crossSectionM2: 10e-6, lengthM: 35, maxAmpsA: 60 },
    { id: 'c25', name: '25 mm²', crossSectionM2: 25e-6, lengthM: 60, maxAmpsA: 110 },
  ],
  ovens: [
    { id: 'o1', name: 'O1', remark: '' },
    { id: 'o2', name: 'O2', remark: 'sensor looked at' },
  ],
  instruments: [
    meter('inst-v-01', 'V-01', 'voltmeter', 'average-sensing, bench'),
    meter('inst-a-01', 'A-01', 'ammeter', 'with transformer 50/1'),
    meter('inst-w-01', 'W-01', 'wattmeter', 'low power factor', 'due-soon'),
    meter('inst-t-01', 'T-01', 'thermometer', 'contact probe'),
    meter('inst-i-01', 'I-01', 'insulation-tester', '500 to 5000 V'),
    meter('inst-m-01', 'M-01', 'micro-ohmmeter', 'four-wire'),
    meter('inst-h-01', 'H-01', 'high-potential-tester', '0 to 5 kV AC'),
    meter('inst-s-01', 'S-01', 'surge-tester', '4 kV', 'overdue'),
    meter('inst-b-01', 'B-01', 'vibration-meter', '10 to 1000 Hz'),
  ],
};

export function sampleJob(machine: SampleMachine, change: Partial<JobSheet> = {}): JobSheet {
  return {
    id: 'job-0012',
    number: `J-00${machine}`,
    route: 'rewind',
    step: 'core-test-after',
    state: 'open',
    holdReason: null,
    waitingFor: null,
    complaint: 'Tripped on earth fault.',
    accessories: '',
    contamination: 'none',
    contaminationWords: '',
    customerReference: '',
    promisedOn: '2026-04-02',
    receivedAt: '2026-03-14T07:30:00.000Z',
    warrantyOf: null,
    limitsVersion: 1,
    version: 4,
    customer: { id: 'cust-0012', name: machine === 12 ? 'Corvel Plastics' : 'Fennholt Sawmills', contactName: '', email: 'works@corvel.example', phone: '', addressLine1: '', addressLine2: '', postcode: '', city: '', country: 'DE', taxNumber: '', terms: 'account', netDays: 30, creditStop: false, version: 1 },
    machine: {
      id: 'mach-0012',
      customerId: 'cust-0012',
      customerName: machine === 12 ? 'Corvel Plastics' : 'Fennholt Sawmills',
      description: NAMES[machine],
      nameplate: {
        kind: 'induction',
        maker: '',
        model: '',
        serial: '',
        ratedPowerW: machine === 12 ? 37e3 : 90e3,
        ratedVoltageV: 400,
        connection: 'delta',
        ratedFrequencyHz: 50,
        ratedSpeedRpm: machine === 12 ? 1478 : 1485,
        ratedCurrentA: machine === 12 ? 67 : 160,
        poles: 4,
        powerFactor: 0.86,
        efficiencyPercent: 92.7,
        frame: machine === 12 ? '225S' : '280M',
        mounting: 'B3',
        enclosure: 'TEFC',
        ingressProtection: '',
        thermalClass: 'F',
        duty: 'S1',
        bearingDriveEnd: '6313',
        bearingNonDriveEnd: '6312',
        explosiveAtmosphere: false,
      },
      coreGeometry: CORES[machine],
      version: 1,
      visits: [],
    },
    gates: [
      { gate: 'strip-may-start', open: true, before: 'strip-and-burnout', conditions: [] },
      { gate: 'rewind-may-start', open: false, before: 'rewind', conditions: [] },
    ],
    next: { step: 'rewind', open: false, conditions: [] },
    signOffs: [],
    attachments: [],
    papers: [],
    ...change,
  };
}

export const SAMPLE_TECHNICIAN: Me = {
  id: 'user-0003',
  name: 'Jonas Wirth',
  email: 'jonas@shop.example',
  roles: ['technician'],
  permissions: permissionsOf(['technician']),
  customerId: null,
  preferences: { units: 'si', theme: 'light' },
  shop: { name: 'Wickelwerk Sennhof', timeZone: 'Europe/Berlin', currency: 'EUR', demo: true, mailboxUrl: null },
};
