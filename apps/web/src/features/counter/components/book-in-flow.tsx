import { Button } from '@blueprintjs/core';
import { useState } from 'react';
import { useForm, useWatch, type FieldErrors } from 'react-hook-form';
import { DraftNotice, useDraft } from '../../../components/draft.js';
import { SelectField, TextAreaField, TextField } from '../../../components/fields.js';
import { ErrorNotice } from '../../../components/notices.js';
import { showProblems } from '../../../lib/form-problems.js';
import { calendarDay } from '../../../lib/format.js';
import { ApiError } from '../../../lib/http.js';
import { routeName } from '../../../lib/step-names.js';
import type { FormProblem } from '../../../lib/typed.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useBookIn } from '../api/counter-queries.js';
import { bookInOf, panelOf, PANELS, problemsIn, type BookInForm, type Panel } from '../book-in-form.js';
import { CONTAMINATION_OPTIONS, contaminationName, t } from '../text.js';
import { CustomerChoice } from './customer-choice.js';
import { FlowPanel } from './flow-panel.js';
import { MachineChoice } from './machine-choice.js';
import { PromiseFields } from './promise-fields.js';

const TITLES: Record<Panel, string> = { customer: t('customerTitle'), machine: t('machineTitle'), wrong: t('wrongTitle'), promise: t('promiseTitle') };

interface BookInFlowProps {
  readonly start: BookInForm;
  /** drafts of different beginnings are kept apart */
  readonly draftKey: string;
  readonly onBooked: (jobId: string) => void;
}

/** Four short panels: whose, what, what is wrong, for when. Nothing typed is lost, whatever the answer is. */
export function BookInFlow({ start, draftKey, onBooked }: BookInFlowProps) {
  const form = useForm<BookInForm>({ defaultValues: start, shouldUnregister: false });
  const { control, getValues, setError, clearErrors, formState } = form;
  const draft = useDraft(form, draftKey);
  const book = useBookIn();
  const [open, setOpen] = useState<Panel>(firstGap(start));
  const values = useWatch({ control }) as BookInForm;

  const show = (problems: readonly FormProblem[]) => {
    const first = problems[0];
    if (first) setOpen(panelOf(first.path));
    // the fields of a panel that just opens are there after the next frame
    requestAnimationFrame(() => showProblems(problems, setError));
  };
  const next = (panel: Panel) => {
    clearErrors();
    const problems = problemsIn(panel, getValues());
    if (problems.length > 0) return show(problems);
    setOpen(PANELS[PANELS.indexOf(panel) + 1] ?? panel);
  };
  const submit = () => {
    if (open !== 'promise') return next(open);
    clearErrors();
    const read = bookInOf(getValues());
    if ('problems' in read) return show(read.problems);
    book.mutate(read.input, {
      onSuccess: ({ id }) => {
        draft.forget();
        onBooked(id);
      },
      onError: (error) => {
        if (error instanceof ApiError && error.fields.length > 0) show(error.fields);
      },
    });
  };
  const panel = (name: Panel, children: React.ReactNode) => (
    <FlowPanel
      key={name}
      number={PANELS.indexOf(name) + 1}
      title={TITLES[name]}
      open={open === name}
      summary={summaryOf(name, values)}
      wrong={hasErrors(name, formState.errors)}
      onOpen={() => setOpen(name)}
      onNext={name === 'promise' ? null : () => next(name)}
    >
      {children}
    </FlowPanel>
  );
  return (
    <form
      className="stack"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <DraftNotice form={form} draft={draft} />
      {panel('customer', <CustomerChoice form={form} onChosen={() => setOpen('machine')} />)}
      {panel('machine', <MachineChoice form={form} onChosen={() => setOpen('wrong')} />)}
      {panel(
        'wrong',
        <div className="fields">
          <TextAreaField control={control} name="complaint" label={t('complaint')} rows={2} />
          <TextField control={control} name="accessories" label={t('accessories')} help={t('accessoriesHelp')} optional />
          <SelectField control={control} name="contamination" label={t('contamination')} help={t('contaminationHelp')} options={CONTAMINATION_OPTIONS} ask="–" />
          {values.contamination !== null && values.contamination !== 'none' && <TextField control={control} name="contaminationWords" label={t('contaminationWords')} optional />}
        </div>,
      )}
      {panel(
        'promise',
        <>
          <PromiseFields form={form} />
          <ErrorNotice error={unsaid(book.error, control)} />
          <div>
            <Button type="submit" intent="primary" size="large" text={t('book')} loading={book.isPending} />
          </div>
        </>,
      )}
    </form>
  );
}

/** Where to begin: at the first panel that is not filled yet. */
const firstGap = (start: BookInForm): Panel => (start.customer.customerId === null ? 'customer' : start.machine.machineId === null ? 'machine' : 'wrong');

const hasErrors = (panel: Panel, errors: FieldErrors<BookInForm>): boolean => Object.keys(errors).some((key) => panelOf(key) === panel);

function summaryOf(panel: Panel, { customer, machine, complaint, contamination, route, promisedOn }: BookInForm): string {
  switch (panel) {
    case 'customer':
      return customer.kind === 'new' ? customer.details.name : customer.name;
    case 'machine':
      return machine.kind === 'new' ? machine.details.description : machine.words;
    case 'wrong':
      return [complaint, contamination === null || contamination === 'none' ? '' : contaminationName(contamination)].filter(Boolean).join(' · ');
    case 'promise':
      return complaint === '' ? '' : [routeName(route), promisedOn ? calendarDay(promisedOn) : t('noPromise')].join(', ');
  }
}
