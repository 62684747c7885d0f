import type { WindingRowOnPaper } from '@libs/documents';
import type { WindingReadings } from '@shared/windings';

const CONNECTION = { star: 'star', delta: 'delta', single: 'single-phase', dc: 'DC' } as const;
const wires = (w: WindingReadings) => w.wires.map((wire) => `${wire.strands} × ${(wire.bareDiameterM * 1000).toFixed(2)} mm`).join(' + ');

const ROWS: readonly [string, (w: WindingReadings) => string][] = [
  ['slots, poles', (w) => `${w.slots}, ${w.poles}`],
  ['layers, coils', (w) => `${w.layers}, ${w.coils}`],
  ['turns per coil', (w) => String(w.turnsPerCoil)],
  ['span', (w) => `1-${w.spanTo}`],
  ['grouping', (w) => w.grouping],
  ['connection, circuits', (w) => `${CONNECTION[w.connection]}, ${w.circuits}`],
  ['wire', wires],
];

/** As found beside as wound, row by row; a winding that was not recorded leaves its column empty. */
export function windingRows(found: WindingReadings | undefined, wound: WindingReadings | undefined): WindingRowOnPaper[] {
  if (!found && !wound) return [];
  return ROWS.map(([item, words]) => ({ item, asFound: found ? words(found) : '', asWound: wound ? words(wound) : '' }));
}
