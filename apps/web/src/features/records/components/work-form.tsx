import type { RecordView } from '@shared/records';
import type { ComponentType } from 'react';
import { finalTestForm } from '../final-test-form.js';
import type { FormKind, RecordContext, RecordDefinition } from '../record-definition.js';
import { stripForm } from '../strip-form.js';
import { windingAsFoundForm, windingAsWoundForm } from '../winding-form.js';
import { beforeVarnishForm, incomingTestForm } from '../winding-test-forms.js';
import { assemblyForm, coreRepairForm, dismantlingForm, treatmentForm } from '../workshop-forms.js';
import { FinalTestFields } from './final-test-fields.js';
import { RecordForm, type FieldsProps } from './record-form.js';
import { StripFields } from './strip-fields.js';
import { WindingAsFoundFields, WindingAsWoundFields } from './winding-fields.js';
import { BeforeVarnishFields, IncomingTestFields } from './winding-test-fields.js';
import { AssemblyFields, CoreRepairFields, DismantlingFields, TreatmentFields } from './workshop-fields.js';

interface WorkFormProps {
  readonly context: RecordContext;
  readonly amend: RecordView | null;
  readonly onKept: (kept: RecordView) => void;
}

const form = <K extends FormKind, V extends object>(definition: RecordDefinition<K, V>, Fields: ComponentType<FieldsProps<K>>) =>
  function Form(props: WorkFormProps) {
    return <RecordForm definition={definition} Fields={Fields} {...props} />;
  };

/** The form of each kind of record. */
const FORMS: Record<FormKind, ComponentType<WorkFormProps>> = {
  'incoming-test': form(incomingTestForm, IncomingTestFields),
  dismantling: form(dismantlingForm, DismantlingFields),
  'winding-as-found': form(windingAsFoundForm, WindingAsFoundFields),
  strip: form(stripForm, StripFields),
  'core-repair': form(coreRepairForm, CoreRepairFields),
  'winding-as-wound': form(windingAsWoundForm, WindingAsWoundFields),
  'before-varnish-test': form(beforeVarnishForm, BeforeVarnishFields),
  treatment: form(treatmentForm, TreatmentFields),
  assembly: form(assemblyForm, AssemblyFields),
  'final-test': form(finalTestForm, FinalTestFields),
};
export const FORM_KINDS = Object.keys(FORMS) as FormKind[];

export function WorkForm({ kind, ...props }: WorkFormProps & { readonly kind: FormKind }) {
  const Form = FORMS[kind];
  return <Form {...props} />;
}
