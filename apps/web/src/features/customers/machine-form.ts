import type { Kind, UnitSystem } from '@libs/quantities';
import { machineViewSchema, updateMachineSchema, type MachineView, type Nameplate, type UpdateMachine } from '@shared/machines';
import type { Difference } from '../../components/notices.js';
import { problemsOf } from '../../lib/form-problems.js';
import { connectionName, machineKindName } from '../../lib/machine-words.js';
import { nameplateFormOf, readNameplate, type NameplateForm } from '../../lib/nameplate-form.js';
import { plateFigure } from '../../lib/plate-words.js';
import { FormReader, type FormProblem } from '../../lib/typed.js';
import { t } from './text.js';

export interface MachineForm {
  description: string;
  nameplate: NameplateForm;
}

export const machineFormOf = ({ description, nameplate }: Pick<MachineView, 'description' | 'nameplate'>, system: UnitSystem): MachineForm => ({ description, nameplate: nameplateFormOf(nameplate, system) });

/** The form as the contract takes it, or everything that is wrong with it, each at its field. */
export function machineInputOf(form: MachineForm, version: number): { readonly input: UpdateMachine } | { readonly problems: readonly FormProblem[] } {
  const reader = new FormReader();
  const candidate = { version, description: form.description, nameplate: readNameplate(form.nameplate, reader, 'nameplate') };
  const parsed = updateMachineSchema.safeParse(candidate);
  const problems = [...reader.problems, ...(parsed.success ? [] : problemsOf(parsed.error))];
  return parsed.success && problems.length === 0 ? { input: parsed.data } : { problems };
}

export function theirsOf(current: unknown): MachineView | null {
  const parsed = machineViewSchema.safeParse(current);
  return parsed.success ? parsed.data : null;
}

type Row = readonly [key: keyof Nameplate, label: string, kind?: Kind];
const ROWS: readonly Row[] = [
  ['kind', t('kind')],
  ['maker', t('maker')],
  ['model', t('model')],
  ['serial', t('serial')],
  ['ratedPowerW', t('ratedPower'), 'rated-power'],
  ['ratedVoltageV', t('ratedVoltage'), 'voltage'],
  ['connection', t('connection')],
  ['ratedFrequencyHz', t('frequency'), 'frequency'],
  ['ratedSpeedRpm', t('speed'), 'speed'],
  ['ratedCurrentA', t('current'), 'current'],
  ['poles', t('poles')],
  ['powerFactor', t('powerFactor')],
  ['efficiencyPercent', t('efficiency')],
  ['frame', t('frame')],
  ['mounting', t('mounting')],
  ['enclosure', t('enclosure')],
  ['ingressProtection', t('protection')],
  ['thermalClass', t('thermalClass')],
  ['duty', t('duty')],
  ['bearingDriveEnd', t('bearings')],
  ['bearingNonDriveEnd', t('bearings')],
  ['explosiveAtmosphere', t('ex')],
];

function shown(nameplate: Nameplate, [key, , kind]: Row, system: UnitSystem): string {
  const value = nameplate[key];
  if (value === null || value === '') return '–';
  if (key === 'kind') return machineKindName(nameplate.kind);
  if (key === 'connection') return connectionName(nameplate.connection);
  if (key === 'efficiencyPercent') return `${String(value)} %`;
  if (typeof value === 'boolean') return value ? t('yes') : t('no');
  return kind && typeof value === 'number' ? plateFigure(value, kind, system) : String(value);
}

/** What stands on the plate, for reading. */
export const plateRows = (nameplate: Nameplate, system: UnitSystem): (readonly [string, string])[] => ROWS.map((row) => [row[0] === 'bearingDriveEnd' ? `${row[1]} DE` : row[0] === 'bearingNonDriveEnd' ? `${row[1]} NDE` : row[1], shown(nameplate, row, system)] as const);

/** What two people typed, side by side, only where it differs. */
export function machineDifferences(theirs: MachineView, yours: { readonly description: string; readonly nameplate: Nameplate }, system: UnitSystem): Difference[] {
  const description = theirs.description === yours.description ? [] : [{ label: t('description'), theirs: theirs.description, yours: yours.description }];
  const theirRows = plateRows(theirs.nameplate, system);
  const yourRows = plateRows(yours.nameplate, system);
  return [...description, ...theirRows.flatMap(([label, value], i) => (value === yourRows[i]![1] ? [] : [{ label, theirs: value, yours: yourRows[i]![1] }]))];
}
