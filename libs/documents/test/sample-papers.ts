import type { Nameplate } from '@shared/machines';
import type { AcknowledgementModel, DeliveryNoteModel, InvoiceModel, MoneyLineOnPaper, PaperModel, PaperSize, QuoteModel, ReceiptModel, ShopOnPaper, TagModel } from '../src/index.js';

/** Papers of the invented shop, one of each kind, for the specs. */
export const SHOP: ShopOnPaper = {
  name: 'Ambach Rewinding Works',
  addressLines: ['Mühlkanalstraße 14', '94999 Ambach', 'Germany'],
  phone: '+49 9999 4150',
  email: 'office@ambach.example',
  website: 'ambach.example',
  taxNumber: 'DE 000 111 222',
  registration: 'Register court Ambach, HRB 0000',
};

export const PLATE: Nameplate = {
  kind: 'induction',
  maker: 'Łódź Silniki',
  model: 'SG 225S-4',
  serial: 'A-22/4471-Ω',
  ratedPowerW: 37_000,
  ratedVoltageV: 400,
  connection: 'delta',
  ratedFrequencyHz: 50,
  ratedSpeedRpm: 1478,
  ratedCurrentA: 67,
  poles: 4,
  powerFactor: 0.86,
  efficiencyPercent: 92.7,
  frame: '225S',
  mounting: 'B3',
  enclosure: 'TEFC',
  ingressProtection: 'IP55',
  thermalClass: 'F',
  duty: 'S1',
  bearingDriveEnd: '6313',
  bearingNonDriveEnd: '6312',
  explosiveAtmosphere: false,
};

export const base = (paperSize: PaperSize = 'A4') => ({ edition: 1, issuedAt: '2026-11-27T13:05:00.000Z', timeZone: 'Europe/Berlin', paperSize, units: paperSize === 'A4' ? 'si' : 'inch-pound', shop: SHOP }) as const;

export const JOB = {
  job: { number: 'J-2026-0112', customerReference: 'PO 4500017733' },
  customer: { name: 'Corvel Plastics', contactName: 'Irena Młynarska', addressLines: ['Industriestraße 8', '94998 Corvel'], taxNumber: 'DE 000 222 333' },
  machine: { description: '37 kW 4-pole extruder motor', nameplate: PLATE },
} as const;

const line = (description: string, quantityThousandths: number, unit: string, unitPriceMinor: number, taxRateBasisPoints: number): MoneyLineOnPaper => {
  const netMinor = Math.round((quantityThousandths * unitPriceMinor) / 1000);
  return { description, quantityThousandths, unit, unitPriceMinor, taxRateBasisPoints, netMinor, taxMinor: Math.round((netMinor * taxRateBasisPoints) / 10_000) };
};

export function sums(lines: readonly MoneyLineOnPaper[], currency = 'EUR') {
  const total = (of: readonly MoneyLineOnPaper[], key: 'netMinor' | 'taxMinor') => of.reduce((sum, l) => sum + l[key], 0);
  const rates = [...new Set(lines.map((l) => l.taxRateBasisPoints))].sort((a, b) => b - a);
  const taxSummary = rates.map((taxRateBasisPoints) => {
    const of = lines.filter((l) => l.taxRateBasisPoints === taxRateBasisPoints);
    return { taxRateBasisPoints, netMinor: total(of, 'netMinor'), taxMinor: total(of, 'taxMinor') };
  });
  const netMinor = total(lines, 'netMinor');
  const taxMinor = total(lines, 'taxMinor');
  return { currency, lines, taxSummary, netMinor, taxMinor, grossMinor: netMinor + taxMinor };
}

export const LINES: readonly MoneyLineOnPaper[] = [
  line('Strip, burnout in oven O2 and clean', 6500, 'h', 7800, 1900),
  line('Core test before and after, ring flux at 1.32 T, with certificate', 1000, '', 29_000, 1900),
  line('Rewind: lap two-layer, 48 coils, 12 turns, wire 4 × 1.06 mm grade 2, insulation class F, with leads and lacing', 1000, 'set', 186_450, 1900),
  line('Bearings 6313 C3 and 6312 C3', 2000, 'pcs', 8790, 1900),
  line('Printed manual', 1000, '', 1850, 700),
  line('Transport, outside the country', 1000, '', 24_000, 0),
];
export const manyLines = (count: number) => Array.from({ length: count }, (_, index) => line(`Position ${index + 1}: bearing housing sleeved and bored, with the fit measured in three places`, 1250, 'h', 6400, index % 2 ? 1900 : 700));

