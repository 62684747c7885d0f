import { Button } from '@blueprintjs/core';
import type { LimitRow } from '@shared/limit-rows';
import { at, limitWords, sourceOf, standingWords, valueOf } from '@shared/limit-values';
import { useState } from 'react';
import { get, useFormState, useWatch, type Control, type FieldPath } from 'react-hook-form';
import { CheckField, SelectField, TextField } from '../../../components/fields.js';
import { QuantityField } from '../../../components/quantity-field.js';
import { useUnits } from '../../../components/units.js';
import { readTyped, type Typed } from '../../../lib/typed.js';
import { confirmedKey, type LimitForm } from '../limit-form.js';
import type { LimitBlock } from '../limit-sections.js';
import { STANDING_OPTIONS } from '../rule-names.js';
import { t } from '../text.js';

type Path = FieldPath<LimitForm>;
interface BlockProps {
  readonly control: Control<LimitForm>;
  readonly block: LimitBlock;
  /** the version the form was filled from */
  readonly base: { readonly version: number; readonly set: unknown };
  readonly headed: boolean;
}

/** Whether a figure, as it is typed, is another one than in force. */
function isChanged(typed: Typed | undefined, row: LimitRow, set: unknown): boolean {
  const reading = readTyped(typed, row.kind);
  const before = valueOf(set, row);
  return reading.state !== 'read' || before === undefined || Math.abs(reading.si * row.perShown - before) > 1e-12 * Math.abs(before);
}

/** Figures of one source, each beside the one in force, and the source itself: looked at as soon as a figure changes. */
export function LimitBlockFields({ control, block, base, headed }: BlockProps) {
  const units = useUnits();
  const typed = useWatch({ control, name: block.rows.map((row) => `set.${row.valuePath}` as Path) }) as unknown as readonly (Typed | undefined)[];
  const changed = block.rows.map((row, i) => isChanged(typed[i], row, base.set));
  return (
    <div className={`lb-limit-block${headed ? '' : ' lb-limit-single'}`}>
      {headed && <h3>{block.title}</h3>}
      <div className="fields">
        {block.rows.map((row, i) => {
          const before = valueOf(base.set, row);
          const now = before === undefined ? t('nowNone', { version: base.version }) : t('nowValue', { words: limitWords(before, row, units) });
          const help = changed[i] ? (
            <span className="lb-limit-mark">
              {t('changedMark')}, {now}
            </span>
          ) : (
            now
          );
          return <QuantityField key={row.valuePath} control={control} name={`set.${row.valuePath}` as Path} label={row.name} kind={row.kind} help={help} />;
        })}
      </div>
      {block.sourcePath !== null && <SourceFields control={control} title={block.title} path={block.sourcePath} row={block.rows[0]!} base={base.set} figureChanged={changed.some(Boolean)} />}
    </div>
  );
}

interface SourceProps {
  readonly control: Control<LimitForm>;
  readonly title: string;
  readonly path: string;
  readonly row: LimitRow;
  readonly base: unknown;
  readonly figureChanged: boolean;
}

function SourceFields({ control, title, path, row, base, figureChanged }: SourceProps) {
  const [asked, setAsked] = useState(false);
  const [sourceName, standingName] = [`set.${path}.source` as Path, `set.${path}.standing` as Path];
  const [source, standing] = useWatch({ control, name: [sourceName, standingName] }) as unknown as readonly [string, string];
  const { errors } = useFormState({ control, name: [sourceName, standingName] });
  const before = sourceOf(base, row);
  const same = source === before?.source && standing === before.standing;
  const wrong = get(errors, sourceName) !== undefined || get(errors, standingName) !== undefined;
  if (!asked && !figureChanged && same && !wrong) {
    return (
      <div className="row spread lb-limit-source">
        <span className="lb-limit-text">
          {source} <span className="muted">({standingWords(standing)})</span>
        </span>
        <Button size="small" variant="minimal" text={t('changeSource')} aria-label={`${t('changeSource')}: ${title}`} onClick={() => setAsked(true)} />
      </div>
    );
  }
  return (
    <div className="lb-limit-source">
      {figureChanged && same && <CheckField control={control} name={`confirmed.${confirmedKey(path)}` as Path} label={t('stillStands')} help={t('stillStandsHelp')} />}
      <div className="lb-limit-source-fields">
        <TextField control={control} name={sourceName} label={t('sourceLabel', { name: title })} help={t('sourceHelp')} />
        <SelectField control={control} name={standingName} label={t('standingLabel', { name: title })} options={STANDING_OPTIONS} />
      </div>
    </div>
  );
}

/** For counting what changed while it is typed. */
export const changedFigures = (form: LimitForm, rows: readonly LimitRow[], set: unknown): number => rows.filter((row) => isChanged(at(form.set, row.valuePath) as Typed | undefined, row, set)).length;
