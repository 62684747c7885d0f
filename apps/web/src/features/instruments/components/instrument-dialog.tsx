import { Button, Dialog, DialogBody, DialogFooter } from '@blueprintjs/core';
import type { InstrumentView } from '@shared/instruments';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { SelectField, TextField } from '../../../components/fields.js';
import { ConflictNotice, ErrorNotice } from '../../../components/notices.js';
import { QuantityField } from '../../../components/quantity-field.js';
import { useTell } from '../../../components/toaster.js';
import { useUnits } from '../../../components/units.js';
import { showProblems, showServerProblems } from '../../../lib/form-problems.js';
import { ApiError, newKey } from '../../../lib/http.js';
import { useKeepInstrument } from '../api/instrument-queries.js';
import { blankInstrument, instrumentFrom, readInstrument, type InstrumentValues } from '../instrument-form.js';
import { INSTRUMENT_KIND_OPTIONS, instrumentKindName, t } from '../text.js';

const LABELS = ['tag', 'kind', 'description', 'serial', 'percentOfReading', 'percentOfRange', 'rangeText', 'calibratedOn', 'dueOn', 'certificateNumber'] as const;
const shown = (instrument: Pick<InstrumentView, (typeof LABELS)[number]>, field: (typeof LABELS)[number]): string => (field === 'kind' ? instrumentKindName(instrument.kind) : String(instrument[field]));

/** Adds an instrument, or changes one: a new calibration, a new tag. */
export function InstrumentDialog({ instrument, onClose }: { readonly instrument: InstrumentView | null; readonly onClose: () => void }) {
  const system = useUnits();
  const tell = useTell();
  const [key] = useState(newKey);
  const [version, setVersion] = useState(instrument?.version ?? 1);
  const keep = useKeepInstrument(key);
  const { control, getValues, setError, clearErrors, reset } = useForm<InstrumentValues>({ defaultValues: instrument ? instrumentFrom(instrument, system) : blankInstrument(system) });
  const save = (as: number) => {
    clearErrors();
    const { input, problems } = readInstrument(getValues());
    if (problems.length > 0) return showProblems(problems, setError);
    keep.mutate(
      { input, of: instrument ? { id: instrument.id, version: as } : null },
      {
        onSuccess: (kept) => {
          tell(t('saved', { tag: kept.tag }));
          onClose();
        },
        onError: (error) => showServerProblems(error, setError),
      },
    );
  };
  const theirs = keep.error instanceof ApiError && keep.error.code === 'CHANGED_MEANWHILE' ? (keep.error.current as InstrumentView) : null;
  const mine = theirs ? readInstrument(getValues()).input : null;
  return (
    <Dialog isOpen onClose={onClose} title={instrument ? t('edit', { tag: instrument.tag }) : t('add')} style={{ width: 'min(720px, 94vw)' }}>
      <form
        noValidate
        onSubmit={(e) => {
          e.preventDefault();
          save(version);
        }}
      >
        <DialogBody>
          <div className="stack">
            {theirs && mine ? (
              <ConflictNotice
                differences={LABELS.filter((field) => shown(theirs, field) !== shown(mine, field)).map((field) => ({ label: t(field), theirs: shown(theirs, field), yours: shown(mine, field) }))}
                onTakeTheirs={() => {
                  reset(instrumentFrom(theirs, system));
                  setVersion(theirs.version);
                  keep.reset();
                }}
                onKeepMine={() => {
                  setVersion(theirs.version);
                  save(theirs.version);
                }}
              />
            ) : (
              <ErrorNotice error={keep.error} />
            )}
            <div className="fields">
              <TextField control={control} name="tag" label={t('tag')} help={t('tagHelp')} autoFocus={instrument === null} />
              <SelectField control={control} name="kind" label={t('kind')} ask={t('choose')} options={INSTRUMENT_KIND_OPTIONS} />
              <TextField control={control} name="description" label={t('description')} optional wide />
              <TextField control={control} name="serial" label={t('serial')} optional />
              <TextField control={control} name="rangeText" label={t('rangeText')} optional />
              <QuantityField control={control} name="percentOfReading" kind="number" label={t('percentOfReading')} help={t('errorHelp')} usual={[0, 5]} />
              <QuantityField control={control} name="percentOfRange" kind="number" label={t('percentOfRange')} usual={[0, 5]} />
              <TextField control={control} name="calibratedOn" type="date" label={t('calibratedOn')} />
              <TextField control={control} name="dueOn" type="date" label={t('dueOn')} />
              <TextField control={control} name="certificateNumber" label={t('certificateNumber')} optional />
            </div>
          </div>
        </DialogBody>
        <DialogFooter
          actions={
            <>
              <Button text={t('cancel')} onClick={onClose} />
              <Button type="submit" intent="primary" text={t('save')} loading={keep.isPending} />
            </>
          }
        />
      </form>
    </Dialog>
  );
}
