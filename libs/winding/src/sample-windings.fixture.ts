import type { WindingCheckInput } from './check-winding.js';
import type { Conductor, WindingData } from './winding-data.js';
import { awgDiameter } from './wire.js';

/** The windings of the sample shop, an invented one: for the specs of this library only. */
const round = (strands: number, millimetres: number): Conductor[] => [{ strands, bareDiameterM: millimetres / 1000 }];

type Row = [slots: number, poles: number, layers: 1 | 2, turns: number, spanTo: number, connection: 'star' | 'delta', circuits: number, wires: Conductor[], meanTurnMm: number | null];
const WINDINGS: Record<number, Row> = {
  1: [72, 4, 2, 6, 16, 'delta', 4, round(11, 1.18), 1519],
  2: [60, 4, 2, 11, 13, 'delta', 4, round(6, 1.06), 1219],
  3: [36, 2, 2, 10, 14, 'delta', 2, round(6, 1.18), 1353],
  6: [96, 8, 2, 8, 11, 'star', 2, [{ strands: 2, widthM: 5.6e-3, thicknessM: 1.9e-3 }], 2529],
  7: [72, 6, 2, 9, 11, 'delta', 3, round(6, 1.06), 1131],
  8: [24, 4, 1, 95, 7, 'star', 1, round(1, 0.6), 456],
  9: [60, 4, 2, 13, 13, 'delta', 4, round(4, awgDiameter(18) * 1000), 1093],
  10: [48, 4, 1, 22, 12, 'delta', 1, round(2, 1.18), 811],
  11: [54, 6, 2, 1, 10, 'star', 1, [{ strands: 1, widthM: 16e-3, thicknessM: 4e-3 }], null],
  12: [48, 4, 2, 12, 11, 'delta', 2, round(4, 1.06), 975],
};

export type SampleWinding = 1 | 2 | 3 | 6 | 7 | 8 | 9 | 10 | 11 | 12;

export function sampleWinding(machine: SampleWinding): WindingData {
  const [slots, poles, layers, turnsPerCoil, spanTo, connection, circuits, wires, meanTurnMm] = WINDINGS[machine]!;
  return { slots, poles, layers, coils: (slots * layers) / 2, turnsPerCoil, spanTo, connection, circuits, wires, meanTurnM: meanTurnMm === null ? null : meanTurnMm / 1000 };
}

/** Line volts, Hz, watts of output, cos φ, efficiency; gap diameter, stack, net length, back-iron area. */
type Machine = [volts: number, hz: number, watts: number, cos: number, efficiency: number, gapMm: number, stackMm: number, netMm: number, areaMm2: number];
const MACHINES: Record<number, Machine> = {
  1: [400, 50, 200_000, 0.87, 0.958, 340, 370, 351.5, 17926.5],
  2: [400, 50, 90_000, 0.86, 0.945, 280, 290, 275.5, 12259.75],
  3: [400, 50, 55_000, 0.89, 0.935, 225, 230, 218.5, 11689.75],
  6: [6600, 50, 1_600_000, 0.84, 0.955, 850, 800, 627, 48279],
  7: [400, 50, 75_000, 0.83, 0.937, 330, 300, 285, 9120],
  8: [400, 50, 750, 0.76, 0.796, 75, 85, 80.75, 1009.375],
  9: [460, 60, 100 * 745.7, 0.86, 0.954, 267, 241, 228.95, 9615.9],
  10: [400, 50, 11_000, 0.84, 0.898, 155, 170, 161.5, 3633.75],
  12: [400, 50, 37_000, 0.86, 0.927, 218, 220, 209, 6897],
};

export function sampleCheck(machine: Exclude<SampleWinding, 11>): WindingCheckInput {
  const [lineVoltsV, frequencyHz, watts, cos, efficiency, gap, stack, net, area] = MACHINES[machine]!;
  return {
    winding: sampleWinding(machine),
    lineVoltsV,
    frequencyHz,
    ratedCurrentA: watts / (Math.sqrt(3) * lineVoltsV * cos * efficiency),
    core: { kind: 'stator', gapDiameterM: gap / 1000, stackLengthM: stack / 1000, netLengthM: net / 1000, backIronAreaM2: area / 1e6 },
  };
}

/** The slip-ring rotor: 205 V between rings with the rotor open, all of it induced, 322 A when running. */
export const SAMPLE_ROTOR: WindingCheckInput = {
  winding: sampleWinding(11),
  lineVoltsV: 205,
  frequencyHz: 50,
  inducedShare: 1,
  ratedCurrentA: 322,
  core: { kind: 'rotor', gapDiameterM: 0.39, stackLengthM: 0.31, netLengthM: 0.2755, backIronAreaM2: 0.018734 },
};
