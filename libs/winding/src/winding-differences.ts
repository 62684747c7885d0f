import { conductorArea } from './wire.js';
import { lineCopperArea } from './copper.js';
import { FLUX_CHANGE_TO_ASK } from './redesign.js';
import { turnsPerPhase } from './turns-and-flux.js';
import { positive, type Conductor, type WindingConnection, type WindingData } from './winding-data.js';
import { assertWinding, windingFactors } from './winding-factors.js';

export type WindingItem = 'slots' | 'poles' | 'layers' | 'coils' | 'turnsPerCoil' | 'span' | 'connection' | 'circuits' | 'wires' | 'flux' | 'copper' | 'coilExtension' | 'meanTurn';

export interface WindingDifference {
  item: WindingItem;
  asFound: string;
  asWound: string;
  /** As wound over as found, less one; absent where the item has no size or was not recorded both times. */
  change?: number;
  /** `ask`: somebody who may decide looks at it before the winding is varnished. */
  is: 'same' | 'changed' | 'not-recorded' | 'ask';
  words: string;
}

/** Two gauges of one wire may differ by this much in area, since tables round diameters. */
const GAUGE_ROUNDING = 0.005;
const MUCH_MORE_COPPER = 0.05;
/** A rule laid on a coil end is not better than this. */
const LENGTH_READING = 0.01;

const CONNECTIONS: Record<WindingConnection, string> = { star: 'star', delta: 'delta', single: 'single-phase', dc: 'DC' };
const millimetres = (m: number, digits: number) => String(Number((m * 1000).toFixed(digits)));
const wireWords = (wires: readonly Conductor[]) =>
  wires.map((w) => ('bareDiameterM' in w ? `${w.strands} × ${millimetres(w.bareDiameterM, 3)} mm` : `${w.strands} × ${millimetres(w.widthM, 2)} × ${millimetres(w.thicknessM, 2)} mm`)).join(' + ');
const percent = (change: number) => `${change < 0 ? '−' : '+'}${Math.abs(change * 100).toFixed(1)} %`;
const threePhase = (w: WindingData) => w.connection === 'star' || w.connection === 'delta';

/**
 * The new winding beside the old one, item by item. Turns, span, circuits and connection may change together and
 * still make the same machine: so what they do to the flux and to the copper is reckoned too, at the same line volts.
 *
 * `Φ₂/Φ₁ = (U_ph2/U_ph1)·(N₁·k_w1)/(N₂·k_w2)`, copper = area that the line current sees
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `found`, `wound` | – | without problems |
 *
 * @returns all items in the order of a winding card; `ask` for: another number of slots or poles, another kind of
 * connection, flux more than 10 % away, less copper than before, longer coil ends or mean turn
 * @throws OutOfRangeError when one of the two has problems
 *
 * Source: conductor area at least as large and coil extensions not longer (ANSI/EASA AR100-2020, read); 10 % of flux is
 * common practice.
 * @example
 * const found = { slots: 48, poles: 4, layers: 2, coils: 48, turnsPerCoil: 12, spanTo: 11, connection: 'delta', circuits: 2, wires: [{ strands: 4, bareDiameterM: 0.00106 }] };
 * windingDifferences(found, { ...found, wires: [{ strands: 4, bareDiameterM: 0.001 }] }).filter((d) => d.is === 'ask').map((d) => d.item)
 * // → ['copper']
 */
