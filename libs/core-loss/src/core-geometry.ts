/** A stator has its slots open to the bore; an armature (and a wound rotor) has them on the outside diameter. */
export type CoreKind = 'stator' | 'armature';

/** The size of a core as measured with rule and caliper, in metres. */
export interface CoreGeometry {
  kind: CoreKind;
  outerDiameterM: number;
  /** Bore of a stator; shaft, spider or bottom-of-vent diameter of an armature. */
  innerDiameterM: number;
  slotDepthM: number;
  slots: number;
  /** Gross stack, radial ducts included. */
  stackLengthM: number;
  ducts: number;
  ductWidthM: number;
  /** Share of the stack that is iron, 0.95 when nothing better is known. */
  stackingFactor: number;
  densityKgPerM3: number;
}

/** What follows from the size. The flux of a ring test runs in the back iron, so area and mass are the back iron's. */
export interface DerivedGeometry {
  backIronDepthM: number;
  meanDiameterM: number;
  meanPathM: number;
  netLengthM: number;
  areaM2: number;
  massKg: number;
  /** Flux density at the inner edge of the back iron over its mean, if the permeability were constant. */
  innerToMeanFluxRatio: number;
}

export interface GeometryProblem {
  field: keyof CoreGeometry;
  code: string;
  message: string;
}
