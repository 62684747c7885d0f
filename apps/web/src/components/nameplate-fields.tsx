import { get, useFormState, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { CONNECTION_OPTIONS, KIND_OPTIONS } from '../lib/machine-words.js';
import { defineText } from '../lib/text.js';
import { CheckField, SelectField, TextField } from './fields.js';
import { Fold } from './fold.js';
import { QuantityField } from './quantity-field.js';

const t = defineText({
  description: 'What it is',
  descriptionHelp: 'As you would call it across the shop: “75 kW 6-pole pump motor”.',
  kind: 'Kind',
  maker: 'Maker',
  model: 'Type on the plate',
  serial: 'Serial number',
  ratedPowerW: 'Rated power',
  ratedVoltageV: 'Rated voltage',
  connection: 'Connection',
  ratedFrequencyHz: 'Rated frequency',
  ratedSpeedRpm: 'Rated speed',
  ratedCurrentA: 'Rated current',
  poles: 'Poles',
  powerFactor: 'Power factor',
  efficiencyPercent: 'Efficiency',
  frame: 'Frame size',
  mounting: 'Mounting',
  enclosure: 'Enclosure',
  ingressProtection: 'Protection (IP)',
  thermalClass: 'Thermal class',
  duty: 'Duty',
  bearingDriveEnd: 'Bearing, drive end',
  bearingNonDriveEnd: 'Bearing, non-drive end',
  explosiveAtmosphere: 'For explosive atmospheres (Ex)',
  explosiveHelp: 'It keeps its winding data: it may not be redesigned.',
  more: 'The rest of the plate',
});

interface NameplateFieldsProps<F extends FieldValues> {
  readonly control: Control<F>;
  /** where description and nameplate stand in the form, with a dot behind it; empty for the form itself */
  readonly at: string;
  /** what is seldom filled in at the counter stays folded */
  readonly folded?: boolean;
}

/** The nameplate by the fields of the standards; what cannot be read stays empty. */
export function NameplateFields<F extends FieldValues>({ control, at, folded = false }: NameplateFieldsProps<F>) {
  const name = (field: string) => `${at}nameplate.${field}` as FieldPath<F>;
  const { errors } = useFormState({ control });
  const wrongBelow = REST.some((field) => get(errors, name(field)) !== undefined);
  const text = (field: TextName) => <TextField control={control} name={name(field)} label={t(field)} optional />;
  const rest = (
    <div className="fields">
      <QuantityField control={control} name={name('powerFactor')} kind="number" label={t('powerFactor')} optional />
      <QuantityField control={control} name={name('efficiencyPercent')} kind="percent" label={t('efficiencyPercent')} optional usual={[0.5, 0.99]} />
      {text('model')}
      {text('frame')}
      {text('mounting')}
      {text('enclosure')}
      {text('ingressProtection')}
      {text('thermalClass')}
      {text('duty')}
      {text('bearingDriveEnd')}
      {text('bearingNonDriveEnd')}
    </div>
  );
  return (
    <div className="stack">
      <div className="fields">
        <TextField control={control} name={`${at}description` as FieldPath<F>} label={t('description')} help={t('descriptionHelp')} wide />
        <SelectField control={control} name={name('kind')} label={t('kind')} options={KIND_OPTIONS} />
        {text('serial')}
        {text('maker')}
        <QuantityField control={control} name={name('ratedPowerW')} kind="rated-power" label={t('ratedPowerW')} optional usual={[100, 20_000_000]} />
        <QuantityField control={control} name={name('ratedVoltageV')} kind="voltage" label={t('ratedVoltageV')} optional usual={[12, 15_000]} />
        <SelectField control={control} name={name('connection')} label={t('connection')} options={CONNECTION_OPTIONS} />
        <QuantityField control={control} name={name('ratedFrequencyHz')} kind="frequency" label={t('ratedFrequencyHz')} optional usual={[16, 400]} />
        <QuantityField control={control} name={name('ratedSpeedRpm')} kind="speed" label={t('ratedSpeedRpm')} optional usual={[50, 12_000]} />
        <QuantityField control={control} name={name('ratedCurrentA')} kind="current" label={t('ratedCurrentA')} optional usual={[0.1, 5000]} />
        <QuantityField control={control} name={name('poles')} kind="count" label={t('poles')} optional usual={[2, 24]} />
      </div>
      <CheckField control={control} name={name('explosiveAtmosphere')} label={t('explosiveAtmosphere')} help={t('explosiveHelp')} />
      {folded ? (
        <Fold summary={t('more')} open={wrongBelow}>
          {rest}
        </Fold>
      ) : (
        rest
      )}
    </div>
  );
}

/** What a mistake must not hide in. */
const REST = ['powerFactor', 'efficiencyPercent', 'model', 'frame', 'mounting', 'enclosure', 'ingressProtection', 'thermalClass', 'duty', 'bearingDriveEnd', 'bearingNonDriveEnd'];

type TextName = 'maker' | 'model' | 'serial' | 'frame' | 'mounting' | 'enclosure' | 'ingressProtection' | 'thermalClass' | 'duty' | 'bearingDriveEnd' | 'bearingNonDriveEnd';
