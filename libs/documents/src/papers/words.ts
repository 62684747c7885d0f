import type { CONTAMINATIONS } from '@shared/jobs';
import type { Nameplate } from '@shared/machines';
import type { Route, Step } from '@shared/route';
import type { WAIVER_REASONS } from '@shared/waivers';
import type { SignatureOnPaper, StatementOnPaper, VerdictOnPaper } from './certificate-model.js';

/** The words of all papers in one place; layouts hold none of their own. */
export const VERDICT_WORDS: Record<VerdictOnPaper, string> = {
  conforms: 'conforms',
  'does-not-conform': 'does not conform',
  inconclusive: 'inconclusive',
  'not-valid': 'not valid',
  'shown-not-judged': 'shown, not judged',
};

export const ROUTE_WORDS: Record<Route, string> = {
  rewind: 'Rewind',
  recondition: 'Recondition',
  'core-test-only': 'Core test only',
  'coil-rewind': 'Coil rewind',
};

export const STEP_WORDS: Record<Step, string> = {
  received: 'Received',
  'incoming-test': 'Incoming test',
  dismantled: 'Dismantled',
  'core-test-before': 'Core test before',
  'awaiting-approval': 'Awaiting approval',
  'strip-and-burnout': 'Strip and burnout',
  'core-test-after': 'Core test after',
  rewind: 'Rewind',
  'before-varnish-test': 'Before-varnish test',
  treatment: 'Treatment',
  assembly: 'Assembly',
  'final-test': 'Final test',
  ready: 'Ready',
  released: 'Released',
};

export const MACHINE_KIND_WORDS: Record<Nameplate['kind'], string> = {
  induction: 'induction motor',
  'slip-ring': 'slip-ring motor',
  synchronous: 'synchronous machine',
  dc: 'DC machine',
  'ac-magnet': 'AC magnet',
  'core-only': 'core only',
};

export const CONNECTION_WORDS: Record<Nameplate['connection'], string> = { star: 'star', delta: 'delta', single: 'single-phase', dc: 'DC', unknown: 'connection not known' };

export const CONTAMINATION_WORDS: Record<(typeof CONTAMINATIONS)[number], string> = {
  none: 'none declared',
  'oil-or-grease': 'oil or grease',
  coolant: 'coolant',
  chemicals: 'chemicals',
  food: 'food',
  sewage: 'sewage',
  'asbestos-suspected': 'asbestos suspected',
  other: 'other',
};

export const WAIVER_WORDS: Record<(typeof WAIVER_REASONS)[number], string> = {
  'came-in-stripped': 'the machine came in stripped',
  'earth-fault': 'an earth fault of the winding forbade the test',
  'supply-too-small': 'the supply was too small for this core',
  'below-size-rule': 'the machine is below the size for which a ring test is made',
};

export const SIGNATURE_WORDS: Record<SignatureOnPaper['act'], string> = { tested: 'Tested by', released: 'Released by', countersigned: 'Countersigned by', conceded: 'Concession signed by' };

export const STATEMENT_WORDS: Record<StatementOnPaper['kind'], string> = {
  concession: 'Concession',
  'inconclusive-release': 'Released although inconclusive',
  decision: 'Customer’s decision',
};

export const FRAME_WORDS = { bare: 'bare core', 'in-frame': 'in its frame' } as const;
export const FRAME_MATERIAL_WORDS = { 'cast-iron': 'cast iron', steel: 'steel', aluminium: 'aluminium', none: '' } as const;
export const CABLE_PATH_WORDS = {
  'bore-and-outside': 'through the bore and round the outside',
  'over-frame': 'through the bore and over the frame',
  'under-ribs': 'through the bore and under the frame ribs',
  'through-spider': 'through the spider',
  'through-shaft': 'through the hollow shaft',
  'through-vents': 'through the axial vents',
} as const;
export const VOLTMETER_WORDS = { average: 'average-sensing, rms-scaled', 'true-rms': 'true rms' } as const;
export const WATTMETER_LEAD_WORDS = { search: 'on the search coil', exciting: 'on the exciting terminals' } as const;
export const TARGET_WORDS = { standard: 'standard level', winding: 'the winding’s operating flux', supply: 'the most this supply reaches' } as const;
export const JUDGED_WORDS = { increase: 'Increase of core loss', fall: 'Fall of core loss', 'hot-spot': 'Hot spot over mean', absolute: 'Core loss, absolute' } as const;
/** S a standard carries it, P common practice, C the customer's contract. */
export const STANDING_WORDS: Readonly<Record<string, string>> = { S: 'standard', P: 'common practice', C: 'customer’s specification', M: 'from memory of the standard' };
export const CONFIRMED_BY = (name: string, role: string, at: string, hash: string) => `Signed: ${name}, ${role}, ${at}, content ${hash}`;
export const DECISION_RULE_WORDS = {
  ask: 'an inconclusive result asks for a repeat or a manager’s signed release',
  accept: 'an inconclusive result is accepted',
  refuse: 'an inconclusive result is refused',
} as const;
export const PAYMENT_WORDS = { card: 'Card', 'bank-transfer': 'Bank transfer', cash: 'Cash' } as const;

