import { defineText } from '../../lib/text.js';

export const t = defineText({
  title: 'Quote {number}',
  newTitle: 'New quote for job {number}',
  forJob: 'for {customer}, job',
  caption: 'Lines of the quote',
  lines: 'Lines',
  kind: 'Kind',
  description: 'What it is for',
  quantity: 'Quantity',
  unit: 'Unit',
  price: 'Price',
  rate: 'Tax %',
  amount: 'Amount',
  inLine: '{field}, line {n}',
  up: 'Move line {n} up',
  down: 'Move line {n} down',
  remove: 'Take line {n} out',
  add: 'Add a line',
  quick: 'Lines that come often',
  validUntil: 'Valid until',
  note: 'Note to the customer',
  noteHelp: 'Stands on the quote, below the lines.',
  net: 'Net',
  taxOf: 'Tax {rate}',
  total: 'Total with tax',
  leftOut: 'Without line {lines}: not complete yet.',
  noTotal: 'Fill in quantity, price and tax of a line, and the total stands here.',
  save: 'Save the draft',
  saved: 'Quote {number} is saved.',
  unsaved: 'Save the draft before it is sent.',
  needQuantity: 'How much?',
  needPrice: 'What does it cost?',
  needRate: 'Which tax rate? 0 is one.',
  needDay: 'Until which day does it hold?',
  noNegative: 'A price is not negative; lower a line instead.',
  tooManyDecimals: 'At most {digits} decimals.',
  onlyDigits: 'Only digits and one decimal comma or point.',
  conflictState: 'State',
  conflictLine: 'Line {n}',
  conflictTotal: 'Total with tax',
  lineWords: '{description}: {quantity} at {price}, tax {rate}',
  noLine: 'no such line',
  gone: 'This quote is not a draft any more: it was sent meanwhile',
  goneWords: 'What you typed is kept as a draft on this device. Look at the quote as it stands, and make a revision if something has to change.',
  see: 'Show it as it stands',
  sentOn: 'sent {when}',
  byMail: 'The customer was told by e-mail.',
  expiredWords: 'Its last day has passed. The customer cannot approve it in the portal; make a revision with a later day.',
  paper: 'PDF',
  job: 'Job',
  customer: 'Customer',
});

export interface QuickLine {
  readonly name: string;
  readonly kind: 'labour' | 'material' | 'outside-work' | 'test' | 'other';
  readonly description: string;
  readonly unit: string;
}
/** What most quotes of a rewind shop hold; prices stay the shop's own. */
export const QUICK_LINES: readonly QuickLine[] = [
  { name: 'Dismantle and clean', kind: 'labour', description: 'Dismantle, clean and inspect', unit: 'h' },
  { name: 'Core test', kind: 'test', description: 'Core loss test before and after the strip, with report', unit: '' },
  { name: 'Strip and burnout', kind: 'labour', description: 'Strip the old winding, burnout with recorded temperature', unit: 'h' },
  { name: 'Rewind', kind: 'labour', description: 'Rewind stator, insulate, connect', unit: 'h' },
  { name: 'Winding wire', kind: 'material', description: 'Winding wire', unit: 'kg' },
  { name: 'Insulation', kind: 'material', description: 'Slot insulation, sleeving, leads', unit: 'set' },
  { name: 'Impregnation', kind: 'labour', description: 'Impregnate and cure', unit: '' },
  { name: 'Bearings', kind: 'material', description: 'Bearings, drive end and non-drive end', unit: 'set' },
  { name: 'Balancing', kind: 'outside-work', description: 'Balance the rotor', unit: '' },
  { name: 'Assemble and test', kind: 'test', description: 'Assemble, final test, test report', unit: 'h' },
];
