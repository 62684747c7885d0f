import { Button } from '@blueprintjs/core';
import { formatQuantity, type Kind } from '@libs/quantities';
import type { WindingDifference } from '@libs/winding';
import { useFieldArray, useFormContext } from 'react-hook-form';
import { ChoiceField, TextAreaField, TextField } from '../../../components/fields.js';
import { Panel } from '../../../components/panel.js';
import { QuantityField } from '../../../components/quantity-field.js';
import { asFoundIn, blankWire, differencesOf, type WindingValues } from '../winding-form.js';
import { t } from '../text.js';
import type { FieldsProps } from './record-form.js';
import '../../../components/data-table.css';

export const WindingAsFoundFields = (props: FieldsProps<'winding-as-found'>) => <WindingCard {...props} asFound={null} />;

/** The new winding with the old one beside each field, and below it what differs and what is to be asked. */
export function WindingAsWoundFields(props: FieldsProps<'winding-as-wound'>) {
  const found = asFoundIn(props.context);
  return (
    <div className="stack">
      <WindingCard {...props} asFound={found} />
      <Panel title={t('differences')}>{found ? <Differences rows={differencesOf(found, props.readings)} /> : <p className="muted">{t('asFoundNone')}</p>}</Panel>
    </div>
  );
}

interface WindingCardProps extends Pick<FieldsProps<'winding-as-found'>, 'context' | 'readings'> {
  readonly asFound: FieldsProps<'winding-as-found'>['readings'] | null;
}

function WindingCard({ context, readings, asFound }: WindingCardProps) {
  const { control } = useFormContext<WindingValues>();
  const wires = useFieldArray({ control, name: 'wires' });
  const { system } = context;
  const figure = (value: number | null | undefined, kind: Kind, scale = 'asFoundIs' as const) => (value === null || value === undefined ? undefined : t(scale, { figure: formatQuantity(value, kind, system) }));
  const beside = (value: string | undefined) => (value === undefined || value === '' ? undefined : t('asFoundIs', { figure: value }));
  return (
    <div className="two-columns">
      <Panel>
        <div className="stack">
          <div className="fields lb-record-three">
            <QuantityField control={control} name="slots" kind="count" label={t('slots')} help={figure(asFound?.slots, 'count')} usual={[12, 144]} />
            <QuantityField control={control} name="poles" kind="count" label={t('poles')} help={figure(asFound?.poles, 'count')} usual={[2, 24]} />
            <QuantityField control={control} name="coils" kind="count" label={t('coils')} help={figure(asFound?.coils, 'count')} />
            <QuantityField control={control} name="turnsPerCoil" kind="number" label={t('turnsPerCoil')} help={figure(asFound?.turnsPerCoil, 'number')} usual={[1, 200]} />
            <QuantityField control={control} name="spanTo" kind="count" label={t('spanTo')} help={figure(asFound?.spanTo, 'count')} />
            <QuantityField control={control} name="circuits" kind="count" label={t('circuits')} help={figure(asFound?.circuits, 'count')} />
          </div>
          <ChoiceField
            control={control}
            name="layers"
            label={t('layers')}
            help={figure(asFound?.layers, 'count')}
            options={[
              { value: '1', label: t('one') },
              { value: '2', label: t('two') },
            ]}
          />
          <ChoiceField
            control={control}
            name="connection"
            label={t('connection')}
            help={beside(asFound?.connection && t(asFound.connection))}
            options={(['star', 'delta', 'single', 'dc'] as const).map((value) => ({ value, label: t(value) }))}
          />
          {wires.fields.map((wire, i) => (
            <div key={wire.id} className="lb-wire-row">
              <QuantityField control={control} name={`wires.${i}.strands`} kind="count" label={`${t('wire', { n: i + 1 })}: ${t('strands')}`} help={figure(asFound?.wires[i]?.strands, 'count')} />
              <QuantityField control={control} name={`wires.${i}.bareDiameterM`} kind="wire-diameter" label={t('bareDiameter')} help={figure(asFound?.wires[i]?.bareDiameterM, 'wire-diameter')} usual={[0.0002, 0.004]} />
              {wires.fields.length > 1 && <Button variant="minimal" text={t('removeWire', { n: i + 1 })} onClick={() => wires.remove(i)} />}
            </div>
          ))}
          {wires.fields.length < 3 && <Button variant="minimal" text={t('addWire')} onClick={() => wires.append(blankWire(system))} />}
          <div className="fields">
            <TextField control={control} name="grouping" label={t('grouping')} help={beside(asFound?.grouping)} optional />
            <TextField control={control} name="leads" label={t('leads')} help={beside(asFound?.leads)} optional />
            <QuantityField control={control} name="coilExtensionM" kind="length" label={t('coilExtension')} help={figure(asFound?.coilExtensionM, 'length') ?? t('coilExtensionHelp')} optional />
            <QuantityField control={control} name="meanTurnM" kind="length" label={t('meanTurn')} help={figure(asFound?.meanTurnM, 'length')} optional />
          </div>
          <TextAreaField control={control} name="remark" label={t('remark')} optional />
        </div>
      </Panel>
      <Panel>
        <CoilSketch slots={readings.slots} poles={readings.poles} spanTo={readings.spanTo} layers={readings.layers} />
      </Panel>
    </div>
  );
}

