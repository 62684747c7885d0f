import { Button } from '@blueprintjs/core';
import { ROUTES } from '@shared/route';
import { useQuery } from '@tanstack/react-query';
import { useWatch, type UseFormReturn } from 'react-hook-form';
import { ChoiceField, SelectField, TextField } from '../../../components/fields.js';
import { machineQuery } from '../../../lib/customer-queries.js';
import { shopToday } from '../../../lib/format.js';
import { routeName } from '../../../lib/step-names.js';
import { daysAfter, type BookInForm } from '../book-in-form.js';
import { t } from '../text.js';

const ROUTE_OPTIONS = ROUTES.map((value) => ({ value, label: routeName(value) }));
const IN_DAYS = [
  [7, t('inWeek')],
  [14, t('inTwoWeeks')],
  [28, t('inFourWeeks')],
] as const;

/** Which route it takes, and for when it is promised. */
export function PromiseFields({ form }: { readonly form: UseFormReturn<BookInForm> }) {
  const { control, setValue } = form;
  const machine = useWatch({ control, name: 'machine' });
  const known = machine.kind === 'known' ? machine.machineId : null;
  const visits = useQuery({ ...machineQuery(known ?? ''), enabled: known !== null }).data?.visits ?? [];
  const today = shopToday(new Date());
  return (
    <>
      <ChoiceField control={control} name="route" label={t('route')} help={t('routeHelp')} options={ROUTE_OPTIONS} />
      <div className="fields">
        <TextField control={control} name="promisedOn" type="date" label={t('promisedOn')} help={t('promisedHelp')} optional />
        <TextField control={control} name="customerReference" label={t('customerReference')} optional />
        {known !== null && visits.length > 0 && <SelectField control={control} name="warrantyOfJobId" label={t('warranty')} options={visits.map((v) => ({ value: v.jobId, label: v.jobNumber }))} ask={t('noWarranty')} optional />}
      </div>
      <div className="row">
        {IN_DAYS.map(([days, words]) => (
          <Button key={days} text={words} onClick={() => setValue('promisedOn', daysAfter(today, days), { shouldDirty: true, shouldTouch: true })} />
        ))}
      </div>
    </>
  );
}