export const COMMON = {
  page: (page: number, pages: number) => `Page ${page} of ${pages}`,
  telephone: 'Tel.',
  taxNumber: 'Tax number',
  job: 'Job',
  customer: 'Customer',
  machine: 'Machine',
  serial: 'Serial',
  yourReference: 'Your reference',
  nameplate: 'Nameplate',
  notRead: 'not read',
  none: '—',
  received: 'Received',
  issued: 'Issued',
  replacedCharacters: 'A mark “\ufffd” stands for a character this paper’s font does not have.',
} as const;

export const PLATE = {
  kind: 'Kind',
  maker: 'Maker, type',
  rating: 'Rating',
  current: 'Current',
  poles: 'Poles',
  powerFactor: 'Power factor',
  efficiency: 'Efficiency',
  frame: 'Frame, mounting',
  enclosure: 'Enclosure',
  duty: 'Class, duty',
  bearings: 'Bearings',
  driveEnd: 'DE',
  nonDriveEnd: 'NDE',
  explosive: 'Explosive area',
  explosiveYes: 'yes: not redesigned, with a record of its own',
} as const;

export const MONEY = {
  quote: 'Quote',
  invoice: 'Invoice',
  receipt: 'Receipt',
  revision: (revision: number) => `revision ${revision}`,
  quoteDate: 'Date',
  validUntil: 'Valid until',
  invoiceDate: 'Invoice date',
  suppliedOn: 'Day of supply',
  dueOn: 'Due',
  quoteNumber: 'Quote',
  purchaseOrder: 'Purchase order',
  approval: 'Approved',
  line: 'No.',
  description: 'Description',
  quantity: 'Quantity',
  unitPrice: 'Unit price',
  rate: 'Rate',
  tax: 'Tax',
  net: 'Net',
  netTotal: 'Net total',
  taxOn: (rate: string, net: string) => `Tax ${rate} on ${net}`,
  total: 'Total',
  totalDue: 'Total due',
  allIn: (currency: string) => `All amounts in ${currency}. Tax is computed on each line by its own rate and rounded half away from zero; the sums are those of the lines.`,
  payment: 'Payment',
  pay: (amount: string, due: string) => `Please pay ${amount} by ${due}.`,
  nothingToPay: 'Nothing is to be paid on this invoice.',
  terms: 'Terms',
  reference: 'Payment reference',
  account: 'Account',
  iban: 'IBAN',
  bic: 'BIC',
  bank: 'Bank',
  payOnline: 'Pay by card',
  toAnswer: 'To approve or decline, open',
  answerByPaper: 'To approve this quote, sign and return it, send a purchase order, or call us.',
  approvedBy: 'Name, date and signature',
  quoteMeans: 'Work beyond this quote is not begun without your word. Prices hold until the day named above.',
  receivedFrom: 'Received from',
  receivedOn: 'Received on',
  how: 'Paid by',
  paymentNote: 'Reference',
  recordedBy: 'Recorded by',
  forInvoice: 'For invoice',
  invoiceTotal: 'Invoice total',
  paidSoFar: 'Paid so far, this payment included',
  balance: 'Still open',
  paidInFull: 'Paid in full. Thank you.',
  overpaid: 'Overpaid',
} as const;

export const COUNTER = {
  acknowledgement: 'Received for repair',
  acknowledgementLead: (name: string) => `We have taken in the machine below for ${name}.`,
  complaint: 'What is wrong',
  accessories: 'What came with it',
  contamination: 'Contamination',
  promised: 'Promised for',
  noPromise: 'a date follows with the quote',
  route: 'Work',
  receivedBy: 'Taken in by',
  follow: 'Follow the job',
  conditions: 'Conditions',
  handedOver: 'Handed over by (name and signature)',
  takenIn: 'Taken in for the shop',
  tagPromise: 'PROMISED',
  tagNoPromise: 'no date yet',
  tagSerial: 'S/N',
  deliveryNote: 'Delivery note',
  item: 'Item',
  remark: 'Remark',
  releasedBy: 'Released by',
  certificate: 'Certificate',
  collected: 'Received in good order (name, date, signature)',
  handed: 'Handed out for the shop',
} as const;

