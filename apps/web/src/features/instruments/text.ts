import type { InstrumentView } from '@shared/instruments';
import { defineText } from '../../lib/text.js';

export const t = defineText({
  title: 'Instruments',
  below: 'What each record names, with its calibration on the day.',
  toBay: 'To the bay',
  add: 'Add an instrument',
  edit: 'Change {tag}',
  list: 'Instruments of the bay',
  tag: 'Tag',
  kind: 'Kind',
  description: 'Description',
  serial: 'Serial number',
  percentOfReading: 'Error, % of reading',
  percentOfRange: 'Error, % of range',
  rangeText: 'Ranges',
  calibratedOn: 'Calibrated on',
  dueOn: 'Due on',
  certificateNumber: 'Certificate',
  standing: 'Standing',
  errorTitle: 'Limits of error',
  error: '{reading} % of reading + {range} % of range',
  'in-calibration': 'in calibration',
  'due-soon': 'due soon',
  overdue: 'overdue',
  none: 'No instruments yet',
  noneWords: 'Enter the wattmeter first: a core test that does not name it cannot be compared.',
  save: 'Keep it',
  cancel: 'Not now',
  saved: '{tag} is in the register.',
  choose: 'Choose the kind',
  tagHelp: 'As it stands on the instrument.',
  errorHelp: 'Limits of error as the maker states them.',
});

const KINDS: Record<InstrumentView['kind'], string> = {
  voltmeter: 'Voltmeter',
  ammeter: 'Ammeter',
  wattmeter: 'Wattmeter',
  thermometer: 'Thermometer',
  'insulation-tester': 'Insulation tester',
  'micro-ohmmeter': 'Micro-ohmmeter',
  'high-potential-tester': 'High-potential tester',
  'surge-tester': 'Surge tester',
  'vibration-meter': 'Vibration meter',
  tachometer: 'Tachometer',
  'clamp-meter': 'Clamp meter',
};
export const instrumentKindName = (kind: InstrumentView['kind']): string => KINDS[kind];
export const INSTRUMENT_KIND_OPTIONS = (Object.entries(KINDS) as [InstrumentView['kind'], string][]).map(([value, label]) => ({ value, label }));
