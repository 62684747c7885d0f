import { DEFAULT_CORE_LIMITS } from '@libs/core-loss';
import { DEFAULT_MACHINE_TEST_LIMITS } from '@libs/machine-tests';
import type { BayView } from '@shared/instruments';
import type { JobSheet } from '@shared/jobs';
import { DEFAULT_BURNOUT_LIMITS, type LimitsSet } from '@shared/limits';
import type { RecordView } from '@shared/records';
import { permissionsOf } from '@shared/roles';
import type { Me } from '@shared/session';
import type { TestContext } from './test-form.js';

/** The quarry motor of the invented sample shop: 200 kW, four poles, 400 V delta, frame 315L. */
export const QUARRY_JOB: JobSheet = {
  id: 'job-0001',
  number: 'J-0001',
  route: 'rewind',
  step: 'final-test',
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
  customer: { id: 'cust-0001', name: 'Steinmar Quarry & Lime', contactName: '', email: 'works@steinmar.example', phone: '', addressLine1: '', addressLine2: '', postcode: '', city: '', country: 'DE', taxNumber: '', terms: 'account', netDays: 30, creditStop: false, version: 1 },
  machine: {
    id: 'mach-0001',
    customerId: 'cust-0001',
    customerName: 'Steinmar Quarry & Lime',
    description: '200 kW 4-pole crusher motor',
    nameplate: {
      kind: 'induction',
      maker: '',
      model: '',
      serial: '',
      ratedPowerW: 200e3,
      ratedVoltageV: 400,
      connection: 'delta',
      ratedFrequencyHz: 50,
      ratedSpeedRpm: 1488,
      ratedCurrentA: 346,
      poles: 4,
      powerFactor: 0.87,
      efficiencyPercent: 95.8,
      frame: '315L',
      mounting: 'B3',
      enclosure: 'TEFC',
      ingressProtection: '',
      thermalClass: 'F',
      duty: 'S1',
      bearingDriveEnd: '6319',
      bearingNonDriveEnd: '6319',
      explosiveAtmosphere: false,
    },
    coreGeometry: null,
    version: 1,
    visits: [],
  },
  gates: [],
  next: null,
  signOffs: [],
  attachments: [],
  papers: [],
};

export const LIMITS: LimitsSet = { core: DEFAULT_CORE_LIMITS, machine: DEFAULT_MACHINE_TEST_LIMITS, burnout: DEFAULT_BURNOUT_LIMITS };
export const CONTEXT: TestContext = { job: QUARRY_JOB, records: [], limits: LIMITS, system: 'si' };

const meter = (id: string, kind: BayView['instruments'][number]['kind'], standing: BayView['instruments'][number]['standing'] = 'in-calibration'): BayView['instruments'][number] => ({
  id,
  tag: id.toUpperCase(),
  kind,
  description: '',
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
export const BAY: BayView = {
  supplies: [],
  cables: [],
  ovens: [],
  instruments: [
    meter('i-01', 'insulation-tester'),
    meter('m-01', 'micro-ohmmeter'),
    meter('h-01', 'high-potential-tester'),
    meter('s-01', 'surge-tester', 'overdue'),
    meter('b-01', 'vibration-meter'),
    meter('w-01', 'wattmeter', 'due-soon'),
    meter('v-01', 'voltmeter'),
    meter('a-01', 'ammeter'),
    meter('t-01', 'thermometer'),
  ],
};

export const TECHNICIAN: Me = {
  id: 'user-0003',
  name: 'Jonas Wirth',
  email: 'jonas@shop.example',
  roles: ['technician'],
  permissions: permissionsOf(['technician']),
  customerId: null,
  preferences: { units: 'si', theme: 'light' },
  shop: { name: 'Kupferring Rewind Works', timeZone: 'Europe/Berlin', currency: 'EUR', demo: true, mailboxUrl: null },
};

export const keptRecord = (change: Partial<RecordView> & Pick<RecordView, 'id' | 'kind'>): RecordView => ({
  jobId: QUARRY_JOB.id,
  ordinal: 1,
  revision: 1,
  verdict: 'conforms',
  readings: {},
  entered: {},
  result: {},
  calculation: 'machine-tests/1',
  limitsVersion: 1,
  instruments: [],
  reason: '',
  by: 'Jonas Wirth',
  at: '2026-03-28T09:12:00.000Z',
  contentHash: 'a'.repeat(64),
  version: 1,
  ...change,
});
