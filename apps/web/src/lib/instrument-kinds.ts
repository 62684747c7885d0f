import type { InstrumentView } from '@shared/instruments';

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
/** What the shop calls its instruments. */
export const instrumentKindName = (kind: InstrumentView['kind']): string => KINDS[kind];
export const INSTRUMENT_KIND_OPTIONS = (Object.entries(KINDS) as [InstrumentView['kind'], string][]).map(([value, label]) => ({ value, label }));
