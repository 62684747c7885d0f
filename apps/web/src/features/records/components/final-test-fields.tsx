import { Button } from '@blueprintjs/core';
import { finalTestProblems, vibrationLimit, type FinalTestDerived } from '@libs/machine-tests';
import { formatUsual, OutOfRangeError } from '@libs/quantities';
import { demandedFinalTestParts } from '@shared/machine-tests';
import { useFieldArray, useFormContext, useWatch } from 'react-hook-form';
import { ChoiceField, SelectField, TextField } from '../../../components/fields.js';
import { QuantityField } from '../../../components/quantity-field.js';
import { useUnits } from '../../../components/units.js';
import { untyped } from '../../../lib/typed.js';
import { asksSecondaryVolts, blankPoint, FINAL_METERS, finalReadings, levelNow, type FinalValues } from '../final-test-form.js';
import { judgementsOf, runningFinal, type RunningTest } from '../live-machine-test.js';
import { isYes, type RecordContext } from '../record-definition.js';
import { t } from '../text.js';
import { CoreOnceMore } from './core-once-more.js';
import { InsulationPanel, MetersPanel, OptionalPanel, percentWords, ResistancePanel, TakeVolts, TestPanel, YesNoField } from './electrical-fields.js';
import { NoLoadLosses } from './no-load-losses.js';
import type { FieldsProps } from './record-form.js';
import { RunningVerdict } from './running-verdict.js';

type Readings = FieldsProps<'final-test'>['readings'];
interface PanelProps {
  readonly context: RecordContext;
  readonly readings: Readings;
  readonly running: RunningTest<FinalTestDerived> | null;
  readonly demanded: boolean;
}

/** One panel a test, the limit beside the fields, the verdict so far on top. */
export function FinalTestFields({ context, readings }: FieldsProps<'final-test'>) {
  const { control } = useFormContext<FinalValues>();
  const system = useUnits();
  const held = useWatch({ control, name: 'highPotential.held' });
  const running = runningFinal(readings, isYes(held), context);
  const demands = demandedFinalTestParts(context.job.machine.nameplate.kind, context.job.route);
  const panel = (part: (typeof demands)[number]): PanelProps => ({ context, readings, running, demanded: demands.includes(part) });
  return (
    <>
      <RunningVerdict running={running} />
      <div className="lb-tests">
        <InsulationPanel context={context} reading={readings.insulation} judgements={judgementsOf(running, 'insulation')} />
        <ResistancePanel context={context} judgements={judgementsOf(running, 'windingResistance')} demanded={demands.includes('winding-resistance')} />
        <HighPotentialPanel {...panel('high-potential')} />
        <TestPanel title={t('surge')} limit={t('surgeLimit', { limit: percentWords(context.limits.machine.surgeDifference.value, system) })} judgements={judgementsOf(running, 'surge')}>
          <QuantityField control={control} name="surgeDifferenceFraction" kind="percent" label={t('surgeDifference')} optional usual={[0, 0.3]} />
        </TestPanel>
        <NoLoadPanel {...panel('no-load')} />
        <VibrationPanel {...panel('vibration')} />
        <BearingsPanel {...panel('bearings')} />
        <TestPanel title={t('direction')} judgements={judgementsOf(running, 'direction')}>
          <YesNoField name="directionRight" label={t('direction')} mayBeLeft {...(demands.includes('direction') ? { help: t('demanded') } : {})} />
        </TestPanel>
        <CoreOnceMore job={context.job} records={context.records} />
        <MetersPanel context={context} names={FINAL_METERS} />
      </div>
      <TextField control={control} name="remark" label={t('remark')} optional />
    </>
  );
}

