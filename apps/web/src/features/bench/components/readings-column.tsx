import type { BayView, InstrumentView } from '@shared/instruments';
import { useFormContext, useWatch } from 'react-hook-form';
import { CheckField, ChoiceField, SelectField, TextField } from '../../../components/fields.js';
import { formatQuantity } from '@libs/quantities';
import { useUnits } from '../../../components/units.js';
import { METERS, type BenchValues } from '../bench-form.js';
import type { LiveTest } from '../live-test.js';
import { t } from '../text.js';
import { BenchField } from './bench-field.js';
import { FluxTimer } from './flux-timer.js';

const KINDS: Record<(typeof METERS)[number], readonly InstrumentView['kind'][]> = {
  voltmeterId: ['voltmeter', 'wattmeter'],
  ammeterId: ['ammeter', 'wattmeter', 'clamp-meter'],
  wattmeterId: ['wattmeter', 'clamp-meter'],
  thermometerId: ['thermometer'],
};

interface ReadingsColumnProps {
  readonly live: LiveTest;
  readonly bay: BayView;
  readonly timerKey: string;
  readonly ampsRising: boolean;
  readonly onAmpsRising: (rising: boolean) => void;
}

/** What the meters and the thermometer say. */
export function ReadingsColumn({ live, bay, timerKey, ampsRising, onAmpsRising }: ReadingsColumnProps) {
  const { control } = useFormContext<BenchValues>();
  const system = useUnits();
  const voltmeter = useWatch({ control, name: 'reading.voltmeter' });
  const lead = useWatch({ control, name: 'reading.wattmeterLead' });
  const { flux } = live;
  return (
    <section className="lb-bench-column" aria-labelledby="bench-readings">
      <div className="row spread">
        <h2 id="bench-readings">{t('readings')}</h2>
        {flux && <span className="measured num">{t('setVolts', { volts: formatQuantity(flux.wantedSearchVoltsV, 'voltage', system, { significant: 4 }) })}</span>}
      </div>
      <div className="lb-bench-fields three">
        <BenchField name="reading.searchVoltsV" label={t('searchVoltsV')} large />
        <BenchField name="reading.excitingA" label={t('excitingA')} large />
        <BenchField name="reading.wattsW" label={t('wattsW')} large />
      </div>
      <div className="lb-bench-pair">
        <ChoiceField
          control={control}
          name="reading.wattmeterLead"
          label={t('wattmeterLead')}
          options={[
            { value: 'search', label: t('onSearch') },
            { value: 'exciting', label: t('onExciting') },
          ]}
        />
        {lead === 'exciting' && <BenchField name="reading.cableResistanceOhm" label={t('cableResistanceOhm')} />}
      </div>
      <div className="lb-bench-pair">
        <ChoiceField
          control={control}
          name="reading.voltmeter"
          label={t('voltmeter')}
          options={[
            { value: 'average', label: t('average') },
            { value: 'true-rms', label: t('trueRms') },
          ]}
        />
        {voltmeter === 'true-rms' && <BenchField name="reading.formFactor" label={t('formFactor')} />}
      </div>
      <h3>{t('temperatures')}</h3>
      <div className="lb-bench-fields three">
        <BenchField name="temperatures.ambientC" label={t('ambientC')} />
        <BenchField name="temperatures.startC" label={t('startC')} />
        <BenchField name="temperatures.meanC" label={t('meanC')} />
        <BenchField name="temperatures.hottestC" label={t('hottestC')} />
        <BenchField name="temperatures.hottestSlot" label={t('hottestSlot')} />
        <BenchField name="temperatures.coolestC" label={t('coolestC')} />
      </div>
      <div className="lb-bench-pair">
        <BenchField name="temperatures.minutes" label={t('minutes')} />
        <FluxTimer storageKey={timerKey} />
      </div>
      <label className="lb-bench-rising">
        <input type="checkbox" checked={ampsRising} onChange={(e) => onAmpsRising(e.currentTarget.checked)} />
        {t('ampsRising')}
      </label>
      <h3>{t('meters')}</h3>
      <div className="lb-bench-fields">
        {METERS.map((meter) => (
          <SelectField key={meter} control={control} name={`instruments.${meter}`} label={t(meter)} ask={t('noMeter')} options={bay.instruments.filter((i) => KINDS[meter].includes(i.kind)).map((i) => ({ value: i.id, label: meterWords(i) }))} />
        ))}
        <TextField control={control} name="instruments.wattmeterRange" label={t('wattmeterRange')} optional />
        <BenchField name="reading.searchBurdenOhm" label={t('searchBurdenOhm')} />
      </div>
      <CheckField control={control} name="instruments.clampMeter" label={t('clampMeter')} />
      <TextField control={control} name="remark" label={t('remark')} optional />
    </section>
  );
}

function meterWords(i: InstrumentView): string {
  if (i.standing === 'overdue') return t('meterOverdue', { tag: i.tag });
  if (i.standing === 'due-soon') return t('meterDueSoon', { tag: i.tag });
  return t('meterOption', { tag: i.tag, description: i.description });
}
