import { ApiError } from './http.js';

/** An error whose words stand at the fields already is not said a second time below them. Only for forms that show every field they send. */
export const unsaid = (error: unknown): unknown => (error instanceof ApiError && error.fields.length > 0 ? null : error);
