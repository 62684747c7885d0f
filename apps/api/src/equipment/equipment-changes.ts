import { EQUIPMENT_LISTS, type EquipmentList, type SaveEquipment } from '@shared/equipment';
import type { FieldProblem } from '@shared/errors';
import type { BayEquipment, RemovedEquipment } from '../shop/shop-profile.js';

const ONE_OF: Record<EquipmentList, string> = { supplies: 'Supply', cables: 'Cable', ovens: 'Oven' };
interface Named {
  readonly id: string | null;
  readonly name: string;
}

/** Names that this bay has never given: somebody else took the thing away meanwhile, or it never was. */
export function unknownThings(before: BayEquipment, input: SaveEquipment): FieldProblem[] {
  return EQUIPMENT_LISTS.flatMap((list) =>
    (input[list] as readonly Named[]).flatMap((thing, i) =>
      thing.id === null || before[list].some((known) => known.id === thing.id) ? [] : [{ path: `${list}.${i}.id`, code: 'unknown', message: `${ONE_OF[list]} ${thing.name} is not one of this bay. Add it anew.` }],
    ),
  );
}

export interface EquipmentChange {
  readonly after: BayEquipment;
  /** one line each, in the order of the lists */
  readonly words: readonly string[];
}

/** What is new gets its name, what is left out is remembered by name, and every change is said. */
export function changeOf(before: BayEquipment, input: SaveEquipment, today: string, newId: () => string): EquipmentChange {
  const words: string[] = [];
  const removed: RemovedEquipment[] = [...(before.removed ?? [])];
  const named = <T extends Named>(list: EquipmentList, things: readonly T[]) => {
    const kept = things.map((thing) => ({ ...thing, id: thing.id ?? newId() }));
    for (const thing of kept) {
      const old = before[list].find((known) => known.id === thing.id);
      if (!old) words.push(`${ONE_OF[list]} ${thing.name} added.`);
      else if (!same(old, thing)) words.push(`${ONE_OF[list]} ${old.name === thing.name ? thing.name : `${old.name}, now ${thing.name},`} changed.`);
    }
    for (const old of before[list]) {
      if (kept.some((thing) => thing.id === old.id)) continue;
      words.push(`${ONE_OF[list]} ${old.name} removed.`);
      removed.push({ id: old.id, list, name: old.name, removedOn: today });
    }
    return kept;
  };
  const supplies = named('supplies', input.supplies).map(({ tapsV, ...s }) => ({ ...s, ...(tapsV ? { tapsV } : {}) }));
  const cables = named('cables', input.cables);
  const ovens = named('ovens', input.ovens);
  return { after: { supplies, cables, ovens, removed }, words };
}

/** Alike whatever the order of their keys; what was never said is as good as nothing. */
function same(a: object, b: object): boolean {
  const keys = new Set([...Object.keys(a), ...Object.keys(b)]);
  const value = (of: object, key: string) => JSON.stringify((of as Record<string, unknown>)[key] ?? null);
  return [...keys].every((key) => value(a, key) === value(b, key));
}
