import { formatQuantity, type UnitSystem } from '@libs/quantities';
import type { EquipmentView } from '@shared/equipment';
import type { Difference } from '../../components/notices.js';
import { calendarDay } from '../../lib/format.js';
import { readTyped, type Typed } from '../../lib/typed.js';
import { equipmentFormOf, type CableForm, type EquipmentForm, type OvenForm, type SupplyForm } from './equipment-form.js';
import { t } from './text.js';

type Words = (typed: Typed, kind: Parameters<typeof readTyped>[1]) => string;
const wordsIn = (system: UnitSystem): Words => (typed, kind) => {
  const reading = readTyped(typed, kind);
  return reading.state === 'read' ? formatQuantity(reading.si, kind, system) : typed.text || '–';
};

const supplyWords = (s: SupplyForm, words: Words): string =>
  t('supplyWords', { name: s.name, volts: s.kind === 'taps' ? s.tapsV : `${s.minVoltsV.text}–${s.maxVoltsV.text}`, amps: words(s.maxAmpsA, 'current'), frequency: words(s.frequencyHz, 'frequency') });
const cableWords = (c: CableForm, words: Words): string => t('cableWords', { name: c.name, section: words(c.crossSectionM2, 'area'), length: words(c.lengthM, 'cable-length'), amps: words(c.maxAmpsA, 'current') });
const ovenWords = (o: OvenForm, words: Words): string =>
  t('ovenWords', {
    name: o.name,
    remark: o.remark || '–',
    checked: o.thermocoupleCheckedOn ? t('checkedWords', { day: calendarDay(o.thermocoupleCheckedOn) }) : t('notChecked'),
    offset: o.thermocoupleOffsetK.text.trim() === '' ? t('noOffset') : t('offsetWords', { offset: words(o.thermocoupleOffsetK, 'temperature-difference') }),
  });

interface Thing {
  readonly id: string | null;
}
function pairs<T extends Thing>(theirs: readonly T[], mine: readonly T[], label: (n: number) => string, words: (thing: T) => string): Difference[] {
  const both = theirs.map((their) => [their, mine.find((m) => m.id === their.id)] as const);
  // what was added here, and what they took off while it was changed here
  const onlyMine = mine.filter((m) => !theirs.some((their) => their.id === m.id)).map((m) => [undefined, m] as const);
  return [...both, ...onlyMine].flatMap(([their, my], i) => {
    const difference = { label: label(i + 1), theirs: their ? words(their) : t('gone'), yours: my ? words(my) : t('gone') };
    return difference.theirs === difference.yours ? [] : [difference];
  });
}

/** What differs between the lists as somebody else saved them and as they are typed, one line for each thing. */
export function equipmentDifferences(view: EquipmentView, mine: EquipmentForm, system: UnitSystem): Difference[] {
  const theirs = equipmentFormOf(view, system);
  const words = wordsIn(system);
  return [
    ...pairs(theirs.supplies, mine.supplies, (n) => t('supplyNo', { n }), (s) => supplyWords(s, words)),
    ...pairs(theirs.cables, mine.cables, (n) => t('cableNo', { n }), (c) => cableWords(c, words)),
    ...pairs(theirs.ovens, mine.ovens, (n) => t('ovenNo', { n }), (o) => ovenWords(o, words)),
  ];
}

