/** How far a row stands: a value that follows from the grade's own name, one read in an open dataset, or one from memory. */
export type SteelStanding = 'by name' | 'read' | 'from memory' | 'from memory, unconfirmed';

/** A fully processed, non-oriented grade. Loss and polarization are what the standard guarantees, not what a sheet usually does. */
export interface ElectricalSteel {
  name: string;
  thicknessM: number;
  /** Largest loss at 1.5 T and 50 Hz: the name says it. */
  maxLossAt15WPerKg: number;
  /** Largest loss at 1.0 T and 50 Hz. */
  maxLossAt10WPerKg: number;
  /** Least polarization at 2500, 5000 and 10 000 A/m. */
  minPolarizationT: readonly [at2500: number, at5000: number, at10000: number];
  densityKgPerM3: number;
  /** Of everything but the loss at 1.5 T, which the name carries. */
  standing: SteelStanding;
  densityStanding: SteelStanding;
}

type Row = readonly [name: string, p15: number, p10: number, j2500: number, j5000: number, j10000: number, density: number, standing: 'M' | 'm', densityRead?: 'R'];
const ROWS: readonly Row[] = [
  ['M210-35A', 2.1, 0.9, 1.49, 1.6, 1.7, 7600, 'm'],
  ['M235-35A', 2.35, 0.95, 1.49, 1.6, 1.7, 7600, 'M'],
  ['M250-35A', 2.5, 1.0, 1.49, 1.6, 1.7, 7600, 'M'],
  ['M270-35A', 2.7, 1.1, 1.49, 1.6, 1.7, 7650, 'M'],
  ['M300-35A', 3.0, 1.2, 1.49, 1.6, 1.7, 7650, 'M'],
  ['M330-35A', 3.3, 1.3, 1.49, 1.6, 1.7, 7650, 'M'],
  ['M230-50A', 2.3, 1.0, 1.49, 1.6, 1.7, 7600, 'm'],
  ['M250-50A', 2.5, 1.05, 1.49, 1.6, 1.7, 7600, 'M'],
  ['M270-50A', 2.7, 1.1, 1.49, 1.6, 1.7, 7600, 'M', 'R'],
  ['M290-50A', 2.9, 1.15, 1.49, 1.6, 1.7, 7600, 'M'],
  ['M310-50A', 3.1, 1.25, 1.49, 1.6, 1.7, 7650, 'M', 'R'],
  ['M330-50A', 3.3, 1.35, 1.49, 1.6, 1.7, 7650, 'M', 'R'],
  ['M350-50A', 3.5, 1.5, 1.5, 1.6, 1.7, 7650, 'M'],
  ['M400-50A', 4.0, 1.7, 1.53, 1.63, 1.73, 7700, 'M', 'R'],
  ['M470-50A', 4.7, 2.0, 1.54, 1.64, 1.74, 7700, 'M', 'R'],
  ['M530-50A', 5.3, 2.3, 1.56, 1.65, 1.75, 7700, 'M', 'R'],
  ['M600-50A', 6.0, 2.6, 1.57, 1.66, 1.76, 7750, 'M', 'R'],
  ['M700-50A', 7.0, 3.0, 1.6, 1.69, 1.77, 7800, 'M', 'R'],
  ['M800-50A', 8.0, 3.6, 1.6, 1.7, 1.78, 7800, 'M', 'R'],
  ['M940-50A', 9.4, 4.2, 1.62, 1.72, 1.81, 7850, 'M'],
  ['M310-65A', 3.1, 1.25, 1.49, 1.6, 1.7, 7600, 'm'],
  ['M330-65A', 3.3, 1.35, 1.49, 1.6, 1.7, 7600, 'm'],
  ['M350-65A', 3.5, 1.5, 1.49, 1.6, 1.7, 7600, 'M'],
  ['M400-65A', 4.0, 1.7, 1.52, 1.62, 1.72, 7650, 'M'],
  ['M470-65A', 4.7, 2.0, 1.53, 1.63, 1.73, 7650, 'M'],
  ['M530-65A', 5.3, 2.3, 1.54, 1.64, 1.74, 7700, 'M'],
  ['M600-65A', 6.0, 2.6, 1.56, 1.66, 1.76, 7750, 'M'],
  ['M700-65A', 7.0, 3.0, 1.57, 1.67, 1.76, 7750, 'M'],
  ['M800-65A', 8.0, 3.6, 1.6, 1.7, 1.78, 7800, 'M'],
  ['M1000-65A', 10.0, 4.4, 1.61, 1.71, 1.8, 7800, 'M'],
  ['M600-100A', 6.0, 2.6, 1.53, 1.63, 1.72, 7600, 'm'],
  ['M700-100A', 7.0, 3.0, 1.54, 1.64, 1.73, 7650, 'm'],
  ['M800-100A', 8.0, 3.6, 1.56, 1.66, 1.75, 7700, 'm'],
  ['M1000-100A', 10.0, 4.4, 1.58, 1.68, 1.76, 7800, 'm'],
  ['M1300-100A', 13.0, 5.8, 1.6, 1.7, 1.78, 7800, 'm'],
];

