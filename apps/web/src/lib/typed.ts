import { formatQuantity, parseQuantity, type Kind, type UnitSystem } from '@libs/quantities';
import type { Entered } from '@shared/fields';

/** A figure as it was typed, with the unit system it was typed in: a draft keeps it, switching units loses nothing. */
export interface Typed {
  readonly text: string;
  readonly system: UnitSystem;
}
export const untyped = (system: UnitSystem = 'si'): Typed => ({ text: '', system });
/** Longer than this, a figure was not read off a meter but comes from changing its units. */
const MOST_CHARACTERS = 8;

/** A figure that is already known, written so that it reads back as itself: in the units it is round in, when the wished ones make it endless. */
export function typedFrom(si: number | null | undefined, kind: Kind, system: UnitSystem = 'si'): Typed {
  if (si === null || si === undefined) return untyped(system);
  const wished = formatQuantity(si, kind, system, { unit: false });
  if (system === 'si' || wished.length <= MOST_CHARACTERS) return { text: wished, system };
  const inSi = formatQuantity(si, kind, 'si', { unit: false });
  return inSi.length < wished.length ? { text: inSi, system: 'si' } : { text: wished, system };
}

export type Reading = { readonly state: 'empty' } | { readonly state: 'read'; readonly si: number; readonly unit: string } | { readonly state: 'wrong'; readonly words: string };

export function readTyped(typed: Typed | undefined, kind: Kind): Reading {
  if (!typed || typed.text.trim() === '') return { state: 'empty' };
  const parsed = parseQuantity(typed.text, kind, typed.system);
  return parsed.ok ? { state: 'read', si: parsed.si, unit: parsed.unit } : { state: 'wrong', words: parsed.words };
}

/** What the field shows: the person's own text, or the same figure in the other units, as far as it fits. What counts is the text. */
export function shownText(typed: Typed, kind: Kind, system: UnitSystem): string {
  if (typed.system === system) return typed.text;
  const reading = readTyped(typed, kind);
  if (reading.state !== 'read') return typed.text;
  const full = formatQuantity(reading.si, kind, system, { unit: false });
  if (full.length <= MOST_CHARACTERS || !full.includes('.')) return full;
  return formatQuantity(reading.si, kind, system, { unit: false, significant: 6 }).replace(/(\.\d*?)0+$/, '$1').replace(/\.$/, '');
}

export interface FormProblem {
  readonly path: string;
  readonly message: string;
}

/** Collects figures from a form: the SI values, what was typed beside them, and what is missing or wrong. */
export class FormReader {
  readonly problems: FormProblem[] = [];
  readonly entered: Entered = {};

  /** A figure that must be there; NaN stands for it while it is not, so that live results can say so. */
  need(path: string, typed: Typed | undefined, kind: Kind, words = 'Fill this in.'): number {
    const si = this.may(path, typed, kind);
    if (si !== undefined) return si;
    if (!this.problems.some((p) => p.path === path)) this.problems.push({ path, message: words });
    return Number.NaN;
  }

  /** A figure that may be left out. */
  may(path: string, typed: Typed | undefined, kind: Kind): number | undefined {
    const reading = readTyped(typed, kind);
    if (reading.state === 'wrong') this.problems.push({ path, message: reading.words });
    if (reading.state !== 'read') return undefined;
    this.entered[path] = { text: typed!.text.slice(0, 60), unit: reading.unit.slice(0, 20) };
    return reading.si;
  }

  note(path: string, message: string): void {
    this.problems.push({ path, message });
  }
}
