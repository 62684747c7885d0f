/** The sample shop itself: its head of paper, its bay, its instruments. All invented. */
export const PROFILE = {
  name: 'Kupferring Rewind Works',
  addressLines: ['Am Schleusenhof 12', '99099 Kettwiede', 'Germany'],
  phone: '+49 361 0000 410',
  email: 'workshop@kupferring.example',
  taxNumber: 'DE000000410',
  website: 'kupferring.example',
  registration: 'Registered at Kettwiede, HRB 00410',
  bank: { accountHolder: 'Kupferring Rewind Works', iban: 'DE00 0000 0000 0000 0004 10', bic: 'XXXXDEXXXXX', bankName: 'Sample Bank' },
  paperSize: 'A4',
  conditions: 'Parts that are not collected are kept for three months after notice.',
  currency: 'EUR',
  defaultTaxRateBasisPoints: 1900,
  onePersonMayRelease: false,
} as const;

export const BAY = {
  supplies: [{ id: 's1', name: 'S1 variable transformer, single-phase', kind: 'variable', minVoltsV: 0, maxVoltsV: 260, maxAmpsA: 40, frequencyHz: 50 }],
  cables: [
    { id: 'c10', name: 'loop cable 10 mm²', crossSectionM2: 10e-6, lengthM: 35, maxAmpsA: 60 },
    { id: 'c25', name: 'loop cable 25 mm²', crossSectionM2: 25e-6, lengthM: 60, maxAmpsA: 110 },
  ],
  ovens: [
    { id: 'O1', name: 'O1', remark: 'part-temperature controlled' },
    { id: 'O2', name: 'O2', remark: 'control thermocouple checked after the overheated load' },
  ],
} as const;

/** Limits of error in percent of reading and of range; days until the next calibration counted from the seed date. */
export const INSTRUMENTS = [
  { tag: 'V-01', kind: 'voltmeter', description: 'average-sensing, rms-scaled', serial: 'V4410', percentOfReading: 0.2, percentOfRange: 0.05, rangeText: '0 to 30 V', dueInDays: 190, certificateNumber: 'K-26-0118' },
  { tag: 'A-01', kind: 'ammeter', description: 'with current transformer 50/5', serial: 'A2207', percentOfReading: 0.3, percentOfRange: 0.05, rangeText: '0 to 50 A', dueInDays: 190, certificateNumber: 'K-26-0119' },
  { tag: 'W-01', kind: 'wattmeter', description: 'low power factor', serial: 'W0932', percentOfReading: 0.3, percentOfRange: 0.1, rangeText: '0 to 600 W', dueInDays: 190, certificateNumber: 'K-26-0120' },
  { tag: 'T-01', kind: 'thermometer', description: 'thermal camera', serial: 'T5521', percentOfReading: 1, percentOfRange: 0, rangeText: '-20 to 250 °C', dueInDays: 24, certificateNumber: 'K-26-0077' },
  { tag: 'R-01', kind: 'insulation-tester', description: '500 / 1000 / 2500 / 5000 V', serial: 'R1180', percentOfReading: 5, percentOfRange: 0, rangeText: 'to 100 Gohm', dueInDays: 120, certificateNumber: 'K-26-0101' },
  { tag: 'M-01', kind: 'micro-ohmmeter', description: 'four-wire', serial: 'M7003', percentOfReading: 0.1, percentOfRange: 0.02, rangeText: '1 mohm to 200 ohm', dueInDays: 120, certificateNumber: 'K-26-0102' },
  { tag: 'H-01', kind: 'high-potential-tester', description: '0 to 30 kV AC', serial: 'H0051', percentOfReading: 1, percentOfRange: 0.5, rangeText: '0 to 30 kV', dueInDays: 120, certificateNumber: 'K-26-0103' },
  { tag: 'S-01', kind: 'surge-tester', description: 'comparison, 0 to 12 kV', serial: 'S0310', percentOfReading: 2, percentOfRange: 1, rangeText: '0 to 12 kV', dueInDays: 120, certificateNumber: 'K-26-0104' },
  { tag: 'B-01', kind: 'vibration-meter', description: '10 Hz to 1 kHz', serial: 'B6652', percentOfReading: 3, percentOfRange: 0, rangeText: '0 to 50 mm/s', dueInDays: -6, certificateNumber: 'K-25-0311' },
] as const;
