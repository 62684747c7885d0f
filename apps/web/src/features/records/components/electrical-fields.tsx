import { insulationMinimum, type MachineTestLimits, type TestJudgement } from '@libs/machine-tests';
import { formatUsual, formatQuantity, type Kind, type UnitSystem } from '@libs/quantities';
import type { InstrumentView } from '@shared/instruments';
import type { ReactNode } from 'react';
import { useController, useFormContext } from 'react-hook-form';
import { CheckField, ChoiceField, SelectField } from '../../../components/fields.js';
import { Panel } from '../../../components/panel.js';
import { QuantityField } from '../../../components/quantity-field.js';
import { useUnits } from '../../../components/units.js';
import { VerdictTag } from '../../../components/verdict-tag.js';
import type { RecordContext } from '../record-definition.js';
import { t } from '../text.js';
import type { IncomingValues } from '../winding-test-forms.js';

/** One test of a machine: its fields, the limit beside them, and what they come to as they are typed. */
export function TestPanel({ title, limit, judgements, problem, children }: { readonly title: ReactNode; readonly limit?: string; readonly judgements: readonly TestJudgement[]; readonly problem?: string | undefined; readonly children: ReactNode }) {
  return (
    <Panel title={title} actions={limit && <span className="muted num">{limit}</span>}>
      {children}
      {problem && (
        <p className="lb-problem" role="alert">
          {problem}
        </p>
      )}
      <div aria-live="polite">
        {judgements.map((j) => (
          <p key={j.test} className="lb-judged">
            <VerdictTag verdict={j.verdict} />
            <span>{j.words}</span>
          </p>
        ))}
      </div>
    </Panel>
  );
}

/** A panel that may be left out, and says so in the record. */
export function OptionalPanel({ name, title, demanded, limit, judgements, problem, children }: { readonly name: string; readonly title: string; readonly demanded: boolean; readonly limit?: string; readonly judgements: readonly TestJudgement[]; readonly problem?: string | undefined; readonly children: ReactNode }) {
  const { control } = useFormContext();
  const { field } = useController({ control, name: `done.${name}` });
  const done = field.value === true;
  return (
    <TestPanel title={title} {...(done && limit ? { limit } : {})} judgements={done ? judgements : []} problem={done ? problem : undefined}>
      <CheckField control={control} name={`done.${name}`} label={t('partDone', { part: title })} {...(demanded ? { help: t('demanded') } : {})} />
      {done ? children : <p className="muted">{t('leftOut')}</p>}
    </TestPanel>
  );
}

export function InsulationPanel({ context, judgements, reading }: { readonly context: RecordContext; readonly judgements: readonly TestJudgement[]; readonly reading: { readonly windingKind: IncomingValues['insulation']['windingKind']; readonly ratedVoltageV: number } }) {
  const { control } = useFormContext<IncomingValues>();
  const system = useUnits();
  const least = reading.ratedVoltageV > 0 ? insulationMinimum(reading, context.limits.machine).value : null;
  return (
    <TestPanel title={t('insulation')} {...(least === null ? {} : { limit: t('least', { least: formatQuantity(least, 'resistance-mega', system, { significant: 3 }) }) })} judgements={judgements}>
      <div className="stack">
        <ChoiceField
          control={control}
          name="insulation.windingKind"
          label={t('windingKind')}
          options={[
            { value: 'random-wound', label: t('randomWound') },
            { value: 'form-wound', label: t('formWound') },
            { value: 'dc-armature', label: t('dcArmature') },
            { value: 'field', label: t('field') },
          ]}
        />
        <div className="fields lb-record-three">
          <QuantityField control={control} name="insulation.ratedVoltageV" kind="voltage" label={t('ratedVoltage')} usual={[12, 15_000]} />
          <QuantityField control={control} name="insulation.testVoltsV" kind="voltage" label={t('testVolts')} usual={[100, 10_000]} />
          <QuantityField control={control} name="insulation.windingTemperatureC" kind="temperature" label={t('windingTemperature')} usual={[5, 60]} />
          <QuantityField control={control} name="insulation.resistanceOhm" kind="resistance-mega" label={t('afterOneMinute')} />
          <QuantityField control={control} name="insulation.tenMinuteResistanceOhm" kind="resistance-mega" label={t('tenMinutes')} optional />
        </div>
        <ChoiceField
          control={control}
          name="insulation.correctionRule"
          label={t('correctionRule')}
          options={[
            { value: 'halving', label: t('halving') },
            { value: 'thermosetting', label: t('thermosetting') },
          ]}
        />
      </div>
    </TestPanel>
  );
}

