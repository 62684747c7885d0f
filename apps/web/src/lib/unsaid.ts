import { get, type Control, type FieldValues } from 'react-hook-form';
import { ApiError } from './http.js';

const shows = <F extends FieldValues>(control: Control<F>, path: string): boolean => (get(control._fields, path) as { _f?: { mount?: boolean } } | undefined)?._f?.mount === true;

/**
 * An error whose words stand at the fields already is not said a second time below them.
 * With the form's control, words whose field is not on the screen are still said; without it, the form shows every field it sends.
 */
export function unsaid<F extends FieldValues>(error: unknown, control?: Control<F>, fieldOf: (path: string) => string = (path) => path): unknown {
  if (!(error instanceof ApiError) || error.fields.length === 0) return error;
  const left = control ? error.fields.filter(({ path }) => !shows(control, fieldOf(path))) : [];
  if (left.length === error.fields.length) return error;
  return left.length === 0 ? null : new ApiError(error.status, error.code, error.message, error.requestId, left, error.current, error.conditions);
}
