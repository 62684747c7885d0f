import { z } from 'zod';
import { finite, idField, lineField, pageOf, pageQuery, requiredLine, versionField } from './fields.js';

export const MACHINE_KINDS = ['induction', 'slip-ring', 'synchronous', 'dc', 'ac-magnet', 'core-only'] as const;
export const FRAME_MATERIALS = ['cast-iron', 'steel', 'aluminium', 'none', 'unknown'] as const;
const positive = (max: number) => finite('A number.').refine((v) => v > 0 && v <= max, `More than 0, at most ${max}.`);

/** Nameplate, by the fields of IEC 60034-1 clause 10.2 and NEMA MG 1; what cannot be read stays null. */
export const nameplateFields = {
  kind: z.enum(MACHINE_KINDS),
  maker: lineField(80).default(''),
  model: lineField(80).default(''),
  serial: lineField(80).default(''),
  ratedPowerW: positive(1e9).nullable(),
  ratedVoltageV: positive(1e6).nullable(),
  connection: z.enum(['star', 'delta', 'single', 'dc', 'unknown']),
  ratedFrequencyHz: positive(1000).nullable(),
  ratedSpeedRpm: positive(1e5).nullable(),
  ratedCurrentA: positive(1e6).nullable(),
  poles: z.number().int().min(2).max(120).nullable(),
  powerFactor: finite('A number.').refine((v) => v > 0 && v <= 1, 'Between 0 and 1.').nullable(),
  efficiencyPercent: finite('A number.').refine((v) => v > 0 && v <= 100, 'Between 0 and 100.').nullable(),
  frame: lineField(40).default(''),
  mounting: lineField(20).default(''),
  enclosure: lineField(20).default(''),
  ingressProtection: lineField(10).default(''),
  thermalClass: lineField(10).default(''),
  duty: lineField(20).default(''),
  bearingDriveEnd: lineField(40).default(''),
  bearingNonDriveEnd: lineField(40).default(''),
  explosiveAtmosphere: z.boolean().default(false),
};
export const nameplateSchema = z.strictObject(nameplateFields);
export type Nameplate = z.infer<typeof nameplateSchema>;

export const createMachineSchema = z.strictObject({ description: requiredLine(120, 'Say what it is, like “75 kW 6-pole pump motor”.'), nameplate: nameplateSchema });
export type CreateMachine = z.infer<typeof createMachineSchema>;
export const updateMachineSchema = z.strictObject({ version: versionField, description: requiredLine(120), nameplate: nameplateSchema });
export type UpdateMachine = z.infer<typeof updateMachineSchema>;

/** Core geometry in metres; `@libs/core-loss` names what is wrong with it. */
export const coreGeometrySchema = z.strictObject({
  kind: z.enum(['stator', 'armature']),
  outerDiameterM: finite('A length.'),
  innerDiameterM: finite('A length.'),
  slotDepthM: finite('A length.'),
  slots: finite('A count.'),
  stackLengthM: finite('A length.'),
  ducts: finite('A count.'),
  ductWidthM: finite('A length.'),
  stackingFactor: finite('A number between 0 and 1.'),
  densityKgPerM3: finite('A density.'),
});

export const machineViewSchema = z.strictObject({
  id: idField,
  customerId: idField,
  customerName: z.string(),
  description: z.string(),
  nameplate: nameplateSchema,
  coreGeometry: coreGeometrySchema.nullable(),
  version: versionField,
  visits: z.array(z.strictObject({ jobId: idField, jobNumber: z.string(), receivedAt: z.string(), state: z.string(), step: z.string() })),
});
export type MachineView = z.infer<typeof machineViewSchema>;
export const machineRowSchema = z.strictObject({ id: idField, customerId: idField, customerName: z.string(), description: z.string(), serial: z.string(), visits: z.number().int(), lastJobNumber: z.string().nullable() });
export const machinePageSchema = pageOf(machineRowSchema);
export type MachinePage = z.infer<typeof machinePageSchema>;
export const machineQuerySchema = z.strictObject({ ...pageQuery, customerId: idField.optional(), q: lineField(80).optional() });
export type MachineQuery = z.infer<typeof machineQuerySchema>;