export const CERTIFICATE = {
  title: 'Test certificate',
  subtitle: 'Core, winding and final test of a repaired machine',
  number: 'Certificate',
  check: 'Check this certificate',
  code: 'Code',
  replaces: (number: string, day: string) => `Replaces certificate ${number} of ${day}.`,
  superseded: (number: string, day: string) => `Superseded by certificate ${number} of ${day}. This issue is no longer in force.`,
  reason: 'Reason',
  coreTest: 'Core test',
  increaseNotEstablished: 'increase not established',
  increase: 'Increase of core loss',
  notEstablished: 'increase not established',
  notComparable: 'the two tests cannot be compared',
  notMade: 'not part of this certificate',
  conforming: (good: number, all: number) => `${good} of ${all} judged tests conform`,
  increaseInterval: (low: string, high: string) => `between ${low} and ${high}`,
  judged: 'Judged',
  measured: 'Measured',
  limit: 'Limit',
  verdict: 'Verdict',
  source: 'Source and standing',
  readings: 'Readings and results of the core tests',
  quantity: 'Quantity',
  geometry: 'Core',
  burnout: 'Burnout and strip',
  winding: 'Winding',
  item: 'Item',
  asFound: 'as found',
  asWound: 'as wound',
  finalTests: 'Tests of the finished machine',
  test: 'Test',
  reading: 'Reading',
  instruments: 'Instruments',
  instrument: 'Instrument',
  use: 'Used for',
  calibrated: 'Calibrated',
  due: 'Due',
  noCalibration: 'no calibration recorded',
  missingBefore: 'No core test before',
  statements: 'Releases and concessions',
  signatures: 'Signatures',
  hash: 'signed content',
  remark: 'Remark',
  rule: 'How the verdicts were reached',
  uncertaintyStatement: (k: string) =>
    `Uncertainties are expanded uncertainties with coverage factor k = ${k}, about 95 % confidence. The increase is judged with its own interval, which is narrower than that of each test, since both share geometry and instruments.`,
  decisionRule: (rule: string) => `A result conforms or does not conform where its whole interval lies on one side of the limit; where the limit lies inside the interval it is inconclusive. By the rule of this shop ${rule}.`,
  limitsVersion: (version: number, day: string) => `Judged by acceptance limits version ${version} of ${day}.`,
  flux: 'A ring test loads the back iron only. It shows whether the sheets are still insulated from each other; it is not an efficiency test.',
  cautions: 'Results hold for this machine as tested on the days named. Local codes and a licensed or qualified person decide on installation and start.',
  times: (zone: string) => `Times in ${zone}.`,
} as const;

export const BURNOUT = {
  method: 'How and when',
  peak: 'Part peak',
  above: 'Time above',
  minutesAbove: (minutes: number, threshold: string) => `${minutes}\u00a0min above ${threshold}`,
} as const;

export const READINGS = {
  by: 'Tested by',
  frame: 'Core was',
  cablePath: 'Loop cable',
  target: 'Target flux',
  frequency: 'Frequency',
  turns: 'Turns, exciting / search',
  searchVolts: 'Search coil',
  formFactor: 'Form factor',
  amps: 'Exciting current',
  watts: 'Watts as read, voltage lead',
  cableLoss: 'Loss of the loop cable, taken off',
  flux: 'Flux density',
  excitingVolts: 'Volts on the exciting turns',
  coreWatts: 'Core loss',
  atFlux: 'per mass, at the flux measured',
  referred: 'per mass, at target flux ± U',
  kva: 'Apparent power',
  vaPerKg: 'per mass',
  powerFactor: 'Power factor',
  field: 'Field, rms',
  innerEdge: 'Flux at the inner edge, estimate',
  ambientAndStart: 'Ambient / core at start',
  minutes: 'Time at full flux',
  mean: 'Mean of the core',
  hottest: 'Hottest spot',
  slot: (slot: number) => `slot ${slot}`,
  hotSpot: 'Hot spot over mean',
  why: 'Not valid because',
  warnings: 'Noted',
  calculation: 'Calculation',
  sizeOfStator: 'Size of the stator core',
  sizeOfArmature: 'Size of the armature core',
  outerDiameter: 'Outside diameter',
  innerDiameter: 'Inside diameter',
  bore: 'Bore',
  slots: 'Slots',
  deep: 'deep',
  stack: 'Stack, ducts included',
  ducts: 'Radial ducts',
  noDucts: 'none',
  stacking: 'Stacking factor',
  density: 'Density',
  backIron: 'Depth of back iron',
  netLength: 'Net iron length',
  area: 'Area of back iron',
  path: 'Mean path',
  mass: 'Mass of back iron',
} as const;

export const DRAWINGS = {
  before: 'before',
  after: 'after',
  afterNumber: (number: number) => `after, ${number}`,
  turns: (turns: number, volts: string) => `${turns} ${turns === 1 ? 'turn' : 'turns'}, ${volts} each`,
} as const;
