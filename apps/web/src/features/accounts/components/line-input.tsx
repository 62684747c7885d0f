import { HTMLSelect, InputGroup } from '@blueprintjs/core';
import { useId } from 'react';
import { useController, type Control, type FieldPath } from 'react-hook-form';
import { LINE_KIND_OPTIONS } from '../../../lib/money-words.js';
import type { QuoteForm } from '../quote-form.js';

interface LineInputProps {
  readonly control: Control<QuoteForm>;
  readonly name: FieldPath<QuoteForm>;
  /** says field and line to whoever hears the page; the eye has the column's head */
  readonly label: string;
  readonly figure?: boolean;
  /** what is wrong with the text as it stands, once the field was left */
  readonly check?: (text: string) => string | undefined;
  readonly column: string;
}

/** One cell of the lines' table. Its text stays as typed, whatever it says. */
export function LineInput({ control, name, label, figure = false, check, column }: LineInputProps) {
  const { field, fieldState } = useController({ control, name });
  const id = useId();
  const text = (field.value as string | undefined) ?? '';
  const problem = fieldState.error?.message ?? (fieldState.isTouched && text.trim() !== '' ? check?.(text) : undefined);
  return (
    <div className="lb-line-cell">
      <span className="lb-line-column" aria-hidden="true">
        {column}
      </span>
      <InputGroup
        inputRef={field.ref}
        name={name}
        className={figure ? 'lb-line-figure' : undefined}
        inputMode={figure ? 'decimal' : 'text'}
        autoComplete="off"
        value={text}
        onChange={(e) => field.onChange(e.target.value)}
        onBlur={field.onBlur}
        aria-label={label}
        aria-invalid={problem !== undefined}
        aria-describedby={problem ? id : undefined}
        intent={problem ? 'danger' : 'none'}
      />
      {problem && (
        <div id={id} className="lb-problem" role="alert">
          {problem}
        </div>
      )}
    </div>
  );
}

export function LineKind({ control, name, label, column }: Omit<LineInputProps, 'figure' | 'check'>) {
  const {
    field: { ref, value, onChange, onBlur },
  } = useController({ control, name });
  return (
    <div className="lb-line-cell">
      <span className="lb-line-column" aria-hidden="true">
        {column}
      </span>
      <HTMLSelect fill ref={ref} name={name} value={value as string} onChange={onChange} onBlur={onBlur} aria-label={label} options={LINE_KIND_OPTIONS} />
    </div>
  );
}
