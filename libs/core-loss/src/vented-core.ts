import { OutOfRangeError } from '@libs/quantities';
import { deriveGeometry, type CoreGeometry, type DerivedGeometry } from './core-geometry.js';
import type { CablePath } from './core-test.js';

/** Round axial holes through the back iron, on one circle. */
export interface AxialVents {
  count: number;
  holeDiameterM: number;
  /** Diameter of the circle through the middles of the holes. */
  circleDiameterM: number;
}

/**
 * Back iron of a core with axial vents: what counts depends on where the cable runs.
 *
 * Through the vents it encloses only the iron outside them: depth, path, area and mass follow from a new inside diameter. Any other way the flux
 * passes the holes on both sides: their width is taken off the depth and their area off the mass; the mean path stays.
 *
 * `D_i' = D_c + d` (through the vents); `A = (h − d)·L_n`, `m = ρ·L_n·(π/4·(D_2² − D_1²) − N·π/4·d²)` (any other way)
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `g` | m | as `deriveGeometry`; for an armature `innerDiameterM` is shaft or spider |
 * | N | `vents.count` | – | whole, 1 or more |
 * | d | `vents.holeDiameterM` | m | more than 0, narrower than the back iron |
 * | D_c | `vents.circleDiameterM` | m | the holes lie wholly within the back iron |
 * | – | `cablePath` | – | 'through-vents' or any other |
 *
 * @returns as `deriveGeometry`
 * @throws OutOfRangeError when the size is wrong or the holes do not lie within the back iron
 *
 * Source: a cable encloses what lies outside it; widths and areas of holes taken off as the trade does. Standing: common practice.
 * @example
 * const armature = { kind: 'armature', outerDiameterM: 0.38, innerDiameterM: 0.17, slotDepthM: 0.036, slots: 46, stackLengthM: 0.26, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7750 }
 * deriveVentedGeometry(armature, { count: 8, holeDiameterM: 0.02, circleDiameterM: 0.21 }, 'through-vents').backIronDepthM
 * // → 0.039
 * deriveVentedGeometry(armature, { count: 8, holeDiameterM: 0.02, circleDiameterM: 0.21 }, 'through-shaft').areaM2 / 0.247
 * // → 0.049
 */
export function deriveVentedGeometry(g: CoreGeometry, vents: AxialVents, cablePath: CablePath): DerivedGeometry {
  const whole = deriveGeometry(g);
  const { count, holeDiameterM, circleDiameterM } = vents;
  if (!(Number.isInteger(count) && count >= 1 && count <= 200)) throw new OutOfRangeError('count', 'Count the axial vents: a whole number, 1 or more.');
  if (!(Number.isFinite(holeDiameterM) && holeDiameterM > 0)) throw new OutOfRangeError('holeDiameterM', 'Measure the width of a vent: more than 0.');
  const [inner, outer] = [whole.meanDiameterM - whole.backIronDepthM, whole.meanDiameterM + whole.backIronDepthM];
  if (!(circleDiameterM - holeDiameterM >= inner - 1e-9 && circleDiameterM + holeDiameterM < outer - 1e-9)) {
    throw new OutOfRangeError('circleDiameterM', 'The vents must lie within the back iron. Check their circle and their width.');
  }
  if (count * holeDiameterM >= Math.PI * circleDiameterM) throw new OutOfRangeError('count', 'So many vents do not fit on their circle.');
  if (cablePath === 'through-vents') {
    const edge = circleDiameterM + holeDiameterM;
    // a stator has its back iron outside: what lies outside the vents begins at their outer edge, slots and all left inside
    return g.kind === 'armature' ? deriveGeometry({ ...g, innerDiameterM: edge }) : deriveGeometry({ ...g, innerDiameterM: edge - 2 * g.slotDepthM });
  }
  const backIronDepthM = whole.backIronDepthM - holeDiameterM;
  return {
    ...whole,
    backIronDepthM,
    areaM2: backIronDepthM * whole.netLengthM,
    massKg: whole.massKg - g.densityKgPerM3 * whole.netLengthM * count * (Math.PI / 4) * holeDiameterM ** 2,
  };
}