function HighPotentialPanel({ context, readings, running, demanded }: PanelProps) {
  const { control } = useFormContext<FinalValues>();
  const system = useUnits();
  const level = levelNow(readings, context.limits.machine);
  const refused = finalTestProblems(finalReadings(readings), context.limits.machine).find((p) => p.path === 'highPotential');
  const which = useWatch({ control, name: 'highPotential.case' });
  const volts = level && formatUsual(level.voltsV, 'voltage', system);
  return (
    <OptionalPanel name="highPotential" title={t('highPotential')} demanded={demanded} judgements={judgementsOf(running, 'highPotential')} problem={refused?.message} {...(level && volts ? { limit: t('level', { volts, words: level.words }) } : {})}>
      <div className="stack">
        <p className="lb-panel-caution">{t('highPotentialCaution')}</p>
        <SelectField
          control={control}
          name="highPotential.case"
          label={t('case')}
          options={[
            { value: 'new-winding', label: t('newWinding') },
            { value: 'repeat', label: t('repeat') },
            { value: 'reconditioned', label: t('reconditioned') },
            { value: 'part-rewound', label: t('partRewound') },
            { value: 'wound-rotor', label: t('woundRotor') },
            { value: 'wound-rotor-reversing', label: t('woundRotorReversing') },
          ]}
        />
        <div className="fields lb-record-three">
          <QuantityField control={control} name="highPotential.ratedVoltageV" kind="voltage" label={t('ratedVoltage')} />
          <QuantityField control={control} name="highPotential.ratedPowerW" kind="rated-power" label={t('ratedPower')} optional />
          {asksSecondaryVolts(which) && <QuantityField control={control} name="highPotential.secondaryVoltsV" kind="voltage" label={t('secondaryVolts')} />}
          <QuantityField control={control} name="highPotential.appliedVoltsV" kind="voltage" label={t('appliedVolts')} usual={[500, 60_000]} />
          <QuantityField control={control} name="highPotential.seconds" kind="number" label={t('seconds')} usual={[1, 120]} />
        </div>
        {level && (
          <div className="row">
            {!refused && <TakeVolts name="highPotential.appliedVoltsV" voltsV={level.voltsV} />}
            <span className="muted lb-source">{t('levelSource', level)}</span>
          </div>
        )}
        <ChoiceField
          control={control}
          name="highPotential.supply"
          label={t('testSupply')}
          options={[
            { value: 'ac', label: t('ac') },
            { value: 'dc', label: t('dcVolts') },
          ]}
        />
        <YesNoField name="highPotential.held" label={t('held')} />
      </div>
    </OptionalPanel>
  );
}

function NoLoadPanel({ context, running, demanded }: PanelProps) {
  const { control } = useFormContext<FinalValues>();
  const points = useFieldArray({ control, name: 'noLoad.points' });
  const system = useUnits();
  const many = points.fields.length > 1;
  return (
    <OptionalPanel name="noLoad" title={t('noLoad')} demanded={demanded} judgements={judgementsOf(running, 'noLoad')} limit={t('ampsLimit', { limit: percentWords(context.limits.machine.noLoadCurrentBalance.value, system) })}>
      <div className="stack">
        {points.fields.map((point, i) => (
          <fieldset key={point.id} className="lb-point">
            <legend>{many ? t('point', { n: i + 1 }) : ''}</legend>
            {([0, 1, 2] as const).map((j) => (
              <QuantityField key={`v${j}`} control={control} name={`noLoad.points.${i}.voltsV.${j}`} kind="voltage" label={t('volts', { n: j + 1 })} />
            ))}
            {([0, 1, 2] as const).map((j) => (
              <QuantityField key={`a${j}`} control={control} name={`noLoad.points.${i}.ampsA.${j}`} kind="current" label={t('amps', { n: j + 1 })} />
            ))}
            <QuantityField control={control} name={`noLoad.points.${i}.wattsW`} kind="power" label={t('watts')} />
            {many && <Button variant="minimal" text={t('removePoint', { n: i + 1 })} onClick={() => points.remove(i)} />}
          </fieldset>
        ))}
        {points.fields.length < 40 && <Button variant="minimal" text={t('addPoint')} onClick={() => points.append(blankPoint(system))} />}
        <div className="fields lb-record-four">
          <QuantityField control={control} name="noLoad.lineResistanceOhm" kind="resistance" label={t('lineResistance')} />
          <QuantityField control={control} name="noLoad.frequencyHz" kind="frequency" label={t('frequency')} usual={[16, 400]} />
          <QuantityField control={control} name="noLoad.speedRpm" kind="speed" label={t('speed')} optional />
          <QuantityField control={control} name="noLoad.ratedVoltageV" kind="voltage" label={t('ratedFed')} optional />
        </div>
        <p className="muted lb-source">{t('pointsHelp')}</p>
        <NoLoadLosses derived={running?.derived.noLoad ?? null} />
      </div>
    </OptionalPanel>
  );
}

