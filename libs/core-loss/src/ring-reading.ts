/** One reading of a ring test, as taken from the instruments. */
export interface RingReading {
  excitingTurns: number;
  searchTurns: number;
  searchVoltsV: number;
  /** An average-sensing meter scaled in rms shows flux rightly whatever the wave; a true-rms one needs the form factor. */
  voltmeter: 'average' | 'true-rms';
  /** rms over rectified mean of the search-coil volts; 1.1107 for a sine. */
  formFactor?: number;
  excitingA: number;
  /** Watts as the meter shows them, before any turns ratio or cable loss is taken off. */
  wattsW: number;
  /** Where the wattmeter's voltage lead sat. */
  wattmeterLead: 'search' | 'exciting';
  /** Needed when the lead sat on the exciting terminals: the loop cable's loss is in the watts. */
  cableResistanceOhm?: number;
  /** Parallel resistance of the instruments on the search coil, when it is not negligible. */
  searchBurdenOhm?: number;
  frequencyHz: number;
}

/** One reading reduced to what the core did. */
export interface ReducedReading {
  fluxDensityT: number;
  coreWatts: number;
  wattsPerKg: number;
  apparentVA: number;
  vaPerKg: number;
  fieldRmsAPerM: number;
  powerFactor: number;
  voltsPerTurn: number;
  excitingVoltsV: number;
  /** Loss of the exciting cable that was taken off the watts; absent when the lead sat on the search coil. */
  cableLossW?: number;
  /** True when a true-rms voltmeter was used without a form factor and a sine was taken for granted. */
  formFactorAssumedSine: boolean;
}
