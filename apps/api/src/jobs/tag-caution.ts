import type { CONTAMINATIONS } from '@shared/jobs';

type Contamination = (typeof CONTAMINATIONS)[number];

const CAUTION: Record<Contamination, string> = {
  none: '',
  'oil-or-grease': '',
  coolant: '',
  chemicals: 'Chemicals',
  food: '',
  sewage: 'Sewage',
  'asbestos-suspected': 'Asbestos suspected',
  other: 'Contaminated',
};

/** What whoever touches the machine has to know, in one line. */
export function tagCaution(contamination: Contamination, words: string, explosiveAtmosphere: boolean): string {
  const dirt = CAUTION[contamination];
  const parts = [...(dirt ? [words ? `${dirt}: ${words}` : dirt] : []), ...(explosiveAtmosphere ? ['For explosive atmospheres: not to be redesigned'] : [])];
  return parts.join(' · ');
}
