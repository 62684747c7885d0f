import { formatUsual, toShown, type UnitSystem } from '@libs/quantities';
import { useFormContext } from 'react-hook-form';
import { CheckField, ChoiceField, SelectField, TextAreaField, TextField } from '../../../components/fields.js';
import { Panel } from '../../../components/panel.js';
import { QuantityField } from '../../../components/quantity-field.js';
import { VerdictTag } from '../../../components/verdict-tag.js';
import { stripLimit, type StripValues } from '../strip-form.js';
import { t } from '../text.js';
import { FromLoad } from './from-load.js';
import type { FieldsProps } from './record-form.js';

const COLD = ['cold-pull', 'water-jet', 'chemical'];

/** How the old winding comes out, with the limit of the part in sight. */
export function StripFields({ context, readings }: FieldsProps<'strip'>) {
  const { control } = useFormContext<StripValues>();
  const { bay } = context;
  const oven = readings.method === 'oven-burnout';
  return (
    <div className="two-columns">
      <Panel>
        <div className="stack">
          <ChoiceField
            control={control}
            name="method"
            label={t('method')}
            options={[
              { value: 'oven-burnout', label: t('ovenBurnout') },
              { value: 'warm-pull', label: t('warmPull') },
              { value: 'cold-pull', label: t('coldPull') },
              { value: 'water-jet', label: t('waterJet') },
              { value: 'chemical', label: t('chemical') },
            ]}
          />
          {oven && <SelectField control={control} name="ovenId" label={t('oven')} ask={t('ovenAsk')} options={bay.ovens.map((o) => ({ value: o.id, label: o.remark ? `${o.name}: ${o.remark}` : o.name }))} />}
          <CheckField control={control} name="commutatorOrSlipRingsOn" label={t('ringsOn')} />
          <CheckField control={control} name="sampleCoilKept" label={t('sampleKept')} />
          <div className="fields">
            <QuantityField control={control} name="wiresCountedAtCut" kind="count" label={t('wiresCounted')} optional={!oven} />
            <QuantityField control={control} name="partPeakC" kind="temperature" label={t('partPeak')} help={t('partPeakHelp')} optional usual={[15, 420]} />
            <QuantityField control={control} name="minutesAbove345C" kind="duration" label={t('above345')} optional usual={[0, 600]} />
            <TextField control={control} name="sensorPosition" label={t('sensor')} optional />
          </div>
          <TextAreaField control={control} name="explanation" label={t('explanation')} help={t('explanationHelp')} optional />
        </div>
      </Panel>
      <div className="stack">
        <StripLimitPanel context={context} peakC={readings.partPeakC} method={readings.method} />
        <FromLoad context={context} />
      </div>
    </div>
  );
}

function StripLimitPanel({ context, peakC, method }: { readonly context: FieldsProps<'strip'>['context']; readonly peakC: number | null; readonly method: string | null }) {
  const { system } = context;
  const { limitC, reason, limits, dismantled } = stripLimit(context);
  const over = peakC === null ? null : peakC - limitC;
  const kelvin = (k: number) => formatUsual(k, 'temperature-difference', system);
  return (
    <Panel title={t('stripLimit', { limit: formatUsual(limitC, 'temperature', system) })}>
      <div className="stack" aria-live="polite">
        <p>{reason}</p>
        <Thermometer limitC={limitC} peakC={peakC} system={system} />
        {over === null ? (
          <p className="muted">{method !== null && COLD.includes(method) ? t('coldNoPeak') : t('noPeak')}</p>
        ) : (
          <>
            <VerdictTag verdict={over > 0 ? 'does-not-conform' : 'conforms'} large />
            <p>{over > 0 ? t('overLimit', { over: kelvin(over) }) : t('underLimit', { under: kelvin(-over) })}</p>
          </>
        )}
        {!dismantled && <p className="lb-problem">{t('notDismantled')}</p>}
        <p className="muted lb-source">
          {limits.source} ({limits.standing})
        </p>
      </div>
    </Panel>
  );
}

/** The part's peak on one scale with its limit; beyond the limit it is hatched. */
function Thermometer({ limitC, peakC, system }: { readonly limitC: number; readonly peakC: number | null; readonly system: UnitSystem }) {
  const most = Math.max(limitC * 1.3, (peakC ?? 0) * 1.05);
  const x = (c: number) => 6 + (Math.max(0, c) / most) * 288;
  const figure = (c: number) => String(Math.round(toShown(c, 'temperature', system)));
  return (
    <svg viewBox="0 0 300 58" className="lb-thermo" role="img" aria-label={t('limitScale')}>
      <defs>
        <pattern id="lb-thermo-over" width="7" height="7" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 0V7" stroke="var(--lb-fails)" strokeWidth="1.6" />
        </pattern>
      </defs>
      <rect x={x(limitC)} y="16" width={294 - x(limitC)} height="22" fill="url(#lb-thermo-over)" opacity="0.55" />
      <path d="M6 38H294" stroke="var(--lb-line)" strokeWidth="1.2" />
      {peakC !== null && <rect x="6" y="20" width={Math.max(0, x(peakC) - 6)} height="14" fill="var(--lb-steel)" />}
      <path d={`M${x(limitC)} 10V42`} stroke="var(--lb-fails)" strokeWidth="2.4" />
      <text x={x(limitC)} y="54" textAnchor="middle" fontSize="11" fill="var(--lb-fails)">
        {figure(limitC)}
      </text>
      {peakC !== null && (
        <text x={Math.min(x(peakC), 280)} y="12" textAnchor="middle" fontSize="12" fontWeight="600" fill="var(--lb-steel)">
          {figure(peakC)}
        </text>
      )}
    </svg>
  );
}
