import type { WindingReadings } from '@shared/windings';

type Row = readonly [slots: number, poles: number, layers: 1 | 2, coils: number, turns: number, spanTo: number, grouping: string, connection: WindingReadings['connection'], circuits: number, strands: number, wireMm: number, meanTurnMm: number | null];

/** Windings as found, by machine. Flat and strip conductors stand as the round wire of the same area. */
const ROWS: Record<number, Row> = {
  1: [72, 4, 2, 72, 6, 16, '6 coils a group', 'delta', 4, 11, 1.18, 1519],
  2: [60, 4, 2, 60, 11, 13, '5 coils a group', 'delta', 4, 6, 1.06, 1219],
  3: [36, 2, 2, 36, 10, 14, '6 coils a group', 'delta', 2, 6, 1.18, 1353],
  4: [46, 4, 2, 46, 1, 12, 'lap, 4 bars a slot', 'dc', 4, 1, 4.0, null],
  5: [8, 2, 1, 2, 102, 4, '2 coils in series', 'single', 1, 1, 1.6, 440],
  6: [96, 8, 2, 96, 8, 11, '4 coils a group', 'star', 2, 2, 3.68, 2529],
  7: [72, 6, 2, 72, 9, 11, '4 coils a group', 'delta', 3, 6, 1.06, 1131],
  9: [60, 4, 2, 60, 13, 13, '5 coils a group', 'delta', 4, 4, 1.0237, 1093],
  10: [48, 4, 1, 24, 22, 12, '2 coils a group', 'delta', 1, 2, 1.18, 811],
  11: [54, 6, 2, 54, 1, 10, 'wave, 2 bars a slot', 'star', 1, 1, 9.03, null],
  12: [48, 4, 2, 48, 12, 11, '4 coils a group', 'delta', 2, 4, 1.06, 975],
  14: [48, 4, 2, 48, 15, 11, '4 coils a group', 'delta', 2, 3, 0.95, 880],
};

export function winding(machine: number, remark = ''): WindingReadings {
  const [slots, poles, layers, coils, turnsPerCoil, spanTo, grouping, connection, circuits, strands, wireMm, meanTurnMm] = ROWS[machine]!;
  return {
    slots,
    poles,
    layers,
    coils,
    turnsPerCoil,
    spanFrom: 1,
    spanTo,
    grouping,
    connection,
    circuits,
    wires: [{ strands, bareDiameterM: wireMm / 1000 }],
    coilExtensionM: null,
    meanTurnM: meanTurnMm === null ? null : meanTurnMm / 1000,
    leads: connection === 'single' || connection === 'dc' ? '2' : '6',
    remark,
  };
}
