import type { Kind, UnitSystem } from '@libs/quantities';
import { saveEquipmentSchema, type CableView, type EquipmentView, type OvenView, type SaveEquipment, type SupplyView } from '@shared/equipment';
import { problemsOf } from '../../lib/form-problems.js';
import { FormReader, typedFrom, untyped, type FormProblem, type Typed } from '../../lib/typed.js';
import { t } from './text.js';

export interface SupplyForm {
  /** null for one that is not saved yet */
  id: string | null;
  name: string;
  kind: SupplyView['kind'];
  minVoltsV: Typed;
  maxVoltsV: Typed;
  maxAmpsA: Typed;
  frequencyHz: Typed;
  /** volts, with spaces between */
  tapsV: string;
}
export interface CableForm {
  id: string | null;
  name: string;
  crossSectionM2: Typed;
  lengthM: Typed;
  maxAmpsA: Typed;
}
export interface OvenForm {
  id: string | null;
  name: string;
  remark: string;
  thermocoupleCheckedOn: string | null;
  thermocoupleOffsetK: Typed;
}
/** The lists as they are typed, with the version they were filled from: a draft of last week knows that it is one. */
export interface EquipmentForm {
  version: number;
  supplies: SupplyForm[];
  cables: CableForm[];
  ovens: OvenForm[];
}

const supplyForm = (s: SupplyView, system: UnitSystem): SupplyForm => ({
  id: s.id,
  name: s.name,
  kind: s.kind,
  minVoltsV: typedFrom(s.minVoltsV, 'voltage', system),
  maxVoltsV: typedFrom(s.maxVoltsV, 'voltage', system),
  maxAmpsA: typedFrom(s.maxAmpsA, 'current', system),
  frequencyHz: typedFrom(s.frequencyHz, 'frequency', system),
  tapsV: (s.tapsV ?? []).join(' '),
});
const cableForm = (c: CableView, system: UnitSystem): CableForm => ({ id: c.id, name: c.name, crossSectionM2: typedFrom(c.crossSectionM2, 'area', system), lengthM: typedFrom(c.lengthM, 'cable-length', system), maxAmpsA: typedFrom(c.maxAmpsA, 'current', system) });
const ovenForm = (o: OvenView, system: UnitSystem): OvenForm => ({ id: o.id, name: o.name, remark: o.remark, thermocoupleCheckedOn: o.thermocoupleCheckedOn, thermocoupleOffsetK: typedFrom(o.thermocoupleOffsetK, 'temperature-difference', system) });

export const equipmentFormOf = ({ version, supplies, cables, ovens }: EquipmentView, system: UnitSystem): EquipmentForm => ({
  version,
  supplies: supplies.map((s) => supplyForm(s, system)),
  cables: cables.map((c) => cableForm(c, system)),
  ovens: ovens.map((o) => ovenForm(o, system)),
});

export const newSupply = (system: UnitSystem): SupplyForm => ({ id: null, name: '', kind: 'variable', minVoltsV: typedFrom(0, 'voltage', system), maxVoltsV: untyped(system), maxAmpsA: untyped(system), frequencyHz: untyped(system), tapsV: '' });
export const newCable = (system: UnitSystem): CableForm => ({ id: null, name: '', crossSectionM2: untyped(system), lengthM: untyped(system), maxAmpsA: untyped(system) });
export const newOven = (system: UnitSystem): OvenForm => ({ id: null, name: '', remark: '', thermocoupleCheckedOn: null, thermocoupleOffsetK: untyped(system) });

/** Taps as typed: volts with spaces, semicolons or strokes between, a decimal comma or point within. */
export function readTaps(text: string): number[] | null {
  const parts = text.split(/[;/]|,\s|\s+/).filter((part) => part.trim() !== '');
  const volts = parts.map((part) => (/^\d+([.,]\d+)?$/.test(part) ? Number(part.replace(',', '.')) : Number.NaN));
  return volts.some(Number.isNaN) ? null : volts;
}

export interface ReadEquipment {
  readonly input: SaveEquipment | null;
  readonly problems: readonly FormProblem[];
}

