import { Button } from '@blueprintjs/core';
import { equipmentViewSchema, type EquipmentView } from '@shared/equipment';
import { useState } from 'react';
import { useFieldArray, useForm, useWatch, type Control } from 'react-hook-form';
import { DraftNotice, useDraft } from '../../../components/draft.js';
import { ChoiceField, TextField } from '../../../components/fields.js';
import { IntoView } from '../../../components/into-view.js';
import { ConflictNotice, ErrorNotice } from '../../../components/notices.js';
import { QuantityField } from '../../../components/quantity-field.js';
import { useTell } from '../../../components/toaster.js';
import { useUnits } from '../../../components/units.js';
import { showProblems, showServerProblems } from '../../../lib/form-problems.js';
import { ApiError } from '../../../lib/http.js';
import { useMay } from '../../../lib/me.js';
import { useSaveEquipment } from '../api/equipment-queries.js';
import { equipmentDifferences } from '../equipment-differences.js';
import { equipmentFormOf, newCable, newOven, newSupply, onTopOf, readEquipment, type EquipmentForm } from '../equipment-form.js';
import { t } from '../text.js';
import { ThingList } from './thing-list.js';
import './equipment.css';

const KIND_OPTIONS = [
  { value: 'variable', label: t('variable') },
  { value: 'taps', label: t('taps') },
];
const theirsOf = (error: unknown): EquipmentView | null => {
  if (!(error instanceof ApiError) || error.code !== 'CHANGED_MEANWHILE') return null;
  const theirs = equipmentViewSchema.safeParse(error.current);
  return theirs.success ? theirs.data : null;
};

/** Supplies, cables and ovens: read, changed and saved together. */
export function EquipmentEditor({ equipment }: { readonly equipment: EquipmentView }) {
  const units = useUnits();
  const tell = useTell();
  const save = useSaveEquipment();
  const mayEdit = useMay('equipment.edit');
  // what the form was filled from: tells, when two save at once, what was touched here
  const [began, setBegan] = useState(() => equipmentFormOf(equipment, units));
  const form = useForm<EquipmentForm>({ defaultValues: began });
  const { control, getValues, reset, setError, clearErrors } = form;
  const draft = useDraft(form, 'equipment');
  const [settled, setSettled] = useState<unknown>(null);
  const theirs = save.error === settled ? null : theirsOf(save.error);
  const mine = theirs ? onTopOf(getValues(), theirs, began, units) : null;
  const beginWith = (view: EquipmentView) => {
    const filled = equipmentFormOf(view, units);
    draft.forget();
    setBegan(filled);
    reset(filled);
  };
  const send = (values: EquipmentForm) => {
    clearErrors();
    const { input, problems } = readEquipment(values);
    if (!input) return showProblems(problems, setError);
    save.mutate(input, {
      onSuccess: (saved) => {
        beginWith(saved);
        tell(t('saved'));
      },
      onError: (error) => showServerProblems(error, setError),
    });
  };
  return (
    <form
      className="stack lb-equipment-form"
      noValidate
      onSubmit={(e) => {
        e.preventDefault();
        send(getValues());
      }}
    >
      <DraftNotice form={form} draft={draft} />
      {theirs && mine && (
        <IntoView>
          <ConflictNotice
            differences={equipmentDifferences(theirs, mine, units)}
            onTakeTheirs={() => {
              beginWith(theirs);
              setSettled(save.error);
            }}
            onKeepMine={() => {
              const merged = onTopOf(getValues(), theirs, began, units);
              setBegan(equipmentFormOf(theirs, units));
              reset(merged, { keepDefaultValues: true });
              send(merged);
            }}
          />
        </IntoView>
      )}
      <Supplies control={control} mayEdit={mayEdit} />
      <Cables control={control} mayEdit={mayEdit} />
      <Ovens control={control} mayEdit={mayEdit} />
      {!theirs && save.error !== settled && <ErrorNotice error={save.error} />}
      {mayEdit ? (
        <div className="row lb-equipment-foot">
          <Button type="submit" intent="primary" text={t('save')} loading={save.isPending} />
          {draft.dirty && <span className="muted">{t('unsaved')}</span>}
        </div>
      ) : (
        <p className="muted">{t('mayNot')}</p>
      )}
    </form>
  );
}

interface ListProps {
  readonly control: Control<EquipmentForm>;
  readonly mayEdit: boolean;
}