export function windingDifferences(found: WindingData, wound: WindingData): WindingDifference[] {
  assertWinding(found);
  assertWinding(wound);
  const of = (item: WindingItem, words: (w: WindingData) => string, ask?: string): WindingDifference => {
    const [asFound, asWound] = [words(found), words(wound)];
    if (asFound === asWound) return { item, asFound, asWound, is: 'same', words: '' };
    return { item, asFound, asWound, is: ask ? 'ask' : 'changed', words: ask ?? 'Changed: see what it does to flux and copper below.' };
  };
  const otherKind = threePhase(found) !== threePhase(wound) || (!threePhase(found) && found.connection !== wound.connection);
  const wires = of('wires', (w) => wireWords(w.wires));
  return [
    of('slots', (w) => String(w.slots), 'The core has not changed: count the slots again.'),
    of('poles', (w) => String(w.poles), 'Another number of poles is another speed. Ask before it is varnished.'),
    of('layers', (w) => String(w.layers)),
    of('coils', (w) => String(w.coils)),
    of('turnsPerCoil', (w) => String(w.turnsPerCoil)),
    of('span', (w) => `1-${w.spanTo}`),
    of('connection', (w) => CONNECTIONS[w.connection], otherKind ? 'Another kind of winding. Ask before it is varnished.' : undefined),
    of('circuits', (w) => String(w.circuits)),
    wires,
    ...(otherKind ? [] : [fluxDifference(found, wound), copperDifference(found, wound)]),
    lengthDifference('coilExtension', found.coilExtensionM, wound.coilExtensionM, 'The coil ends stand out further than before. They may touch the end shield; ask.'),
    lengthDifference('meanTurn', found.meanTurnM, wound.meanTurnM, 'The mean turn is longer than before: more copper loss. Shape the coils tighter or ask.'),
  ];
}

/** Effective turns against the volts they take; single-phase and DC windings count turns alone. */
function turnsPerVolt(w: WindingData): number {
  if (!threePhase(w)) return (w.coils * w.turnsPerCoil) / w.circuits;
  return turnsPerPhase(w) * windingFactors(w).winding * (w.connection === 'star' ? Math.sqrt(3) : 1);
}

function fluxDifference(found: WindingData, wound: WindingData): WindingDifference {
  const change = turnsPerVolt(found) / turnsPerVolt(wound) - 1;
  const said = { item: 'flux' as const, asFound: '100 %', asWound: `${(100 * (1 + change)).toFixed(1)} %`, change };
  if (Math.abs(change) < 1e-9) return { ...said, is: 'same', words: '' };
  if (Math.abs(change) > FLUX_CHANGE_TO_ASK) return { ...said, is: 'ask', words: `Flux ${percent(change)} at the same volts: more than 10 % away from the original. Count turns, circuits and connection again.` };
  return { ...said, is: 'changed', words: `Flux ${percent(change)} at the same volts.` };
}

function copperDifference(found: WindingData, wound: WindingData): WindingDifference {
  const areaOf = (w: WindingData) => (threePhase(w) ? lineCopperArea(w) : conductorArea(w.wires) * w.circuits);
  const [before, after] = [areaOf(found), areaOf(wound)];
  const change = after / before - 1;
  const square = (area: number) => `${(area * 1e6).toFixed(2)} mm²`;
  const said = { item: 'copper' as const, asFound: square(before), asWound: square(after), change };
  if (Math.abs(change) < 1e-9) return { ...said, is: 'same', words: '' };
  if (change < -GAUGE_ROUNDING) return { ...said, is: 'ask', words: `Copper ${percent(change)}: the new conductor must be at least as large as the original. Take another wire or ask.` };
  if (change > MUCH_MORE_COPPER) return { ...said, is: 'changed', words: `Copper ${percent(change)}: check that it goes into the slots.` };
  return { ...said, is: 'changed', words: `Copper ${percent(change)}.` };
}

function lengthDifference(item: 'coilExtension' | 'meanTurn', found: number | null | undefined, wound: number | null | undefined, longer: string): WindingDifference {
  const length = (m: number | null | undefined) => (positive(m) ? `${millimetres(m, 0)} mm` : '');
  const said = { item, asFound: length(found), asWound: length(wound) };
  if (!positive(found) || !positive(wound)) return { ...said, is: 'not-recorded', words: 'Not measured both times.' };
  const change = wound / found - 1;
  if (change > LENGTH_READING) return { ...said, change, is: 'ask', words: longer };
  return { ...said, change, is: Math.abs(change) < 1e-9 ? 'same' : 'changed', words: '' };
}
