import { FormGroup } from '@blueprintjs/core';
import { useId, type ReactNode } from 'react';

export interface FieldFrame {
  readonly id: string;
  readonly describedBy: string | undefined;
  readonly invalid: boolean;
}

interface FieldProps {
  readonly label: string;
  readonly help?: ReactNode;
  readonly problem?: string | undefined;
  readonly optional?: boolean;
  readonly wide?: boolean;
  readonly children: (frame: FieldFrame) => ReactNode;
}

/** Label, help and error, wired to the control they belong to. */
export function Field({ label, help, problem, optional = false, wide = false, children }: FieldProps) {
  const id = useId();
  const helpId = `${id}-help`;
  const words = problem ?? help;
  return (
    <FormGroup
      className={wide ? 'wide' : ''}
      label={label}
      labelFor={id}
      labelInfo={optional ? <span className="muted">(optional)</span> : undefined}
      intent={problem ? 'danger' : 'none'}
      helperText={words ? <span id={helpId} role={problem ? 'alert' : undefined}>{words}</span> : undefined}
    >
      {children({ id, describedBy: words ? helpId : undefined, invalid: problem !== undefined })}
    </FormGroup>
  );
}