/** What will be saved, and what stands in its way, each at its field. */
export function readEquipment(form: EquipmentForm): ReadEquipment {
  const reader = new FormReader();
  const need = (path: string, typed: Typed, kind: Kind) => reader.need(path, typed, kind, t('needFigure'));
  const supplies = form.supplies.map((s, i) => {
    const at = `supplies.${i}`;
    const common = { id: s.id, name: s.name, kind: s.kind, maxAmpsA: need(`${at}.maxAmpsA`, s.maxAmpsA, 'current'), frequencyHz: need(`${at}.frequencyHz`, s.frequencyHz, 'frequency') };
    if (s.kind === 'variable') return { ...common, minVoltsV: need(`${at}.minVoltsV`, s.minVoltsV, 'voltage'), maxVoltsV: need(`${at}.maxVoltsV`, s.maxVoltsV, 'voltage') };
    const taps = readTaps(s.tapsV);
    if (taps === null || taps.length === 0) reader.note(`${at}.tapsV`, taps === null ? t('tapsWrong') : t('tapsNone'));
    // lowest and highest follow from the taps, whatever their order: the order is told at the taps
    return { ...common, tapsV: taps ?? [], minVoltsV: taps?.[0] ?? 1, maxVoltsV: taps?.at(-1) ?? 1 };
  });
  const cables = form.cables.map((c, i) => ({
    id: c.id,
    name: c.name,
    crossSectionM2: need(`cables.${i}.crossSectionM2`, c.crossSectionM2, 'area'),
    lengthM: need(`cables.${i}.lengthM`, c.lengthM, 'cable-length'),
    maxAmpsA: need(`cables.${i}.maxAmpsA`, c.maxAmpsA, 'current'),
  }));
  const ovens = form.ovens.map((o, i) => ({ id: o.id, name: o.name, remark: o.remark, thermocoupleCheckedOn: o.thermocoupleCheckedOn, thermocoupleOffsetK: reader.may(`ovens.${i}.thermocoupleOffsetK`, o.thermocoupleOffsetK, 'temperature-difference') ?? null }));
  const parsed = saveEquipmentSchema.safeParse({ version: form.version, supplies, cables, ovens });
  const seen = new Set<string>();
  const problems = [...reader.problems, ...(parsed.success ? [] : problemsOf(parsed.error))].filter(({ path }) => !seen.has(path) && seen.add(path));
  return { input: problems.length === 0 && parsed.success ? parsed.data : null, problems };
}

interface Thing {
  readonly id: string | null;
}
const same = (a: Thing, b: Thing | undefined): boolean => b !== undefined && JSON.stringify(a) === JSON.stringify(b);

/** Thing by thing: what was not touched here is as theirs, what was is as here; what was added or taken off on either side stays so. */
function merged<T extends Thing>(mine: readonly T[], theirs: readonly T[], base: readonly T[] | null): T[] {
  const known = new Map(theirs.map((thing) => [thing.id, thing]));
  const before = new Map((base ?? []).map((thing) => [thing.id, thing]));
  const kept = mine.flatMap((thing): T[] => {
    if (thing.id === null) return [thing];
    const their = known.get(thing.id);
    const untouched = base !== null && same(thing, before.get(thing.id));
    if (their) return [untouched ? their : thing];
    // they took it off: gone when it was not touched here, else added anew
    return untouched ? [] : [{ ...thing, id: null }];
  });
  const added = base === null ? [] : theirs.filter((their) => !before.has(their.id) && !mine.some((thing) => thing.id === their.id));
  return [...kept, ...added];
}

/** Put on top of what somebody else saved. `base` is what both began with; without it everything typed here stays. */
export function onTopOf(form: EquipmentForm, view: EquipmentView, base: EquipmentForm | null, system: UnitSystem): EquipmentForm {
  const theirs = equipmentFormOf(view, system);
  const began = base?.version === form.version ? base : null;
  return {
    version: view.version,
    supplies: merged(form.supplies, theirs.supplies, began && began.supplies),
    cables: merged(form.cables, theirs.cables, began && began.cables),
    ovens: merged(form.ovens, theirs.ovens, began && began.ovens),
  };
}