function Supplies({ control, mayEdit }: ListProps) {
  const units = useUnits();
  const { fields, append, remove } = useFieldArray({ control, name: 'supplies', keyName: 'key' });
  const typed = useWatch({ control, name: 'supplies' });
  return (
    <ThingList
      title={t('supplies')}
      help={t('suppliesHelp')}
      none={t('noSupplies')}
      add={t('addSupply')}
      things={fields.map((f, i) => ({ key: f.key, name: typed[i]?.name ?? '', isNew: f.id === null }))}
      nameOf={(n) => t('supplyNo', { n })}
      mayEdit={mayEdit}
      onAdd={() => append(newSupply(units), { focusName: `supplies.${fields.length}.name` })}
      onRemove={remove}
      fields={(i) => (
        <>
          <TextField control={control} name={`supplies.${i}.name`} label={t('name')} help={t('nameHelp')} />
          <ChoiceField control={control} name={`supplies.${i}.kind`} label={t('kind')} options={KIND_OPTIONS} />
          {typed[i]?.kind === 'taps' ? (
            <TextField control={control} name={`supplies.${i}.tapsV`} label={t('tapsV')} help={t('tapsHelp')} />
          ) : (
            <>
              <QuantityField control={control} name={`supplies.${i}.minVoltsV`} kind="voltage" label={t('minVolts')} />
              <QuantityField control={control} name={`supplies.${i}.maxVoltsV`} kind="voltage" label={t('maxVolts')} usual={[5, 690]} />
            </>
          )}
          <QuantityField control={control} name={`supplies.${i}.maxAmpsA`} kind="current" label={t('maxAmps')} usual={[5, 1500]} />
          <QuantityField control={control} name={`supplies.${i}.frequencyHz`} kind="frequency" label={t('frequency')} usual={[50, 60]} />
        </>
      )}
    />
  );
}

function Cables({ control, mayEdit }: ListProps) {
  const units = useUnits();
  const { fields, append, remove } = useFieldArray({ control, name: 'cables', keyName: 'key' });
  const typed = useWatch({ control, name: 'cables' });
  return (
    <ThingList
      title={t('cables')}
      help={t('cablesHelp')}
      none={t('noCables')}
      add={t('addCable')}
      things={fields.map((f, i) => ({ key: f.key, name: typed[i]?.name ?? '', isNew: f.id === null }))}
      nameOf={(n) => t('cableNo', { n })}
      mayEdit={mayEdit}
      onAdd={() => append(newCable(units), { focusName: `cables.${fields.length}.name` })}
      onRemove={remove}
      fields={(i) => (
        <>
          <TextField control={control} name={`cables.${i}.name`} label={t('name')} help={t('nameHelp')} />
          <QuantityField control={control} name={`cables.${i}.crossSectionM2`} kind="area" label={t('section')} usual={[1.5e-6, 300e-6]} />
          <QuantityField control={control} name={`cables.${i}.lengthM`} kind="cable-length" label={t('length')} usual={[5, 150]} />
          <QuantityField control={control} name={`cables.${i}.maxAmpsA`} kind="current" label={t('maxAmps')} usual={[10, 800]} />
        </>
      )}
    />
  );
}

function Ovens({ control, mayEdit }: ListProps) {
  const units = useUnits();
  const { fields, append, remove } = useFieldArray({ control, name: 'ovens', keyName: 'key' });
  const typed = useWatch({ control, name: 'ovens' });
  return (
    <ThingList
      title={t('ovens')}
      help={t('ovensHelp')}
      none={t('noOvens')}
      add={t('addOven')}
      things={fields.map((f, i) => ({ key: f.key, name: typed[i]?.name ?? '', isNew: f.id === null }))}
      nameOf={(n) => t('ovenNo', { n })}
      mayEdit={mayEdit}
      onAdd={() => append(newOven(units), { focusName: `ovens.${fields.length}.name` })}
      onRemove={remove}
      fields={(i) => (
        <>
          <TextField control={control} name={`ovens.${i}.name`} label={t('name')} help={t('nameHelp')} />
          <TextField control={control} name={`ovens.${i}.thermocoupleCheckedOn`} type="date" label={t('checkedOn')} optional />
          <QuantityField control={control} name={`ovens.${i}.thermocoupleOffsetK`} kind="temperature-difference" label={t('offset')} help={t('offsetHelp')} optional usual={[-15, 15]} />
          <TextField control={control} name={`ovens.${i}.remark`} label={t('remark')} optional wide />
        </>
      )}
    />
  );
}
