import type { CoreTestResult } from '@libs/core-loss';
import { CORE_CHECKS } from '@shared/core-tests';
import type { BayView } from '@shared/instruments';
import { useEffect } from 'react';
import { Controller, useFormContext, useWatch } from 'react-hook-form';
import { ChoiceField, SelectField } from '../../../components/fields.js';
import type { BenchValues } from '../bench-form.js';
import type { LiveTest } from '../live-test.js';
import { t } from '../text.js';
import { BenchField } from './bench-field.js';
import { SetupList } from './setup-list.js';

const PATHS = {
  stator: ['bore-and-outside', 'over-frame', 'under-ribs'],
  armature: ['bore-and-outside', 'through-spider', 'through-shaft', 'through-vents'],
} as const;
const PATH_WORDS = {
  'bore-and-outside': 'boreAndOutside',
  'over-frame': 'overFrame',
  'under-ribs': 'underRibs',
  'through-spider': 'throughSpider',
  'through-shaft': 'throughShaft',
  'through-vents': 'throughVents',
} as const;

interface SetupColumnProps {
  readonly live: LiveTest;
  readonly bay: BayView;
  readonly before: { readonly turns: number; readonly result: CoreTestResult } | null;
  readonly minimumTargetT: number;
}

/** Target flux, what the bay can do about it, and the ticks before the switch. */
export function SetupColumn({ live, bay, before, minimumTargetT }: SetupColumnProps) {
  const { control } = useFormContext<BenchValues>();
  useWhatFollows();
  const frame = useWatch({ control, name: 'frame' });
  const path = useWatch({ control, name: 'cablePath' });
  const { kind } = live.readings.geometry;
  const paths = PATHS[kind].includes(path as never) ? PATHS[kind] : [...PATHS[kind], path];
  return (
    <section className="lb-bench-column" aria-labelledby="bench-setup">
      <h2 id="bench-setup">{t('setup')}</h2>
      <div className="lb-bench-fields four">
        <BenchField name="target.fluxDensityT" label={t('target')} />
        <BenchField name="reading.frequencyHz" label={t('frequencyHz')} />
        <BenchField name="reading.excitingTurns" label={t('excitingTurns')} />
        <BenchField name="reading.searchTurns" label={t('searchTurns')} />
      </div>
      <SetupList live={live} bay={bay} before={before} minimumTargetT={minimumTargetT} />
      <Checks />
      <SelectField
        control={control}
        name="target.basis"
        label={t('targetBasis')}
        options={[
          { value: 'standard', label: t('standard') },
          { value: 'winding', label: t('winding') },
          { value: 'supply', label: t('supply') },
        ]}
      />
      <ChoiceField
        control={control}
        name="frame.state"
        label={t('frame')}
        options={[
          { value: 'bare', label: t('bare') },
          { value: 'in-frame', label: t('inFrame') },
        ]}
      />
      {frame.state === 'in-frame' && (
        <ChoiceField
          control={control}
          name="frame.material"
          label={t('frameMaterial')}
          options={[
            { value: 'cast-iron', label: t('castIron') },
            { value: 'steel', label: t('steel') },
            { value: 'aluminium', label: t('aluminium') },
          ]}
        />
      )}
      <SelectField control={control} name="cablePath" label={t('cablePath')} options={paths.map((value) => ({ value, label: t(PATH_WORDS[value]) }))} />
      <Wrong words={live.wrong.get('cablePath') ?? live.wrong.get('frame.material')} />
    </section>
  );
}

const Wrong = ({ words }: { readonly words: string | undefined }) => (words ? <p className="lb-problem">{words}</p> : null);

/** A bare core has no frame, and an armature no bore: what follows from a choice is chosen with it, and can be changed. */
function useWhatFollows() {
  const { watch, setValue, getValues } = useFormContext<BenchValues>();
  useEffect(() => {
    const { unsubscribe } = watch((_, { name, type }) => {
      if (!name || type !== 'change') return;
      const { frame, cablePath, geometry } = getValues();
      const armature = geometry.kind === 'armature';
      if (name === 'frame.state') setValue('frame.material', frame.state === 'bare' ? 'none' : 'cast-iron');
      if (name === 'frame.state' && !armature) setValue('cablePath', frame.state === 'bare' ? 'bore-and-outside' : 'over-frame');
      if (name === 'geometry.kind' && !PATHS[geometry.kind].includes(cablePath as never)) setValue('cablePath', armature ? 'through-spider' : frame.state === 'bare' ? 'bore-and-outside' : 'over-frame');
    });
    return unsubscribe;
  }, [watch, setValue, getValues]);
}

/** Short positive checks, each large enough for a glove; they are part of the record. */
function Checks() {
  const { control } = useFormContext<BenchValues>();
  return (
    <fieldset className="lb-bench-checks">
      <legend>{t('checks')}</legend>
      {CORE_CHECKS.map((check) => (
        <Controller
          key={check}
          control={control}
          name={`checks.${check}`}
          render={({ field }) => (
            <button type="button" role="checkbox" aria-checked={field.value} onClick={() => field.onChange(!field.value)} onBlur={field.onBlur} ref={field.ref}>
              <svg viewBox="0 0 20 20" width="20" height="20" aria-hidden="true">
                <rect x="1.5" y="1.5" width="17" height="17" fill="none" stroke="currentColor" strokeWidth="1.6" />
                {field.value && <path d="M4.5 10.5 8.5 14.5 15.5 5.5" fill="none" stroke="currentColor" strokeWidth="2.6" />}
              </svg>
              <span>{t(check)}</span>
            </button>
          )}
        />
      ))}
    </fieldset>
  );
}
