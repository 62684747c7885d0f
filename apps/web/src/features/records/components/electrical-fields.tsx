import { Button } from '@blueprintjs/core';
import { insulationMinimum, type InsulationReading, type MachineTestLimits, type TestJudgement } from '@libs/machine-tests';
import { formatUsual, formatQuantity, type Kind, type UnitSystem } from '@libs/quantities';
import type { InstrumentView } from '@shared/instruments';
import type { ReactNode } from 'react';
import { useController, useFormContext } from 'react-hook-form';
import { CheckField, ChoiceField, SelectField } from '../../../components/fields.js';
import { Notice } from '../../../components/notice.js';
import { Panel } from '../../../components/panel.js';
import { QuantityField } from '../../../components/quantity-field.js';
import { useUnits } from '../../../components/units.js';
import { typedFrom } from '../../../lib/typed.js';
import type { RecordContext } from '../record-definition.js';
import { bothRulesWords, testVoltsAsked } from '../insulation-words.js';
import { asksTenMinutes } from '../electrical-form.js';
import { t } from '../text.js';
import type { IncomingValues } from '../winding-test-forms.js';
import { JudgementList } from './judgement-list.js';

/** One test of a machine: its fields, the limit beside them, and what they come to as they are typed. */
export function TestPanel({ title, limit, judgements, problem, children }: { readonly title: ReactNode; readonly limit?: string; readonly judgements: readonly TestJudgement[]; readonly problem?: string | undefined; readonly children: ReactNode }) {
  return (
    <Panel title={title} actions={limit && <span className="muted num">{limit}</span>}>
      {problem && (
        <Notice intent="danger" role="alert" className="lb-refused">
          {problem}
        </Notice>
      )}
      {children}
      <div aria-live="polite">
        <JudgementList judgements={judgements} />
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

interface InsulationPanelProps {
  readonly context: RecordContext;
  readonly judgements: readonly TestJudgement[];
  readonly reading: InsulationReading;
  /** said at the head of the panel, before anything is typed */
  readonly note?: string;
}

/** Insulation resistance after one minute, and what it comes to at 40 °C by either rule. */
export function InsulationPanel({ context, judgements, reading, note }: InsulationPanelProps) {
  const { control, watch } = useFormContext<IncomingValues>();
  const system = useUnits();
  const least = reading.ratedVoltageV > 0 ? insulationMinimum(reading, context.limits.machine).value : null;
  const volts = testVoltsAsked(reading.ratedVoltageV, system);
  const bothRules = bothRulesWords(reading, system);
  return (
    <TestPanel title={t('insulation')} {...(least === null ? {} : { limit: t('least', { least: formatQuantity(least, 'resistance-mega', system, { significant: 3 }) }) })} judgements={judgements}>
      <div className="stack">
        {note && <Notice compact>{note}</Notice>}
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
          <QuantityField control={control} name="insulation.testVoltsV" kind="voltage" label={t('testVolts')} usual={[100, 10_000]} help={volts?.words} />
          <QuantityField control={control} name="insulation.windingTemperatureC" kind="temperature" label={t('windingTemperature')} usual={[5, 60]} />
          <QuantityField control={control} name="insulation.resistanceOhm" kind="resistance-mega" label={t('afterOneMinute')} />
          {asksTenMinutes(watch('insulation')) && <QuantityField control={control} name="insulation.tenMinuteResistanceOhm" kind="resistance-mega" label={t('tenMinutes')} optional />}
        </div>
        {volts && reading.testVoltsV !== volts.leastV && <TakeVolts name="insulation.testVoltsV" voltsV={volts.leastV} />}
        <ChoiceField
          control={control}
          name="insulation.correctionRule"
          label={t('correctionRule')}
          help={[bothRules, t('rulesDiffer')].filter(Boolean).join(' ')}
          options={[
            { value: 'halving', label: t('halving') },
            { value: 'thermosetting', label: t('thermosetting') },
          ]}
        />
      </div>
    </TestPanel>
  );
}

/** Fills in the volts that are asked, on a tap. */
export function TakeVolts({ name, voltsV }: { readonly name: string; readonly voltsV: number }) {
  const { setValue } = useFormContext();
  const system = useUnits();
  return (
    <div>
      <Button
        text={t('takeLevel', { volts: formatUsual(voltsV, 'voltage', system) })}
        onClick={() => setValue(name, typedFrom(voltsV, 'voltage', system), { shouldDirty: true, shouldTouch: true, shouldValidate: true })}
      />
    </div>
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

interface YesNoProps {
  readonly name: string;
  readonly label: string;
  readonly help?: string;
  /** an answer can be put back to not done */
  readonly mayBeLeft?: boolean;
}

/** A yes or a no, or not tested. */
export function YesNoField({ name, label, help, mayBeLeft = false }: YesNoProps) {
  const { control } = useFormContext();
  return (
    <ChoiceField
      control={control}
      name={name}
      label={label}
      help={help}
      options={[{ value: 'yes', label: t('yes') }, { value: 'no', label: t('no') }, ...(mayBeLeft ? [{ value: 'not-done', label: t('answerNotDone') }] : [])]}
    />
  );
}

export const shownIn = (si: number, kind: Kind, system: UnitSystem) => formatUsual(si, kind, system);
