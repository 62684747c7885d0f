import { InputGroup } from '@blueprintjs/core';
import { formatUsual, unitOf, type Kind } from '@libs/quantities';
import type { ReactNode } from 'react';
import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { defineText } from '../lib/text.js';
import { readTyped, shownText, type Typed } from '../lib/typed.js';
import { Field } from './field.js';
import { useUnits } from './units.js';

const t = defineText({ right: '{value} – is this right? Usual: {low} to {high}.', read: 'read as {value}' });

interface QuantityFieldProps<F extends FieldValues> {
  readonly control: Control<F>;
  readonly name: FieldPath<F>;
  readonly label: string;
  readonly kind: Kind;
  /** SI; outside it the field asks, and does not refuse */
  readonly usual?: readonly [low: number, high: number];
  readonly help?: ReactNode;
  readonly optional?: boolean;
  readonly wide?: boolean;
}

/** A measured figure: decimal comma or point, a pasted unit, fractions of an inch; kept as typed. */
export function QuantityField<F extends FieldValues>({ control, name, label, kind, usual, help, optional, wide }: QuantityFieldProps<F>) {
  const system = useUnits();
  const { field, fieldState } = useController({ control, name });
  const typed = field.value as Typed;
  const reading = readTyped(typed, kind);
  const words = (si: number) => formatUsual(si, kind, system);
  const odd = reading.state === 'read' && usual !== undefined && (reading.si < usual[0] || reading.si > usual[1]);
  const pasted = reading.state === 'read' && /[a-zµΩ°"½¼¾⅛⅜⅝⅞/]/i.test(typed.text);
  const problem = fieldState.error?.message ?? (reading.state === 'wrong' && fieldState.isTouched ? reading.words : undefined);
  const said = odd ? t('right', { value: words(reading.si), low: words(usual[0]), high: words(usual[1]) }) : pasted ? t('read', { value: words(reading.si) }) : help;
  return (
    <Field label={label} help={said} optional={optional} wide={wide} problem={problem}>
      {({ id, describedBy, invalid }) => (
        <InputGroup
          id={id}
          className="lb-quantity"
          inputRef={field.ref}
          name={name}
          inputMode="decimal"
          autoComplete="off"
          value={shownText(typed, kind, system)}
          onChange={(e) => field.onChange({ text: e.target.value, system })}
          onBlur={field.onBlur}
          rightElement={unitOf(kind, system) ? <span className="lb-quantity-unit">{unitOf(kind, system)}</span> : undefined}
          aria-describedby={describedBy}
          aria-invalid={invalid}
        />
      )}
    </Field>
  );
}
