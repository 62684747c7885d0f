import { Button, InputGroup } from '@blueprintjs/core';
import type { MachinePage } from '@shared/machines';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useController, useWatch, type UseFormReturn } from 'react-hook-form';
import { Field } from '../../../components/field.js';
import { NameplateFields } from '../../../components/nameplate-fields.js';
import { ErrorNotice } from '../../../components/notices.js';
import { machinesQuery } from '../../../lib/customer-queries.js';
import type { BookInForm } from '../book-in-form.js';
import { t } from '../text.js';
import { Hits } from './hits.js';

interface ChoiceProps {
  readonly form: UseFormReturn<BookInForm>;
  readonly onChosen: () => void;
}

/** A machine that was here before, or a new one by its nameplate. */
export function MachineChoice({ form, onChosen }: ChoiceProps) {
  const { control, setValue } = form;
  const customer = useWatch({ control, name: 'customer' });
  const machine = useWatch({ control, name: 'machine' });
  const { field, fieldState } = useController({ control, name: 'machine.machineId' });
  const [q, setQ] = useState('');
  const customerId = customer.kind === 'known' ? customer.customerId : null;
  const found = useQuery({ ...machinesQuery({ customerId: customerId ?? undefined, q: q.trim(), size: '8' }), enabled: machine.kind === 'known' && customerId !== null });
  const keep = { shouldDirty: true, shouldTouch: true };

  if (machine.kind === 'new' || customerId === null) {
    return (
      <>
        {customerId === null && <p className="muted">{t('machineOfNew')}</p>}
        <NameplateFields control={control} at="machine.details." folded />
        {customerId !== null && (
          <div>
            <Button variant="minimal" text={t('knownMachine')} onClick={() => setValue('machine.kind', 'known', keep)} />
          </div>
        )}
      </>
    );
  }
  const choose = (id: string, words: string) => {
    if (id !== machine.machineId) setValue('warrantyOfJobId', null, keep);
    setValue('machine.words', words, keep);
    field.onChange(id);
    form.clearErrors('machine.machineId');
    onChosen();
  };
  const hits = (found.data?.rows ?? []).map((row) => ({
    id: row.id,
    name: row.description,
    detail: [row.serial, visitWords(row)].filter(Boolean).join(', '),
  }));
  return (
    <>
      <Field label={t('findMachine')} help={t('findMachineHelp')} problem={fieldState.error?.message}>
        {({ id, describedBy, invalid }) => (
          <InputGroup id={id} className="lb-flow-search" inputRef={field.ref} type="search" autoComplete="off" autoFocus value={q} onChange={(e) => setQ(e.target.value)} aria-describedby={describedBy} aria-invalid={invalid} />
        )}
      </Field>
      <ErrorNotice error={found.error} />
      <Hits label={t('foundMachines')} hits={hits} chosen={machine.machineId} onChoose={(hit) => choose(hit.id, hit.name)} />
      {found.data && hits.length === 0 && !found.isFetching && <p role="status">{t('noMachine')}</p>}
      <div>
        <Button text={t('newMachine')} onClick={() => setValue('machine.kind', 'new', keep)} />
      </div>
    </>
  );
}

function visitWords({ visits, lastJobNumber }: MachinePage['rows'][number]): string {
  if (lastJobNumber === null) return t('firstVisit');
  return visits === 1 ? t('oneVisit', { job: lastJobNumber }) : t('visits', { n: visits, job: lastJobNumber });
}
