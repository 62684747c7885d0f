import { Button } from '@blueprintjs/core';
import { recordDeliverySchema, type JobSheet } from '@shared/jobs';
import { hasReached } from '@shared/route';
import { useForm } from 'react-hook-form';
import { TextAreaField, TextField } from '../../../components/fields.js';
import { Conditions, ErrorNotice } from '../../../components/notices.js';
import { Panel } from '../../../components/panel.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { momentOf } from '../../../lib/format.js';
import { useMay } from '../../../lib/me.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useRecordDelivery } from '../api/job-changes.js';
import { t } from '../work-text.js';

/** The machine goes out: who took it, and the delivery note. */
export function DeliveryPanel({ job }: { readonly job: JobSheet }) {
  const mayRecord = useMay('delivery.record');
  const delivery = job.signOffs.find((s) => s.kind === 'delivery');
  const goesOut = job.state === 'returned-unrepaired' || (job.state === 'open' && hasReached(job.route, job.step, 'ready'));
  const missing = job.state === 'open' ? stillMissing(job) : [];
  return (
    <Panel title={<span id="delivery">{t('delivery')}</span>}>
      {delivery ? (
        <div className="stack">
          <p>{t('delivered', { by: String(delivery.detail['receivedBy'] ?? ''), when: momentOf(delivery.at), number: String(delivery.detail['number'] ?? '') })}</p>
          {typeof delivery.detail['paperId'] === 'string' && (
            <a href={`/api/papers/${delivery.detail['paperId']}/pdf`} target="_blank" rel="noreferrer">
              {t('deliveredOpen')}
            </a>
          )}
        </div>
      ) : goesOut && missing.length > 0 ? (
        <div className="stack">
          <p>{t('deliveryMissing')}</p>
          <Conditions conditions={missing} />
        </div>
      ) : goesOut && mayRecord ? (
        <DeliveryForm job={job} />
      ) : goesOut ? (
        <p className="muted">{t('deliveryCounter')}</p>
      ) : (
        <p className="muted">{t('deliveryNotYet')}</p>
      )}
    </Panel>
  );
}

/** The signature comes last: everything else that the release asks for must be there before the machine leaves. */
const stillMissing = (job: JobSheet) => (job.gates.find((g) => g.gate === 'released')?.conditions ?? []).filter((c) => !c.met && c.code !== 'DELIVERY_NOTE');

function DeliveryForm({ job }: { readonly job: JobSheet }) {
  const deliver = useRecordDelivery(job.id);
  const { control, clearErrors, handleSubmit, setError } = useForm({ defaultValues: { receivedBy: '', words: '' } });
  return (
    <form
      className="stack"
      noValidate
      onSubmit={(e) => {
        e.preventDefault();
        sendForm({ clearErrors, handleSubmit }, (form) => {
          const input = checked(recordDeliverySchema, { ...form, version: job.version }, setError);
          if (input) deliver.mutate(input, { onError: (error) => showServerProblems(error, setError) });
        });
      }}
    >
      <p>{t('deliveryWords')}</p>
      <TextField control={control} name="receivedBy" label={t('receivedBy')} />
      <TextAreaField control={control} name="words" label={t('deliveryRemark')} optional rows={2} />
      <ErrorNotice error={unsaid(deliver.error, control)} />
      <div>
        <Button type="submit" intent="primary" text={t('deliver')} loading={deliver.isPending} />
      </div>
    </form>
  );
}
