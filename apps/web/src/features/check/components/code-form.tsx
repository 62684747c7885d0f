import { Button, InputGroup } from '@blueprintjs/core';
import { useState, type FormEvent } from 'react';
import { Field } from '../../../components/field.js';
import { readCode } from '../code-form.js';
import { t } from '../text.js';

export function CodeForm({ start = '', onCode }: { readonly start?: string; readonly onCode: (code: string) => void }) {
  const [text, setText] = useState(start);
  const [problem, setProblem] = useState<string>();
  const submit = (event: FormEvent) => {
    event.preventDefault();
    const code = readCode(text);
    setProblem(text.trim() === '' ? t('needCode') : code === null ? t('shape') : undefined);
    if (code !== null) onCode(code);
  };
  return (
    <form className="stack" noValidate onSubmit={submit}>
      <Field label={t('code')} help={t('codeHelp')} problem={problem}>
        {({ id, describedBy, invalid }) => (
          <InputGroup id={id} value={text} onChange={(e) => setText(e.target.value)} autoComplete="off" autoCapitalize="characters" spellCheck={false} aria-describedby={describedBy} aria-invalid={invalid} />
        )}
      </Field>
      <div>
        <Button type="submit" intent="primary" text={t('check')} />
      </div>
    </form>
  );
}