export const invoice = (paperSize: PaperSize = 'A4', lines = LINES, currency = 'EUR'): InvoiceModel => ({
  ...base(paperSize),
  ...JOB,
  ...sums(lines, currency),
  kind: 'invoice',
  number: 'I-2026-0098',
  quoteNumber: 'Q-2026-0120',
  approval: 'by phone, Irena Młynarska, 14 November 2026',
  purchaseOrder: '4500017733',
  suppliedOn: '2026-11-25',
  dueOn: '2026-12-27',
  terms: '30 days net',
  paymentReference: 'I-2026-0098',
  bank: { accountHolder: 'Ambach Rewinding Works', iban: 'DE00 1234 5678 9012 3456 78', bic: 'AMBADE00XXX', bankName: 'Sparkasse Ambach' },
  payUrl: 'https://ambach.example/pay/I-2026-0098',
  note: '',
});
export const quote = (paperSize: PaperSize = 'A4'): QuoteModel => ({
  ...base(paperSize),
  ...JOB,
  ...sums(LINES),
  kind: 'quote',
  number: 'Q-2026-0120',
  revision: 2,
  validUntil: '2026-12-15',
  note: 'Delivery about nine working days after your approval. Should the core not conform after burnout, we ask before going on.',
  answerUrl: 'https://ambach.example/portal/quotes/Q-2026-0120',
});
export const receipt = (paperSize: PaperSize = 'A4'): ReceiptModel => ({
  ...base(paperSize),
  ...JOB,
  kind: 'receipt',
  number: 'R-2026-0077',
  invoiceNumber: 'I-2026-0098',
  currency: 'EUR',
  payment: { kind: 'card', amountMinor: 300_000, receivedAt: '2026-12-01T09:12:00.000Z', reference: 'card ending 4242', recordedBy: '' },
  invoiceGrossMinor: 363_619,
  paidMinor: 300_000,
  balanceMinor: 63_619,
});
export const tag = (): TagModel => ({
  ...base(),
  kind: 'tag',
  number: 'J-2026-0112',
  jobNumber: 'J-2026-0112',
  customerName: 'Corvel Plastics',
  machineDescription: '37 kW 4-pole extruder motor, frame 225S',
  serial: 'A-22/4471-Ω',
  route: 'rewind',
  step: 'received',
  receivedAt: '2026-11-10T08:00:00.000Z',
  promisedOn: '2026-12-04',
  part: 'Stator',
  jobUrl: 'https://ambach.example/jobs/01jd8zkq3v5m',
  caution: 'Asbestos suspected',
});
export const acknowledgement = (paperSize: PaperSize = 'A4'): AcknowledgementModel => ({
  ...base(paperSize),
  ...JOB,
  kind: 'acknowledgement',
  number: 'J-2026-0112',
  route: 'rewind',
  receivedAt: '2026-11-10T08:00:00.000Z',
  receivedBy: 'Petra Sand',
  complaint: 'Trips after ten minutes, smells burnt. Ran on one phase last week, the operator thinks.',
  accessories: 'Half coupling, terminal box lid, two feet bolts',
  contamination: 'oil-or-grease',
  contaminationWords: 'hydraulic oil',
  promisedOn: '2026-12-04',
  jobUrl: 'https://ambach.example/portal/jobs/01jd8zkq3v5m',
  conditions: 'Machines not collected within three months after notice are stored at the owner’s cost.',
});
export const deliveryNote = (paperSize: PaperSize = 'A4'): DeliveryNoteModel => ({
  ...base(paperSize),
  ...JOB,
  kind: 'delivery-note',
  number: 'D-2026-0055',
  items: [
    { description: '37 kW 4-pole extruder motor, rewound', quantity: '1', remark: 'on pallet, 310 kg' },
    { description: 'Half coupling', quantity: '1', remark: '' },
  ],
  releasedAt: '2026-11-27T13:05:00.000Z',
  releasedBy: 'Hanne Ruoff',
  collectedBy: '',
  certificateNumber: 'C-2026-0088',
  remark: '',
});

export const plainPapers = (paperSize: PaperSize): readonly PaperModel[] => [quote(paperSize), invoice(paperSize), receipt(paperSize), acknowledgement(paperSize), tag(), deliveryNote(paperSize)];