export const percentWords = (fraction: number, system: UnitSystem) => formatUsual(fraction, 'percent', system);

export function ResistancePanel({ context, judgements, demanded }: { readonly context: RecordContext; readonly judgements: readonly TestJudgement[]; readonly demanded: boolean }) {
  const { control, watch } = useFormContext<IncomingValues>();
  const system = useUnits();
  const limits: MachineTestLimits = context.limits.machine;
  const row = watch('windingResistance.construction') === 'form-wound' ? limits.unbalanceForm : limits.unbalanceRandom;
  return (
    <OptionalPanel name="windingResistance" title={t('windingResistance')} demanded={demanded} limit={t('unbalanceLimit', { limit: percentWords(row.value, system) })} judgements={judgements}>
      <div className="stack">
        <div className="fields lb-record-four">
          {([0, 1, 2] as const).map((i) => (
            <QuantityField key={i} control={control} name={`windingResistance.resistancesOhm.${i}`} kind="resistance" label={t('lead', { n: `${i + 1}-${((i + 1) % 3) + 1}` })} {...(i === 0 ? { help: t('resistanceHelp') } : {})} />
          ))}
          <QuantityField control={control} name="windingResistance.windingTemperatureC" kind="temperature" label={t('windingTemperature')} usual={[5, 60]} />
        </div>
        <ChoiceField
          control={control}
          name="windingResistance.construction"
          label={t('construction')}
          options={[
            { value: 'random-wound', label: t('randomWound') },
            { value: 'form-wound', label: t('formWound') },
            { value: 'concentric', label: t('concentric') },
          ]}
        />
      </div>
    </OptionalPanel>
  );
}

const METER_KINDS: Record<string, readonly InstrumentView['kind'][]> = {
  insulationTesterId: ['insulation-tester'],
  microOhmmeterId: ['micro-ohmmeter'],
  surgeTesterId: ['surge-tester'],
  highPotentialTesterId: ['high-potential-tester'],
  voltmeterId: ['voltmeter', 'wattmeter'],
  ammeterId: ['ammeter', 'wattmeter', 'clamp-meter'],
  wattmeterId: ['wattmeter'],
  vibrationMeterId: ['vibration-meter'],
  thermometerId: ['thermometer'],
};
export type MeterName = keyof typeof METER_WORDS;
const METER_WORDS = {
  insulationTesterId: 'insulationTesterId',
  microOhmmeterId: 'microOhmmeterId',
  surgeTesterId: 'surgeTesterId',
  highPotentialTesterId: 'highPotentialTesterId',
  voltmeterId: 'voltmeterId',
  ammeterId: 'ammeterId',
  wattmeterId: 'wattmeterId',
  vibrationMeterId: 'vibrationMeterId',
  thermometerId: 'thermometerId',
} as const;

export function MetersPanel({ context, names }: { readonly context: RecordContext; readonly names: readonly MeterName[] }) {
  const { control } = useFormContext<IncomingValues>();
  return (
    <Panel title={t('meters')}>
      <div className="fields">
        {names.map((name) => (
          <SelectField
            key={name}
            control={control}
            name={`instruments.${name}`}
            label={t(METER_WORDS[name])}
            ask={t('notNamed')}
            options={context.bay.instruments.filter((i) => METER_KINDS[name]!.includes(i.kind)).map((i) => ({ value: i.id, label: meterWords(i) }))}
          />
        ))}
      </div>
    </Panel>
  );
}

function meterWords(i: InstrumentView): string {
  if (i.standing === 'overdue') return t('meterOverdue', { tag: i.tag });
  if (i.standing === 'due-soon') return t('meterDueSoon', { tag: i.tag });
  return t('meterOption', { tag: i.tag, description: i.description });
}

/** A yes or a no, or not tested. */
export function YesNoField({ name, label, help, problem }: { readonly name: string; readonly label: string; readonly help?: string; readonly problem?: string | undefined }) {
  const { control } = useFormContext();
  return (
    <>
      <ChoiceField
        control={control}
        name={name}
        label={label}
        help={help}
        options={[
          { value: 'yes', label: t('yes') },
          { value: 'no', label: t('no') },
        ]}
      />
      {problem && <p className="lb-problem">{problem}</p>}
    </>
  );
}

export const shownIn = (si: number, kind: Kind, system: UnitSystem) => formatUsual(si, kind, system);
