import { TextArea } from '@blueprintjs/core';
import type { OvenInsight } from '@shared/insight';
import { useState } from 'react';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { Field } from '../../../components/field.js';
import { useTell } from '../../../components/toaster.js';
import { shopToday } from '../../../lib/format.js';
import { newKey } from '../../../lib/http.js';
import { useAddHistory } from '../api/oven-queries.js';
import { readHistoryLines } from '../history-lines.js';
import { t } from '../text.js';

/** What an older book says of an oven: lines of a day and a percentage, typed or pasted. */
export function AddHistory({ oven, onClose }: { readonly oven: OvenInsight['oven']; readonly onClose: () => void }) {
  const [key] = useState(newKey);
  const [text, setText] = useState('');
  const [problems, setProblems] = useState<readonly string[]>([]);
  const add = useAddHistory(oven.id, key);
  const tell = useTell();
  const send = () => {
    const read = readHistoryLines(text, shopToday(new Date()));
    setProblems(read.ok ? [] : read.problems);
    if (!read.ok) return;
    add.mutate(read.input, {
      onSuccess: () => {
        tell(t('added', { n: read.input.rows.length }));
        onClose();
      },
    });
  };
  return (
    <ConfirmDialog open title={t('addTitle', { name: oven.name })} confirm={t('addConfirm')} pending={add.isPending} error={add.error} onConfirm={send} onClose={onClose}>
      <p>{t('addWords')}</p>
      <Field label={t('rowsLabel')} problem={problems.length > 0 ? problems.slice(0, 5).join(' ') : undefined}>
        {({ id, describedBy, invalid }) => <TextArea id={id} fill rows={10} className="num" placeholder={t('addExample')} value={text} onChange={(e) => setText(e.target.value)} aria-describedby={describedBy} aria-invalid={invalid} />}
      </Field>
    </ConfirmDialog>
  );
}
