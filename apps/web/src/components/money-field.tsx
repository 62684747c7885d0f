import { InputGroup } from '@blueprintjs/core';
import { parseMoney } from '@libs/money';
import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { Field } from './field.js';

interface MoneyFieldProps<F extends FieldValues> {
  readonly control: Control<F>;
  readonly name: FieldPath<F>;
  readonly label: string;
  readonly currency: string;
  readonly help?: string;
  readonly optional?: boolean;
  readonly wide?: boolean;
}

/** An amount as text in the form; `parseMoney` reads it when the form is sent, and here for its words. */
export function MoneyField<F extends FieldValues>({ control, name, label, currency, help, optional, wide }: MoneyFieldProps<F>) {
  const { field, fieldState } = useController({ control, name });
  const text = (field.value as string | undefined) ?? '';
  const parsed = text.trim() === '' ? null : parseMoney(text, currency);
  const problem = fieldState.error?.message ?? (parsed && !parsed.ok && fieldState.isTouched ? parsed.words : undefined);
  return (
    <Field label={label} unit={currency} help={help} optional={optional} wide={wide} problem={problem}>
      {({ id, describedBy, invalid }) => (
        <InputGroup
          id={id}
          className="lb-quantity"
          inputRef={field.ref}
          inputMode="decimal"
          autoComplete="off"
          name={name}
          value={text}
          onChange={(e) => field.onChange(e.target.value)}
          onBlur={field.onBlur}
          rightElement={<span className="lb-quantity-unit" aria-hidden="true">{currency}</span>}
          aria-describedby={describedBy}
          aria-invalid={invalid}
        />
      )}
    </Field>
  );
}
