import { formatQuantity, parseQuantity, type Kind, type UnitSystem } from '@libs/quantities';
import type { Entered } from '@shared/fields';

/** A figure as it was typed, with the unit system it was typed in: a draft keeps it, switching units loses nothing. */
export interface Typed {
  readonly text: string;
  readonly system: UnitSystem;
}
export const untyped = (system: UnitSystem = 'si'): Typed => ({ text: '', system });
/** A figure that is already known, written so that it reads back as itself. */
export const typedFrom = (si: number | null | undefined, kind: Kind, system: UnitSystem = 'si'): Typed =>
  si === null || si === undefined ? untyped(system) : { text: formatQuantity(si, kind, system, { unit: false }), system };

export type Reading = { readonly state: 'empty' } | { readonly state: 'read'; readonly si: number; readonly unit: string } | { readonly state: 'wrong'; readonly words: string };

export function readTyped(typed: Typed | undefined, kind: Kind): Reading {
  if (!typed || typed.text.trim() === '') return { state: 'empty' };
  const parsed = parseQuantity(typed.text, kind, typed.system);
  return parsed.ok ? { state: 'read', si: parsed.si, unit: parsed.unit } : { state: 'wrong', words: parsed.words };
}

/** What the field shows: the person's own text, or the same figure in the other units. */
export function shownText(typed: Typed, kind: Kind, system: UnitSystem): string {
  if (typed.system === system) return typed.text;
  const reading = readTyped(typed, kind);
  return reading.state === 'read' ? formatQuantity(reading.si, kind, system, { unit: false }) : typed.text;
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
