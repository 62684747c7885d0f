import { Button } from '@blueprintjs/core';
import type { MachineView, UpdateMachine } from '@shared/machines';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { DraftNotice, useDraft } from '../../../components/draft.js';
import { NameplateFields } from '../../../components/nameplate-fields.js';
import { ConflictNotice, ErrorNotice } from '../../../components/notices.js';
import { Facts, Panel } from '../../../components/panel.js';
import { useTell } from '../../../components/toaster.js';
import { useUnits } from '../../../components/units.js';
import { showProblems, showServerProblems } from '../../../lib/form-problems.js';
import { ApiError } from '../../../lib/http.js';
import { useMay } from '../../../lib/me.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useUpdateMachine } from '../api/customer-changes.js';
import { machineDifferences, machineFormOf, machineInputOf, plateRows, theirsOf, type MachineForm } from '../machine-form.js';
import { t } from '../text.js';

/** The nameplate, read and changed in place. */
export function MachinePlate({ machine }: { readonly machine: MachineView }) {
  const [editing, setEditing] = useState(false);
  const mayEdit = useMay('machines.edit');
  const units = useUnits();
  return (
    <Panel title={t('plate')} actions={mayEdit && !editing ? <Button text={t('edit')} onClick={() => setEditing(true)} /> : undefined}>
      {editing ? <EditMachine machine={machine} onDone={() => setEditing(false)} /> : <Facts rows={plateRows(machine.nameplate, units)} />}
    </Panel>
  );
}

function EditMachine({ machine, onDone }: { readonly machine: MachineView; readonly onDone: () => void }) {
  const units = useUnits();
  const update = useUpdateMachine(machine.id);
  const tell = useTell();
  const form = useForm<MachineForm>({ defaultValues: machineFormOf(machine, units) });
  const { control, clearErrors, handleSubmit, setError, reset } = form;
  const [basis] = useState(machine.version);
  const draft = useDraft(form, `machine:${machine.id}`, { basis });
  const [version, setVersion] = useState(machine.version);
  const [tried, setTried] = useState<UpdateMachine | null>(null);
  const theirs = update.error instanceof ApiError && update.error.code === 'CHANGED_MEANWHILE' ? theirsOf(update.error.current) : null;
  const send = (input: UpdateMachine) => {
    setTried(input);
    update.mutate(input, {
      onSuccess: () => {
        draft.forget();
        tell(t('saved'));
        onDone();
      },
      onError: (error) => showServerProblems(error, setError),
    });
  };
  const save = (values: MachineForm) => {
    const read = machineInputOf(values, version);
    if ('problems' in read) return showProblems(read.problems, setError);
    send(read.input);
  };
  return (
    <form
      className="stack"
      noValidate
      onSubmit={(e) => {
        e.preventDefault();
        sendForm({ clearErrors, handleSubmit }, save);
      }}
    >
      <DraftNotice form={form} draft={draft} />
      <NameplateFields control={control} at="" />
      {theirs && tried ? (
        <ConflictNotice
          differences={machineDifferences(theirs, tried, units)}
          onTakeTheirs={() => {
            reset(machineFormOf(theirs, units));
            setVersion(theirs.version);
            draft.forget();
            update.reset();
          }}
          onKeepMine={() => {
            setVersion(theirs.version);
            send({ ...tried, version: theirs.version });
          }}
        />
      ) : (
        <ErrorNotice error={unsaid(update.error, control)} />
      )}
      <div className="row">
        <Button type="submit" intent="primary" text={t('save')} loading={update.isPending} />
        <Button
          text={t('cancel')}
          onClick={() => {
            draft.forget();
            onDone();
          }}
        />
      </div>
    </form>
  );
}
