import { formatUsual, unitOf, type Kind } from '@libs/quantities';
import { useUnits } from './units.js';

interface QuantityProps {
  readonly si: number | null | undefined;
  readonly kind: Kind;
  /** shown where there is no figure */
  readonly none?: string;
}

/** A figure in the person's units, the unit set lighter than its number. */
export function Quantity({ si, kind, none = '–' }: QuantityProps) {
  const system = useUnits();
  if (si === null || si === undefined || !Number.isFinite(si)) return <span className="muted">{none}</span>;
  const unit = unitOf(kind, system);
  return (
    <span className="num">
      {formatUsual(si, kind, system, { unit: false })}
      {unit && <span className="unit">{`\u202f${unit}`}</span>}
    </span>
  );
}