/** The limit of vibration as far as standard, mounting and shaft height say it already. */
function vibrationWords(readings: Readings, context: RecordContext, system: 'si' | 'inch-pound'): string | undefined {
  const { vibration } = readings;
  if (!vibration) return undefined;
  try {
    const what = t(vibration.standard === 'nema-mg1' ? 'vibrationPeak' : 'vibrationRms');
    return t('vibrationLimit', { limit: formatUsual(vibrationLimit(vibration, context.limits.machine).value, 'vibration-velocity', system), what });
  } catch (error) {
    if (error instanceof OutOfRangeError) return undefined;
    throw error;
  }
}

function VibrationPanel({ context, readings, running, demanded }: PanelProps) {
  const { control } = useFormContext<FinalValues>();
  const places = useWatch({ control, name: 'vibration.velocitiesMPerS' });
  const { setValue } = useFormContext<FinalValues>();
  const system = useUnits();
  const limit = vibrationWords(readings, context, system);
  const nema = readings.vibration?.standard === 'nema-mg1';
  return (
    <OptionalPanel name="vibration" title={t('vibration')} demanded={demanded} judgements={judgementsOf(running, 'vibration')} {...(limit ? { limit } : {})}>
      <div className="stack">
        <ChoiceField
          control={control}
          name="vibration.standard"
          label={t('standard')}
          options={[
            { value: 'iec-60034-14-2003', label: t('iec') },
            { value: 'nema-mg1', label: t('nema') },
          ]}
        />
        <ChoiceField
          control={control}
          name="vibration.mounting"
          label={t('mounting')}
          options={[
            { value: 'free-suspension', label: t('free') },
            { value: 'rigid', label: t('rigid') },
          ]}
        />
        <div className="fields lb-record-three">
          <QuantityField control={control} name="vibration.shaftHeightM" kind="length" label={t('shaftHeight')} optional={nema} usual={[0.056, 0.9]} />
          <QuantityField control={control} name="vibration.speedRpm" kind="speed" label={t('speed')} optional={!nema} />
          {places.map((_, i) => (
            <QuantityField key={i} control={control} name={`vibration.velocitiesMPerS.${i}`} kind="vibration-velocity" label={t('place', { n: i + 1 })} optional={i > 0} />
          ))}
        </div>
        {places.length < 12 && <Button variant="minimal" text={t('addPlace')} onClick={() => setValue('vibration.velocitiesMPerS', [...places, untyped(system)], { shouldDirty: true })} />}
      </div>
    </OptionalPanel>
  );
}

function BearingsPanel({ context, running, demanded }: PanelProps) {
  const { control } = useFormContext<FinalValues>();
  const system = useUnits();
  const { bearingRiseK, bearingRiseTwoPoleK } = context.limits.machine;
  const kelvin = (k: number) => formatUsual(k, 'temperature-difference', system);
  return (
    <OptionalPanel name="bearings" title={t('bearings')} demanded={demanded} judgements={judgementsOf(running, 'bearings')} limit={t('bearingLimit', { limit: kelvin(bearingRiseK.value), twoPole: kelvin(bearingRiseTwoPoleK.value) })}>
      <div className="fields lb-record-three">
        <QuantityField control={control} name="bearings.driveEndC" kind="temperature" label={t('driveEnd')} />
        <QuantityField control={control} name="bearings.nonDriveEndC" kind="temperature" label={t('nonDriveEnd')} />
        <QuantityField control={control} name="bearings.ambientC" kind="temperature" label={t('ambient')} />
        <QuantityField control={control} name="bearings.changeInHalfHourK" kind="temperature-difference" label={t('changeHalfHour')} />
        <QuantityField control={control} name="bearings.poles" kind="count" label={t('poles')} />
      </div>
    </OptionalPanel>
  );
}
