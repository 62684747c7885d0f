import { useFormContext, useController } from 'react-hook-form';
import { CheckField, ChoiceField, TextAreaField, TextField } from '../../../components/fields.js';
import { Panel } from '../../../components/panel.js';
import { QuantityField } from '../../../components/quantity-field.js';
import { t } from '../text.js';
import type { AssemblyValues, DismantlingValues, RepairValues, TreatmentValues } from '../workshop-forms.js';
import type { FieldsProps } from './record-form.js';

export function DismantlingFields(_: FieldsProps<'dismantling'>) {
  const { control } = useFormContext<DismantlingValues>();
  return (
    <Panel>
      <div className="stack">
        <CheckField control={control} name="rotorOut" label={t('rotorOut')} help={t('rotorOutHelp')} />
        <ChoiceField
          control={control}
          name="corePlate"
          label={t('corePlate')}
          help={t('corePlateHelp')}
          options={[
            { value: 'organic', label: t('organic') },
            { value: 'inorganic', label: t('inorganic') },
            { value: 'unknown', label: t('unknown') },
          ]}
        />
        <ChoiceField
          control={control}
          name="frameMaterial"
          label={t('frameMaterial')}
          options={[
            { value: 'cast-iron', label: t('castIron') },
            { value: 'steel', label: t('steel') },
            { value: 'aluminium', label: t('aluminium') },
          ]}
        />
        <CheckField control={control} name="commutatorOrSlipRings" label={t('commutator')} />
        <TextAreaField control={control} name="inspection" label={t('inspection')} help={t('inspectionHelp')} />
        <TextAreaField control={control} name="fits" label={t('fits')} help={t('fitsHelp')} optional />
      </div>
    </Panel>
  );
}

const METHODS = [
  ['separate', 'separate'],
  ['grind', 'grind'],
  ['etch', 'etch'],
  ['restack', 'restack'],
  ['re-insulate', 'reInsulate'],
  ['new-laminations', 'newLaminations'],
] as const;

export function CoreRepairFields(_: FieldsProps<'core-repair'>) {
  const { control } = useFormContext<RepairValues>();
  const { field, fieldState } = useController({ control, name: 'methods' });
  const toggle = (method: RepairValues['methods'][number]) => field.onChange(field.value.includes(method) ? field.value.filter((m) => m !== method) : [...field.value, method]);
  return (
    <Panel>
      <div className="stack">
        <fieldset className="lb-many">
          <legend>{t('repairMethods')}</legend>
          <div className="row">
            {METHODS.map(([method, word], i) => (
              <button key={method} type="button" role="checkbox" aria-checked={field.value.includes(method)} ref={i === 0 ? field.ref : undefined} onClick={() => toggle(method)} onBlur={field.onBlur}>
                {t(word)}
              </button>
            ))}
          </div>
          {fieldState.error && (
            <p className="lb-problem" role="alert">
              {fieldState.error.message}
            </p>
          )}
        </fieldset>
        <div className="fields">
          <QuantityField control={control} name="slotFrom" kind="count" label={t('slotFrom')} optional />
          <QuantityField control={control} name="slotTo" kind="count" label={t('slotTo')} optional />
        </div>
        <TextAreaField control={control} name="words" label={t('repairWords')} help={t('repairAfter')} />
      </div>
    </Panel>
  );
}

export function TreatmentFields(_: FieldsProps<'treatment'>) {
  const { control } = useFormContext<TreatmentValues>();
  return (
    <Panel>
      <div className="stack">
        <ChoiceField
          control={control}
          name="process"
          label={t('process')}
          options={[
            { value: 'dip-and-bake', label: t('dipAndBake') },
            { value: 'vacuum-pressure', label: t('vacuumPressure') },
            { value: 'trickle', label: t('trickle') },
            { value: 'roll-dip', label: t('rollDip') },
          ]}
        />
        <div className="fields">
          <TextField control={control} name="material" label={t('material')} />
          <TextField control={control} name="batch" label={t('batch')} optional />
          <QuantityField control={control} name="bakeTemperatureC" kind="temperature" label={t('bakeTemperature')} usual={[80, 200]} />
          <QuantityField control={control} name="bakeMinutes" kind="duration" label={t('bakeMinutes')} usual={[30, 1440]} />
          <QuantityField control={control} name="cycles" kind="count" label={t('cycles')} usual={[1, 4]} />
        </div>
      </div>
    </Panel>
  );
}

export function AssemblyFields(_: FieldsProps<'assembly'>) {
  const { control } = useFormContext<AssemblyValues>();
  return (
    <Panel>
      <div className="stack">
        <div className="fields">
          <TextField control={control} name="bearingDriveEnd" label={t('bearingDriveEnd')} />
          <TextField control={control} name="bearingNonDriveEnd" label={t('bearingNonDriveEnd')} />
          <TextField control={control} name="grease" label={t('grease')} optional />
        </div>
        <CheckField control={control} name="turnsFreely" label={t('turnsFreely')} />
        <TextAreaField control={control} name="words" label={t('assemblyWords')} optional />
      </div>
    </Panel>
  );
}
