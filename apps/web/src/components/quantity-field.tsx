import { Button, InputGroup } from '@blueprintjs/core';
import { formatUsual, unitOf, type Kind } from '@libs/quantities';
import { useState, type ReactNode } from 'react';
import { useController, type Control, type FieldPath, type FieldValues } from 'react-hook-form';
import { defineText } from '../lib/text.js';
import { readTyped, shownText, type Typed } from '../lib/typed.js';
import { Field } from './field.js';
import { useUnits } from './units.js';

const t = defineText({
  right: '{value}: is this right? Usual is {low} to {high}.',
  itIs: 'It is right',
  read: 'read as {value}',
});

/** Below a tenth of an ohm the usual digits end before two windings differ: such a resistance is said in milliohms. */
const SMALL_OHM = 0.1;
const isSmallOhm = (si: number, kind: Kind) => kind === 'resistance' && si !== 0 && Math.abs(si) < SMALL_OHM;

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
  const [confirmed, setConfirmed] = useState<number | null>(null);
  const typed = field.value as Typed;
  const reading = readTyped(typed, kind);
  const words = (si: number) => formatUsual(si, isSmallOhm(si, kind) ? 'resistance-milli' : kind, system);
  const odd = reading.state === 'read' && usual !== undefined && (reading.si < usual[0] || reading.si > usual[1]) && reading.si !== confirmed;
  const pasted = reading.state === 'read' && typed.system === system && (isSmallOhm(reading.si, kind) || /[a-zµΩ°"½¼¾⅛⅜⅝⅞/]/i.test(typed.text));
  const problem = fieldState.error?.message ?? (reading.state === 'wrong' && fieldState.isTouched ? reading.words : undefined);
  const unit = unitOf(kind, system);
  const question = odd && (
    <span className="lb-ask" role="status">
      {t('right', { value: words(reading.si), low: words(usual[0]), high: words(usual[1]) })}
      <Button size="small" text={t('itIs')} onClick={() => setConfirmed(reading.si)} />
    </span>
  );
  return (
    <Field label={label} unit={unit} help={question || (pasted ? t('read', { value: words(reading.si) }) : help)} optional={optional} wide={wide} problem={problem}>
      {({ id, describedBy, invalid }) => (
        <InputGroup
          id={id}
          className="lb-quantity"
          inputRef={field.ref}
          name={name}
          inputMode={kind === 'count' ? 'numeric' : 'decimal'}
          autoComplete="off"
          value={shownText(typed, kind, system)}
          onChange={(e) => field.onChange({ text: e.target.value, system })}
          onBlur={field.onBlur}
          rightElement={unit ? <span className="lb-quantity-unit" aria-hidden="true">{unit}</span> : undefined}
          aria-describedby={describedBy}
          aria-invalid={invalid}
        />
      )}
    </Field>
  );
}