const STANDINGS = { M: 'from memory', m: 'from memory, unconfirmed' } as const satisfies Record<string, SteelStanding>;
const thicknessOf = (name: string) => Number(/-(\d+)A$/.exec(name)?.[1]) / 1e5;

/**
 * The grades of EN 10106 (IEC 60404-8-4), fully processed. Guaranteed figures: a typical sheet of a grade is better, and makers differ,
 * so that a typical value is never called a limit.
 *
 * Source: EN 10106:2007/2015. Standing: the scope was read on catalogue pages; the loss at 1.5 T follows from the name; the rest from memory, row by
 * row as marked; densities marked read come from the Modelica Standard Library's records (BSD).
 */
export const EN_10106_STEELS: readonly ElectricalSteel[] = ROWS.map(([name, p15, p10, j2500, j5000, j10000, densityKgPerM3, standing, density]) => ({
  name,
  thicknessM: thicknessOf(name),
  maxLossAt15WPerKg: p15,
  maxLossAt10WPerKg: p10,
  minPolarizationT: [j2500, j5000, j10000],
  densityKgPerM3,
  standing: STANDINGS[standing],
  densityStanding: density === 'R' ? 'read' : STANDINGS[standing],
}));

/** An AISI type in one of the three sheets it is rolled in. */
export interface AisiSteel {
  name: string;
  gauge: 29 | 26 | 24;
  thicknessM: number;
  /** Largest loss at 1.5 T and 60 Hz in the older editions. */
  maxLossWPerLb: number;
  /** What a newer edition made of it, where that is known. */
  newerMaxLossWPerLb?: number;
  standing: SteelStanding;
}

const INCH = 0.0254;
const GAUGES = [
  [29, 0.014 * INCH],
  [26, 0.0185 * INCH],
  [24, 0.025 * INCH],
] as const;
const AISI: readonly (readonly [name: string, losses: readonly (number | undefined)[], standing: 'M' | 'm', newer?: readonly (number | undefined)[]])[] = [
  ['M-15', [1.45, 1.68, undefined], 'm'],
  ['M-19', [1.58, 1.74, 2.08], 'm', [1.55]],
  ['M-22', [1.68, 1.85, 2.18], 'm'],
  ['M-27', [1.8, 1.9, 2.25], 'm'],
  ['M-36', [1.9, 2.05, 2.4], 'M'],
  ['M-43', [undefined, 2.3, 2.7], 'M'],
  ['M-45', [undefined, 3.05, 3.6], 'M'],
  ['M-47', [undefined, 4.6, 5.6], 'm'],
];

/**
 * AISI names of ASTM A677 steels, 60 Hz, 1.5 T, W/lb. Editions moved some figures: M-19 of 0.36 mm was 1.58 and is 1.55.
 *
 * Source: ASTM A677, older edition. Standing: M-19 of 0.36 mm under 36F155 was read in course notes; all figures from memory, row by row as marked.
 */
export const AISI_STEELS: readonly AisiSteel[] = AISI.flatMap(([name, losses, standing, newer]) =>
  GAUGES.flatMap(([gauge, thicknessM], i): AisiSteel[] => {
    const loss = losses[i];
    const newerLoss = newer?.[i];
    if (loss === undefined) return [];
    return [{ name, gauge, thicknessM, maxLossWPerLb: loss, ...(newerLoss === undefined ? {} : { newerMaxLossWPerLb: newerLoss }), standing: newerLoss === undefined ? STANDINGS[standing] : 'from memory' }];
  }),
);

/**
 * Names of JIS C 2552 steels: thickness × 100, A, W/kg × 100 at 1.5 T and 50 Hz.
 *
 * Source: JIS C 2552. Standing: from memory; the names between the ends of the 0.35 and 0.65 mm rows unconfirmed.
 */
export const JIS_STEEL_NAMES: readonly string[] = [
  ...['210', '230', '250', '270', '300', '360', '440'].map((loss) => `35A${loss}`),
  ...['230', '250', '270', '290', '310', '350', '400', '470', '600', '700', '800', '1000', '1300'].map((loss) => `50A${loss}`),
  ...['800', '1000', '1300', '1600'].map((loss) => `65A${loss}`),
];
