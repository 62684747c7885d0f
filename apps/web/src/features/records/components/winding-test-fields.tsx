import { useFormContext } from 'react-hook-form';
import { TextField } from '../../../components/fields.js';
import { QuantityField } from '../../../components/quantity-field.js';
import { useUnits } from '../../../components/units.js';
import { judgementsOf, runningBeforeVarnish, runningIncoming } from '../live-machine-test.js';
import { usualSurgePeakV } from '../insulation-words.js';
import { t } from '../text.js';
import { BEFORE_VARNISH_METERS, INCOMING_METERS, type BeforeVarnishValues } from '../winding-test-forms.js';
import { InsulationPanel, MetersPanel, percentWords, ResistancePanel, TakeVolts, TestPanel, YesNoField } from './electrical-fields.js';
import type { FieldsProps } from './record-form.js';
import { RunningVerdict } from './running-verdict.js';

/** The machine as it came: may volts go on it at all? */
export function IncomingTestFields({ context, readings }: FieldsProps<'incoming-test'>) {
  const { control } = useFormContext<BeforeVarnishValues>();
  const running = runningIncoming(readings, context);
  return (
    <>
      <RunningVerdict running={running} />
      <div className="lb-tests">
        <InsulationPanel context={context} reading={readings.insulation} judgements={judgementsOf(running, 'insulation')} note={t('neverAsFound')} />
        <ResistancePanel context={context} judgements={judgementsOf(running, 'windingResistance')} demanded={false} />
        <MetersPanel context={context} names={INCOMING_METERS} />
      </div>
      <TextField control={control} name="remark" label={t('remark')} optional />
    </>
  );
}

/** Before varnish: after it a misconnection scraps the winding. */
export function BeforeVarnishFields({ context, readings }: FieldsProps<'before-varnish-test'>) {
  const { control } = useFormContext<BeforeVarnishValues>();
  const system = useUnits();
  const running = runningBeforeVarnish(readings, context);
  const peakV = usualSurgePeakV(readings.insulation);
  return (
    <>
      <RunningVerdict running={running} />
      <div className="lb-tests">
        <InsulationPanel context={context} reading={readings.insulation} judgements={judgementsOf(running, 'insulation')} />
        <ResistancePanel context={context} judgements={judgementsOf(running, 'windingResistance')} demanded={false} />
        <TestPanel title={t('surge')} limit={t('surgeLimit', { limit: percentWords(context.limits.machine.surgeDifference.value, system) })} judgements={judgementsOf(running, 'surge')}>
          <div className="fields">
            <QuantityField control={control} name="surgeDifferenceFraction" kind="percent" label={t('surgeDifference')} usual={[0, 0.3]} />
            <QuantityField control={control} name="surgePeakV" kind="voltage" label={t('surgePeak')} {...(peakV === null ? {} : { help: t('surgePeakHelp') })} optional />
          </div>
          {peakV !== null && <TakeVolts name="surgePeakV" voltsV={peakV} />}
        </TestPanel>
        <TestPanel title={t('polarity-test')} judgements={judgementsOf(running, 'polarity')}>
          <YesNoField name="polarityRight" label={t('polarity')} help={t('polarityHelp')} mayBeLeft />
        </TestPanel>
        <MetersPanel context={context} names={BEFORE_VARNISH_METERS} />
      </div>
      <TextField control={control} name="remark" label={t('remark')} optional />
    </>
  );
}
