/** Standard (k = 1) uncertainties of what a core test is made of. `…Rel` are fractions of the value. */
export interface ReadingUncertainty {
  /** Gain of the voltmeter: the same in both tests, so it cancels between before and after. */
  voltsRel: number;
  /** Gain of the wattmeter: cancels likewise. */
  wattsRel: number;
  /** Phase error of the wattmeter: does not cancel, because the power factor changes with the core. */
  phaseErrorRad: number;
  /** Area from the measured size, stacking apart. */
  areaRel: number;
  stackingRel: number;
  /** What mass has beyond the area: density and mean path. */
  massRel: number;
  frequencyRel: number;
  /** Reading-to-reading spread of the volts: never cancels. */
  voltsRepeatRel: number;
  wattsRepeatRel: number;
  /** Resistance of the exciting cable, warming included; counts only when the wattmeter lead sat on it. */
  cableResistanceRel: number;
  /** Standard uncertainty of the flux exponent. */
  exponent: number;
  /** Hottest spot less mean, both from the same thermometer or picture. */
  hotSpotK: number;
  clampMeter: boolean;
}
