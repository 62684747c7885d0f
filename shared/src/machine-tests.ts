import type { FinalTestPart } from '@libs/machine-tests';
import { z } from 'zod';
import { finite, idField, lineField } from './fields.js';
import type { MACHINE_KINDS } from './machines.js';
import type { Route } from './route.js';

/** Readings of the incoming test, before varnish and of the final test, as `@libs/machine-tests` takes them (SI). */
const three = (words: string) => z.tuple([finite(words), finite(words), finite(words)]);

export const insulationReadingSchema = z.strictObject({
  windingKind: z.enum(['random-wound', 'form-wound', 'dc-armature', 'field']),
  ratedVoltageV: finite('A voltage.'),
  testVoltsV: finite('A voltage.'),
  resistanceOhm: finite('A resistance.'),
  windingTemperatureC: finite('A temperature.'),
  correctionRule: z.enum(['halving', 'thermosetting']),
  tenMinuteResistanceOhm: finite('A resistance.').optional(),
});
export const windingResistanceReadingSchema = z.strictObject({
  resistancesOhm: three('A resistance.'),
  windingTemperatureC: finite('A temperature.'),
  construction: z.enum(['random-wound', 'form-wound', 'concentric']),
});

const meters = (names: readonly string[]) => z.strictObject(Object.fromEntries(names.map((n) => [n, idField.optional()]))).default({});
const remark = lineField(400).default('');

export const incomingTestReadingsSchema = z.strictObject({
  insulation: insulationReadingSchema,
  windingResistance: windingResistanceReadingSchema.nullable(),
  instruments: meters(['insulationTesterId', 'microOhmmeterId']),
  remark,
});

export const beforeVarnishReadingsSchema = z.strictObject({
  insulation: insulationReadingSchema,
  windingResistance: windingResistanceReadingSchema.nullable(),
  surgeDifferenceFraction: finite('A percentage.').nullable(),
  surgePeakV: finite('A voltage.').nullable(),
  polarityRight: z.boolean().nullable(),
  instruments: meters(['insulationTesterId', 'microOhmmeterId', 'surgeTesterId']),
  remark,
});

export const finalTestReadingsSchema = z.strictObject({
  insulation: insulationReadingSchema,
  windingResistance: windingResistanceReadingSchema.nullable(),
  highPotential: z
    .strictObject({
      case: z.enum(['new-winding', 'repeat', 'reconditioned', 'part-rewound', 'wound-rotor', 'wound-rotor-reversing']),
      ratedVoltageV: finite('A voltage.'),
      secondaryVoltsV: finite('A voltage.').optional(),
      ratedPowerW: finite('A power.').nullable(),
      supply: z.enum(['ac', 'dc']),
      appliedVoltsV: finite('A voltage.'),
      seconds: finite('Seconds.'),
      held: z.boolean(),
    })
    .nullable(),
  noLoad: z
    .strictObject({
      points: z.array(z.strictObject({ voltsV: three('A voltage.'), ampsA: three('A current.'), wattsW: finite('Watts.') })).min(1, 'At least one point.').max(40),
      lineResistanceOhm: finite('A resistance.'),
      frequencyHz: finite('A frequency.'),
      speedRpm: finite('A speed.').nullable(),
      ratedVoltageV: finite('A voltage.').optional(),
    })
    .nullable(),
  vibration: z
    .strictObject({
      standard: z.enum(['iec-60034-14-2003', 'nema-mg1']),
      mounting: z.enum(['free-suspension', 'rigid']),
      shaftHeightM: finite('A length.').nullable(),
      speedRpm: finite('A speed.').nullable(),
      velocitiesMPerS: z.array(finite('A velocity.')).min(1, 'At least one place.').max(12),
    })
    .nullable(),
  directionRight: z.boolean().nullable(),
  bearings: z
    .strictObject({ driveEndC: finite('A temperature.'), nonDriveEndC: finite('A temperature.'), ambientC: finite('A temperature.'), changeInHalfHourK: finite('Kelvin.'), poles: z.number().int().min(2).max(120) })
    .nullable(),
  surgeDifferenceFraction: finite('A percentage.').nullable().default(null),
  instruments: meters(['insulationTesterId', 'microOhmmeterId', 'highPotentialTesterId', 'surgeTesterId', 'vibrationMeterId', 'wattmeterId', 'ammeterId', 'voltmeterId', 'thermometerId']),
  remark,
});
export type FinalTestReadingsInput = z.infer<typeof finalTestReadingsSchema>;
export type BeforeVarnishReadingsInput = z.infer<typeof beforeVarnishReadingsSchema>;
export type IncomingTestReadingsInput = z.infer<typeof incomingTestReadingsSchema>;

/** The parts a final test must have, by what the machine is and what was done with it (shop practice). */
export function demandedFinalTestParts(kind: (typeof MACHINE_KINDS)[number], route: Route): FinalTestPart[] {
  if (kind === 'ac-magnet' || route === 'coil-rewind') return ['insulation', 'high-potential'];
  if (kind === 'dc') return ['insulation', 'high-potential', 'vibration', 'direction'];
  return ['insulation', 'winding-resistance', 'high-potential', 'no-load', 'vibration', 'direction'];
}
