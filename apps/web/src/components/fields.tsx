import { Button, Checkbox, HTMLSelect, InputGroup, TextArea } from '@blueprintjs/core';
import { Tick } from '@blueprintjs/icons';
import { useId, useRef, type KeyboardEvent, type ReactNode } from 'react';
import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { defineText } from '../lib/text.js';
import { Field } from './field.js';
import './fields.css';

const t = defineText({ optional: '(optional)' });

interface Common<F extends FieldValues> {
  readonly control: Control<F>;
  readonly name: FieldPath<F>;
  readonly label: string;
  readonly help?: ReactNode;
  readonly optional?: boolean;
  readonly wide?: boolean;
}

interface TextFieldProps<F extends FieldValues> extends Common<F> {
  readonly type?: 'text' | 'email' | 'password' | 'tel' | 'date' | 'datetime-local';
  readonly autoComplete?: string;
  readonly placeholder?: string;
  readonly autoFocus?: boolean;
}

/** One line of text, or a date. */
export function TextField<F extends FieldValues>({ control, name, label, help, optional, wide, type = 'text', autoComplete = 'off', placeholder, autoFocus }: TextFieldProps<F>) {
  const { field, fieldState } = useController({ control, name });
  return (
    <Field label={label} help={help} optional={optional} wide={wide} problem={fieldState.error?.message}>
      {({ id, describedBy, invalid }) => (
        <InputGroup
          id={id}
          inputRef={field.ref}
          name={name}
          type={type}
          value={(field.value as string | null | undefined) ?? ''}
          onChange={(e) => field.onChange(type === 'date' && e.target.value === '' ? null : e.target.value)}
          onBlur={field.onBlur}
          autoComplete={autoComplete}
          placeholder={placeholder}
          autoFocus={autoFocus}
          aria-describedby={describedBy}
          aria-invalid={invalid}
        />
      )}
    </Field>
  );
}

/** Several lines of text. */
export function TextAreaField<F extends FieldValues>({ control, name, label, help, optional, wide = true, rows = 3 }: Common<F> & { readonly rows?: number }) {
  const { field, fieldState } = useController({ control, name });
  return (
    <Field label={label} help={help} optional={optional} wide={wide} problem={fieldState.error?.message}>
      {({ id, describedBy, invalid }) => (
        <TextArea id={id} inputRef={field.ref} fill rows={rows} name={name} value={(field.value as string | undefined) ?? ''} onChange={field.onChange} onBlur={field.onBlur} aria-describedby={describedBy} aria-invalid={invalid} />
      )}
    </Field>
  );
}

export interface Option {
  readonly value: string;
  readonly label: string;
}

/** A choice from a list. An empty first line asks for the choice instead of making it. */
export function SelectField<F extends FieldValues>({ control, name, label, help, optional, wide, options, ask }: Common<F> & { readonly options: readonly Option[]; readonly ask?: string }) {
  const { field, fieldState } = useController({ control, name });
  return (
    <Field label={label} help={help} optional={optional} wide={wide} problem={fieldState.error?.message}>
      {({ id, describedBy, invalid }) => (
        <HTMLSelect
          id={id}
          ref={field.ref}
          fill
          name={name}
          value={(field.value as string | null | undefined) ?? ''}
          onChange={(e) => field.onChange(e.target.value === '' ? null : e.target.value)}
          onBlur={field.onBlur}
          aria-describedby={describedBy}
          aria-invalid={invalid}
        >
          {ask !== undefined && <option value="">{ask}</option>}
          {options.map((o) => (
            <option key={o.value} value={o.value}>
              {o.label}
            </option>
          ))}
        </HTMLSelect>
      )}
    </Field>
  );
}

/** A choice between few things, each a button large enough for a glove; arrow keys move it, as in any group of radio buttons. */
export function ChoiceField<F extends FieldValues>({ control, name, label, help, optional, wide, options }: Common<F> & { readonly options: readonly Option[] }) {
  const { field, fieldState } = useController({ control, name });
  const id = useId();
  const buttons = useRef(new Map<number, HTMLElement>());
  const problem = fieldState.error?.message;
  const chosen = options.findIndex((o) => o.value === field.value);
  const onKeyDown = (event: KeyboardEvent, at: number) => {
    const step = event.key === 'ArrowRight' || event.key === 'ArrowDown' ? 1 : event.key === 'ArrowLeft' || event.key === 'ArrowUp' ? -1 : 0;
    if (step === 0) return;
    event.preventDefault();
    const next = (at + step + options.length) % options.length;
    field.onChange(options[next]!.value);
    buttons.current.get(next)?.focus();
  };
  return (
    <fieldset className={`lb-choice${wide ? ' wide' : ''}`} aria-describedby={problem || help ? `${id}-help` : undefined}>
      <legend>
        {label} {optional && <span className="muted">{t('optional')}</span>}
      </legend>
      <div className="lb-choice-buttons" role="radiogroup" aria-label={label} aria-invalid={problem !== undefined} onBlur={field.onBlur}>
        {options.map((o, i) => (
          <Button
            key={o.value}
            ref={(element: HTMLElement | null) => {
              if (element) buttons.current.set(i, element);
              if (i === 0) field.ref(element);
            }}
            role="radio"
            aria-checked={i === chosen}
            tabIndex={i === Math.max(chosen, 0) ? 0 : -1}
            className={i === chosen ? 'lb-chosen' : ''}
            icon={i === chosen ? <Tick /> : undefined}
            onClick={() => field.onChange(o.value)}
            onKeyDown={(event: KeyboardEvent) => onKeyDown(event, i)}
            text={o.label}
          />
        ))}
      </div>
      {(problem ?? help) && (
        <div id={`${id}-help`} className={problem ? 'lb-problem' : 'lb-help'} role={problem ? 'alert' : undefined}>
          {problem ?? help}
        </div>
      )}
    </fieldset>
  );
}

/** A yes that must be given by hand. */
export function CheckField<F extends FieldValues>({ control, name, label, help }: Common<F>) {
  const { field, fieldState } = useController({ control, name });
  const id = useId();
  const words = fieldState.error?.message ?? help;
  return (
    <div className="lb-check">
      <Checkbox id={id} inputRef={field.ref} checked={field.value === true} onChange={(e) => field.onChange(e.currentTarget.checked)} onBlur={field.onBlur} label={label} aria-invalid={fieldState.error !== undefined} aria-describedby={words ? `${id}-help` : undefined} />
      {words && (
        <div id={`${id}-help`} className={fieldState.error ? 'lb-problem' : 'lb-help'} role={fieldState.error ? 'alert' : undefined}>
          {words}
        </div>
      )}
    </div>
  );
}
