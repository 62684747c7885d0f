/** What the bay can excite a core with. */
export interface Supply {
  id: string;
  name: string;
  minVoltsV: number;
  maxVoltsV: number;
  maxAmpsA: number;
  frequencyHz: number;
  kind: 'variable' | 'taps';
  /** The fixed voltages of a tapped supply. */
  tapsV?: number[];
}

/** A loop cable on its drum. */
export interface Cable {
  id: string;
  name: string;
  crossSectionM2: number;
  lengthM: number;
  maxAmpsA: number;
}

/** One way to set the test up. Currents are estimates until the trial at a third of the volts. */
export interface SetupOption {
  supplyId: string;
  turns: number;
  volts: number;
  amps: number;
  ampsLow: number;
  ampsHigh: number;
  cableId: string;
  parallelCables: number;
  /** All the cable the loop takes, parallels and leads to the supply included. */
  cableLengthNeededM: number;
  kva: number;
  fluxReachedT: number;
  reachesTarget: boolean;
  voltsPerTurn: number;
  /** A third of the volts, to find a shorted or miscounted turn before full flux. */
  trialVolts: number;
  searchTurns: number;
  searchVolts: number;
  problems: string[];
  score: number;
  why: string;
}
