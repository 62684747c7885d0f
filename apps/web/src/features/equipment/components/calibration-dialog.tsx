import { Button, Dialog, DialogBody, DialogFooter } from '@blueprintjs/core';
import { AS_FOUND, type InstrumentDue } from '@shared/calibrations';
import { instrumentViewSchema } from '@shared/instruments';
import { useForm, useWatch } from 'react-hook-form';
import { DraftNotice, useDraft } from '../../../components/draft.js';
import { ChoiceField, TextAreaField, TextField } from '../../../components/fields.js';
import { Notice } from '../../../components/notice.js';
import { ErrorNotice } from '../../../components/notices.js';
import { QuantityField } from '../../../components/quantity-field.js';
import { useTell } from '../../../components/toaster.js';
import { useUnits } from '../../../components/units.js';
import { calendarDay } from '../../../lib/format.js';
import { showProblems, showServerProblems } from '../../../lib/form-problems.js';
import { ApiError } from '../../../lib/http.js';
import { useAddCalibration } from '../api/instrument-queries.js';
import { calibrationFormOf, readCalibration, type CalibrationForm } from '../calibration-form.js';
import { t } from '../instrument-text.js';

interface CalibrationDialogProps {
  readonly instrument: InstrumentDue;
  /** reads the instrument anew after somebody else changed it */
  readonly onReadAgain: () => void;
  readonly onClose: () => void;
}

/** The day an instrument is due on now, when somebody else changed it; '' when that cannot be read. */
function dueNow(error: unknown): string | null {
  if (!(error instanceof ApiError) || error.code !== 'CHANGED_MEANWHILE') return null;
  const current = instrumentViewSchema.pick({ dueOn: true }).safeParse({ dueOn: (error.current as { dueOn?: unknown } | undefined)?.dueOn });
  return current.success ? current.data.dueOn : '';
}

/** Enters a calibration as its certificate tells it, with how the instrument was found. */
export function CalibrationDialog({ instrument, onReadAgain, onClose }: CalibrationDialogProps) {
  const units = useUnits();
  const tell = useTell();
  const add = useAddCalibration(instrument.id);
  const form = useForm<CalibrationForm>({ defaultValues: calibrationFormOf(instrument, units) });
  const { control, getValues, setError, clearErrors } = form;
  const draft = useDraft(form, `calibration:${instrument.id}`);
  const asFound = useWatch({ control, name: 'asFound' });
  const changed = dueNow(add.error);
  const send = () => {
    clearErrors();
    const { input, problems } = readCalibration(getValues(), instrument.version);
    if (!input) return showProblems(problems, setError);
    add.mutate(input, {
      onSuccess: () => {
        draft.forget();
        tell(t('saved'));
        onClose();
      },
      onError: (error) => showServerProblems(error, setError),
    });
  };
  return (
    <Dialog isOpen onClose={onClose} title={t('recordTitle', { tag: instrument.tag })} style={{ width: 'min(720px, 94vw)' }}>
      <form
        noValidate
        onSubmit={(e) => {
          e.preventDefault();
          send();
        }}
      >
        <DialogBody>
          <div className="stack">
            <DraftNotice form={form} draft={draft} />
            <p className="muted">{t('recordHelp')}</p>
            {changed !== null ? (
              <Notice intent="warning" role="alert">
                <div className="row spread">
                  <span>{t('changedMeanwhile', { day: changed === '' ? '–' : calendarDay(changed) })}</span>
                  <Button
                    text={t('readAgain')}
                    onClick={() => {
                      add.reset();
                      onReadAgain();
                    }}
                  />
                </div>
              </Notice>
            ) : (
              <ErrorNotice error={add.error} />
            )}
            <div className="fields">
              <TextField control={control} name="calibratedOn" type="date" label={t('calibratedOn')} autoFocus />
              <TextField control={control} name="dueOn" type="date" label={t('dueOn')} />
              <TextField control={control} name="certificateNumber" label={t('certificateNumber')} optional />
              <TextField control={control} name="laboratory" label={t('laboratoryLabel')} help={t('laboratoryHelp')} optional />
              <ChoiceField control={control} name="asFound" label={t('asFound')} options={AS_FOUND.map((value) => ({ value, label: t(value) }))} wide />
              {asFound === 'outside' && <TextAreaField control={control} name="asFoundWords" label={t('asFoundWords')} help={t('asFoundWordsHelp')} />}
              <QuantityField control={control} name="percentOfReading" kind="number" label={t('percentOfReading')} help={t('percentHelp')} usual={[0, 5]} />
              <QuantityField control={control} name="percentOfRange" kind="number" label={t('percentOfRange')} usual={[0, 5]} />
            </div>
          </div>
        </DialogBody>
        <DialogFooter
          actions={
            <>
              <Button text={t('cancel')} onClick={onClose} />
              <Button type="submit" intent="primary" text={t('save')} loading={add.isPending} />
            </>
          }
        />
      </form>
    </Dialog>
  );
}
