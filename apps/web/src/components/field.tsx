import { FormGroup } from '@blueprintjs/core';
import { useId, type ReactNode } from 'react';
import { defineText } from '../lib/text.js';

const t = defineText({ optional: '(optional)' });

export interface FieldFrame {
  readonly id: string;
  readonly describedBy: string | undefined;
  readonly invalid: boolean;
}

interface FieldProps {
  readonly label: string;
  /** said with the field to whoever hears the page; the eye sees it in the field */
  readonly unit?: string;
  readonly help?: ReactNode;
  readonly problem?: string | undefined;
  readonly optional?: boolean;
  readonly wide?: boolean;
  readonly children: (frame: FieldFrame) => ReactNode;
}

/** Label, help and error, wired to the control they belong to. */
export function Field({ label, unit, help, problem, optional = false, wide = false, children }: FieldProps) {
  const id = useId();
  const helpId = `${id}-help`;
  const unitId = `${id}-unit`;
  const words = problem ?? help;
  const describedBy = [unit ? unitId : '', words ? helpId : ''].filter(Boolean).join(' ') || undefined;
  return (
    <FormGroup
      className={wide ? 'wide' : ''}
      label={label}
      labelFor={id}
      labelInfo={optional ? <span className="muted">{t('optional')}</span> : undefined}
      intent={problem ? 'danger' : 'none'}
      helperText={words ? <span id={helpId} role={problem ? 'alert' : undefined}>{words}</span> : undefined}
    >
      {children({ id, describedBy, invalid: problem !== undefined })}
      {unit && (
        <span id={unitId} className="visually-hidden">
          {unit}
        </span>
      )}
    </FormGroup>
  );
}