const ITEM_WORDS = {
  slots: 'slots',
  poles: 'poles',
  layers: 'layers',
  coils: 'coils',
  turnsPerCoil: 'turnsPerCoil',
  span: 'span',
  connection: 'connection',
  circuits: 'circuits',
  wires: 'wires',
  flux: 'flux',
  copper: 'copper',
  coilExtension: 'coilExtension',
  meanTurn: 'meanTurn',
} as const satisfies Record<WindingDifference['item'], string>;
const IS_WORDS = { same: 'same', changed: 'changed-word', 'not-recorded': 'not-recorded', ask: 'ask-word' } as const;

function Differences({ rows }: { readonly rows: readonly WindingDifference[] | null }) {
  if (!rows) return <p className="muted">{t('differencesWait')}</p>;
  return (
    <div className="lb-table-wrap">
      <table className="lb-table">
        <thead>
          <tr>
            <th scope="col">{t('item')}</th>
            <th scope="col">{t('asFound')}</th>
            <th scope="col">{t('asWound')}</th>
            <th scope="col">{t('means')}</th>
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={row.item} className={`lb-diff-${row.is}`}>
              <th scope="row">{t(ITEM_WORDS[row.item])}</th>
              <td className="num">{row.asFound}</td>
              <td className="num">{row.asWound}</td>
              <td>
                <b>{t(IS_WORDS[row.is])}</b> {row.words}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** The slots as seen from the bore, one pole pitch and more, with the first coil laid in by its span. */
function CoilSketch({ slots, poles, spanTo, layers }: { readonly slots: number; readonly poles: number; readonly spanTo: number; readonly layers: 1 | 2 }) {
  const known = [slots, poles, spanTo].every((n) => Number.isInteger(n) && n > 1) && spanTo <= slots;
  const shown = known ? Math.min(slots, Math.max(spanTo + 2, Math.ceil((slots / poles) * 1.2))) : 12;
  const width = 300;
  const pitch = width / shown;
  const x = (slot: number) => (slot - 0.5) * pitch;
  const tooth = Math.min(pitch * 0.55, 16);
  return (
    <svg viewBox={`0 0 ${width} 132`} className="lb-coil" role="img" aria-label={known ? `${t('span')} 1-${spanTo}` : t('span')}>
      <path d={`M0 30H${width}`} stroke="var(--lb-text)" strokeWidth="1.5" />
      {Array.from({ length: shown }, (_, i) => (
        <g key={i}>
          <path d={`M${x(i + 1) - tooth / 2} 30V88H${x(i + 1) + tooth / 2}V30`} fill="none" stroke="var(--lb-line)" strokeWidth="1.2" />
          {(shown <= 18 || i % 3 === 0) && (
            <text x={x(i + 1)} y="104" textAnchor="middle" fontSize="9" fill="var(--lb-muted)">
              {i + 1}
            </text>
          )}
        </g>
      ))}
      {known && (
        <>
          <path d={`M${x(1)} ${layers === 2 ? 70 : 60}V16Q${x(1)} 6 ${(x(1) + x(spanTo)) / 2} 6T${x(spanTo)} 16V${layers === 2 ? 48 : 60}`} fill="none" stroke="var(--lb-copper)" strokeWidth="5" strokeLinecap="round" />
          <path d={`M0 120H${(slots / poles) * pitch}`} stroke="var(--lb-steel)" strokeWidth="3" />
          <path d={`M${(slots / poles) * pitch} 114V126`} stroke="var(--lb-steel)" strokeWidth="2" />
        </>
      )}
    </svg>
  );
}
