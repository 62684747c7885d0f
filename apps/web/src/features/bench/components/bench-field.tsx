import { InputGroup } from '@blueprintjs/core';
import { formatQuantity, unitOf } from '@libs/quantities';
import { useId, useState } from 'react';
import { useController, useFormContext, type FieldPath } from 'react-hook-form';
import { useUnits } from '../../../components/units.js';
import { readTyped, shownText, type Typed } from '../../../lib/typed.js';
import { BENCH_FIGURES, type BenchFigure, type BenchValues } from '../bench-form.js';
import { t } from '../text.js';
import { useBenchLive } from './bench-context.js';

const CARRIED_OVER = /^(geometry|target)\.|Turns$|frequencyHz$/;

/** One figure of the bench: its label, the same figure of the test before, and what is wrong with it. */
export function BenchField({ name, label, large = false }: { readonly name: BenchFigure; readonly label: string; readonly large?: boolean }) {
  const system = useUnits();
  const id = useId();
  const { control, clearErrors } = useFormContext<BenchValues>();
  const { field, fieldState } = useController({ control, name: name as FieldPath<BenchValues> });
  const { wrong, missing } = useBenchLive();
  const [focused, setFocused] = useState(false);
  const kind = BENCH_FIGURES[name];
  const typed = field.value as Typed;
  const earlier = useEarlier(name, typed);
  const said = (fieldState.error?.message ?? missing.get(name)) || (focused && !fieldState.isTouched ? undefined : wrong.get(name));
  const unit = unitOf(kind, system);
  return (
    <div className={`lb-bench-field${large ? ' large' : ''}`}>
      <div className="lb-bench-label">
        <label htmlFor={id}>{label}</label>
        {unit && (
          <span id={`${id}-unit`} className="unit">
            {unit}
          </span>
        )}
        {earlier && (
          <span id={`${id}-before`} className="lb-bench-earlier num">
            {t('beforeFigure', { figure: earlier })}
          </span>
        )}
      </div>
      <InputGroup
        id={id}
        inputRef={field.ref}
        name={name}
        inputMode="decimal"
        autoComplete="off"
        className="lb-quantity"
        value={shownText(typed, kind, system)}
        onChange={(e) => {
          if (fieldState.error) clearErrors(name);
          field.onChange({ text: e.target.value, system });
        }}
        onFocus={() => setFocused(true)}
        onBlur={() => {
          setFocused(false);
          field.onBlur();
        }}
        aria-invalid={said !== undefined}
        aria-describedby={[unit ? `${id}-unit` : '', said ? `${id}-said` : '', earlier ? `${id}-before` : ''].filter(Boolean).join(' ') || undefined}
      />
      <p id={`${id}-said`} className="lb-problem">
        {said}
      </p>
    </div>
  );
}

/** What the test before read here; of what is carried over anyway only a difference is worth the room. */
function useEarlier(name: BenchFigure, typed: Typed): string | null {
  const system = useUnits();
  const { before } = useBenchLive();
  if (!before) return null;
  const [part, field] = name.split('.') as ['reading', 'wattsW'];
  const si: number | undefined = before[part][field];
  if (si === undefined) return null;
  const now = readTyped(typed, BENCH_FIGURES[name]);
  if (CARRIED_OVER.test(name) && now.state === 'read' && now.si === si) return null;
  return formatQuantity(si, BENCH_FIGURES[name], system);
}
