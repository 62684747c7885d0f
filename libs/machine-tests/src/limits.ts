/** S: a standard carries it. P: common practice, no standard behind it. C: the customer's contract. */
export type Standing = 'S' | 'P' | 'C';

/** One acceptance limit: the figure in SI, its unit, and what stands behind it. */
export interface MachineTestLimit {
  value: number;
  /** Unit of `value`; '1' is a fraction of 1. */
  unit: string;
  source: string;
  standing: Standing;
}

const standard = (value: number, unit: string, source: string): MachineTestLimit => ({ value, unit, source, standing: 'S' });
const practice = (value: number, unit: string, source: string): MachineTestLimit => ({ value, unit, source: `Common practice: ${source}`, standing: 'P' });

const IEEE43 = 'IEEE 43-2013, one minute, at 40 °C (figure from memory)';
const HIGH_POTENTIAL = 'ANSI/EASA AR100, NEMA MG 1, IEC 60034-1 (AC figures from memory)';
const VIBRATION = 'IEC 60034-14:2003, grade A';
const VIBRATION_B = 'IEC 60034-14:2003, grade B';
const NEMA_VIBRATION = 'NEMA MG 1 Part 7, as in ANSI/EASA AR100-2015 4.5.6';

/**
 * The limits the product ships with, every one to be confirmed by the shop's engineer. A limit of zero named `…Floor`
 * or `…Above` adds nothing until the shop sets it.
 */
export const DEFAULT_MACHINE_TEST_LIMITS = {
  insulationRandomOhm: standard(5e6, 'Ω', IEEE43),
  insulationFormOhm: standard(100e6, 'Ω', IEEE43),
  insulationArmatureOhm: standard(5e6, 'Ω', `${IEEE43}; the 2000 edition asked for 100 MΩ`),
  /** kV + 1 MΩ: the 1 MΩ; every rated volt adds 1000 Ω. */
  insulationFieldBaseOhm: standard(1e6, 'Ω', 'IEEE 43, rated kV + 1 MΩ at 40 °C'),
  insulationNewWindingOhm: practice(100e6, 'Ω', 'a new winding reaches 100 MΩ at 40 °C before varnish and at the final test'),
  polarizationIndex: standard(2, '1', 'IEEE 43, form-wound, thermal class 130 and up'),
  polarizationIndexNotAboveOhm: standard(5e9, 'Ω', 'IEEE 43, over 5000 MΩ the index is no judge (from memory)'),
  unbalanceRandom: practice(0.02, '1', '2 % of the mean, random-wound, quoted from ANSI/EASA AR100-2020'),
  unbalanceForm: practice(0.01, '1', '1 % of the mean, form-wound, quoted from ANSI/EASA AR100-2020'),
  asFoundBelow: practice(0.05, '1', 'up to 5 % under the as-found resistance at the same temperature'),
  asFoundAbove: practice(0.03, '1', 'up to 3 % over the as-found resistance at the same temperature'),
  surgeDifference: practice(0.1, '1', 'two phases differ by 10 % at most, no rotor in the bore'),
  highPotentialBaseV: standard(1000, 'V', `${HIGH_POTENTIAL}: 2 U + 1000 V for one minute`),
  highPotentialFloorV: practice(0, 'V', 'no floor; a shop that works to IEC 60034-1 sets 1500 V'),
  highPotentialSmallV: standard(1000, 'V', `${HIGH_POTENTIAL}: up to 0.5 hp and 250 V`),
  highPotentialLowVoltageV: standard(500, 'V', 'ANSI/EASA AR100: windings rated 35 V or less'),
  highPotentialDcFactor: standard(1.7, '1', 'ANSI/EASA AR100: DC is 1.7 times AC'),
  highPotentialRepeat: standard(0.8, '1', `${HIGH_POTENTIAL}: a second full test at 80 %`),
  highPotentialReconditioned: standard(0.65, '1', 'ANSI/EASA AR100 4.4: reconditioned at 65 % (from memory)'),
  highPotentialPartRewound: standard(0.75, '1', 'IEC 60034-1 9.2: partly rewound at 75 % (from memory)'),
  highPotentialSeconds: standard(60, 's', HIGH_POTENTIAL),
  noLoadCurrentBalance: practice(0.05, '1', '5 % of the mean at balanced volts'),
  noLoadVoltsBalance: standard(0.01, '1', 'NEMA MG 1: run with volts balanced within 1 %'),
  noLoadCurrentLevel: practice(0.1, '1', 'within 10 % of the as-found value or an earlier visit'),
  vibrationFreeTo132: standard(1.6e-3, 'm/s', `${VIBRATION}, free suspension, shaft height to 132 mm`),
  vibrationFreeTo280: standard(2.2e-3, 'm/s', `${VIBRATION}, free suspension, shaft height over 132 to 280 mm`),
  vibrationFreeAbove280: standard(2.8e-3, 'm/s', `${VIBRATION}, free suspension, shaft height over 280 mm`),
  vibrationRigidTo132: standard(1.3e-3, 'm/s', `${VIBRATION}, rigid mounting, shaft height to 132 mm`),
  vibrationRigidTo280: standard(1.8e-3, 'm/s', `${VIBRATION}, rigid mounting, shaft height over 132 to 280 mm`),
  vibrationRigidAbove280: standard(2.3e-3, 'm/s', `${VIBRATION}, rigid mounting, shaft height over 280 mm`),
  vibrationGradeBFreeTo132: standard(0.7e-3, 'm/s', `${VIBRATION_B}, free suspension, shaft height to 132 mm`),
  vibrationGradeBFreeTo280: standard(1.1e-3, 'm/s', `${VIBRATION_B}, free suspension, shaft height over 132 to 280 mm`),
  vibrationGradeBFreeAbove280: standard(1.8e-3, 'm/s', `${VIBRATION_B}, free suspension, shaft height over 280 mm`),
  vibrationGradeBRigidTo280: standard(0.9e-3, 'm/s', `${VIBRATION_B}, rigid mounting, shaft height over 132 to 280 mm`),
  vibrationGradeBRigidAbove280: standard(1.5e-3, 'm/s', `${VIBRATION_B}, rigid mounting, shaft height over 280 mm`),
  vibrationNemaResilient: standard(3.81e-3, 'm/s', `${NEMA_VIBRATION}: 0.15 in/s peak, resilient mounting`),
  vibrationNemaRigid: standard(3.048e-3, 'm/s', `${NEMA_VIBRATION}: 0.8 of resilient, 0.12 in/s peak`),
  bearingRiseK: practice(45, 'K', 'housing 45 K over ambient'),
  bearingRiseTwoPoleK: practice(50, 'K', 'housing 50 K over ambient, two-pole machines'),
  bearingStableK: practice(2, 'K', 'stable when it changes by 2 K at most in half an hour'),
} satisfies Record<string, MachineTestLimit>;

export type MachineTestLimitKey = keyof typeof DEFAULT_MACHINE_TEST_LIMITS;

/** The acceptance limits a machine's tests are judged by: data of the shop, versioned, never code. */
export type MachineTestLimits = Readonly<Record<MachineTestLimitKey, MachineTestLimit>>;
