import { InputGroup } from '@blueprintjs/core';
import type { LoadView } from '@shared/burnouts';
import { useState } from 'react';
import { Field } from '../../../components/field.js';
import { t } from '../text.js';
import { FileDrop } from './file-drop.js';

/** Another file takes the place of the one that is there, once it is said why; the first is not thrown away. */
export function AnotherFile({ load }: { readonly load: LoadView }) {
  const [reason, setReason] = useState('');
  return (
    <details className="lb-load-problems">
      <summary>{t('another')}</summary>
      <div className="stack">
        <Field label={t('anotherWhy')} help={t('anotherHelp')}>
          {({ id, describedBy }) => <InputGroup id={id} value={reason} maxLength={400} onChange={(e) => setReason(e.target.value)} aria-describedby={describedBy} />}
        </Field>
        {reason.trim() !== '' && <FileDrop load={load} reason={reason.trim()} onTaken={() => setReason('')} />}
      </div>
    </details>
  );
}
