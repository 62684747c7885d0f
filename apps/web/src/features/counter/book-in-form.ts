import type { UnitSystem } from '@libs/quantities';
import { bookInSchema, type BookIn } from '@shared/jobs';
import type { CreateCustomer } from '@shared/customers';
import type { Route } from '@shared/route';
import { problemsOf } from '../../lib/form-problems.js';
import { emptyNameplate, readNameplate, type NameplateForm } from '../../lib/nameplate-form.js';
import { FormReader, type FormProblem } from '../../lib/typed.js';
import { t } from './text.js';

/** The booking as it is typed. Its paths are those of the contract, so that a refusal lands on its own field. */
export interface BookInForm {
  customer: { kind: 'known' | 'new'; customerId: string | null; name: string; details: CreateCustomer };
  machine: { kind: 'known' | 'new'; machineId: string | null; words: string; details: { description: string; nameplate: NameplateForm } };
  route: Route;
  complaint: string;
  accessories: string;
  contamination: BookIn['contamination'] | null;
  contaminationWords: string;
  promisedOn: string | null;
  customerReference: string;
  warrantyOfJobId: string | null;
}

export const emptyBookIn = (system: UnitSystem): BookInForm => ({
  customer: { kind: 'known', customerId: null, name: '', details: { name: '', contactName: '', email: '', phone: '', addressLine1: '', addressLine2: '', postcode: '', city: '', country: 'DE', taxNumber: '' } },
  machine: { kind: 'known', machineId: null, words: '', details: { description: '', nameplate: emptyNameplate(system) } },
  route: 'rewind',
  complaint: '',
  accessories: '',
  contamination: null,
  contaminationWords: '',
  promisedOn: null,
  customerReference: '',
  warrantyOfJobId: null,
});

export type Panel = 'customer' | 'machine' | 'wrong' | 'promise';
export const PANELS: readonly Panel[] = ['customer', 'machine', 'wrong', 'promise'];

const WRONG = ['complaint', 'accessories', 'contamination', 'contaminationWords'];
/** In which of the four panels a field stands. */
export function panelOf(path: string): Panel {
  const [head = ''] = path.split('.');
  if (head === 'customer' || head === 'machine') return head;
  return WRONG.includes(head) ? 'wrong' : 'promise';
}

/** The booking as the contract takes it, or everything that is missing or wrong, each at its field. */
export function bookInOf(form: BookInForm): { readonly input: BookIn } | { readonly problems: readonly FormProblem[] } {
  const reader = new FormReader();
  const candidate = {
    customer: form.customer.kind === 'new' ? { kind: 'new', details: form.customer.details } : { kind: 'known', customerId: form.customer.customerId },
    machine:
      form.machine.kind === 'new'
        ? { kind: 'new', details: { description: form.machine.details.description, nameplate: readNameplate(form.machine.details.nameplate, reader, 'machine.details.nameplate') } }
        : { kind: 'known', machineId: form.machine.machineId },
    route: form.route,
    complaint: form.complaint,
    accessories: form.accessories,
    contamination: form.contamination,
    contaminationWords: form.contaminationWords,
    promisedOn: form.promisedOn,
    customerReference: form.customerReference,
    warrantyOfJobId: form.machine.kind === 'known' ? form.warrantyOfJobId : null,
  };
  const parsed = bookInSchema.safeParse(candidate);
  const problems = [...reader.problems, ...(parsed.success ? [] : problemsOf(parsed.error))].map(inWords);
  return parsed.success && problems.length === 0 ? { input: parsed.data } : { problems };
}

/** A choice that was not made is asked for by its own words. */
function inWords(problem: FormProblem): FormProblem {
  if (problem.path === 'customer.customerId') return { ...problem, message: t('customerMissing') };
  if (problem.path === 'machine.machineId') return { ...problem, message: t('machineMissing') };
  return problem;
}

/** What is wrong in one panel, so that the next one opens only when this one is whole. */
export function problemsIn(panel: Panel, form: BookInForm): readonly FormProblem[] {
  const read = bookInOf(form);
  return 'problems' in read ? read.problems.filter((p) => panelOf(p.path) === panel) : [];
}

/** A day so many days after another, as yyyy-mm-dd. */
export const daysAfter = (today: string, days: number): string => new Date(Date.parse(`${today}T00:00:00Z`) + days * 86_400_000).toISOString().slice(0, 10);
