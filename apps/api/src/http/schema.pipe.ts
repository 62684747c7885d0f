import { StandardSchemaValidationPipe } from '@nestjs/common';
import type { FieldProblem } from '@shared/errors';

/** What a message's contract refused, field by field. */
export class InputNotValid extends Error {
  constructor(readonly fields: readonly FieldProblem[]) {
    super('Input not valid');
  }
}

interface Issue {
  readonly message: string;
  readonly path?: readonly (PropertyKey | { key: PropertyKey })[] | undefined;
  readonly code?: string;
}

/** Every message is parsed by its contract in `shared/`; what is wrong comes back at its field. */
export const schemaPipe = () =>
  new StandardSchemaValidationPipe({
    exceptionFactory: (issues: unknown) => new InputNotValid((issues as readonly Issue[]).map(toProblem)),
  });

function toProblem(issue: Issue): FieldProblem {
  const path = (issue.path ?? []).map((part) => String(typeof part === 'object' ? part.key : part)).join('.');
  return { path, code: issue.code ?? 'invalid', message: issue.message };
}
