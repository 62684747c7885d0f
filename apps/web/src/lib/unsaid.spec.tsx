import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { useForm } from 'react-hook-form';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { ErrorNotice } from '../components/notices.js';
import { TextField } from '../components/fields.js';
import { showProblems } from './form-problems.js';
import { ApiError } from './http.js';
import { sendForm } from './send-form.js';
import { unsaid } from './unsaid.js';

afterEach(cleanup);
const refusal = (...fields: (readonly [path: string, message: string])[]) => new ApiError(422, 'READINGS_NOT_VALID', 'Some readings cannot be right.', 'r-1', fields.map(([path, message]) => ({ path, code: 'x', message })));

function Form({ error, send = vi.fn(), start = [] }: { readonly error: unknown; readonly send?: (values: { tag: string }) => void; readonly start?: { path: string; message: string }[] }) {
  const { control, clearErrors, handleSubmit, setError } = useForm({ defaultValues: { tag: 'A-01' } });
  return (
    <form
      noValidate
      onSubmit={(e) => {
        e.preventDefault();
        sendForm({ clearErrors, handleSubmit }, send);
      }}
    >
      <TextField control={control} name="tag" label="Tag" />
      <ErrorNotice error={unsaid(error, control)} />
      <button type="button" onClick={() => showProblems(start, setError)}>
        refuse
      </button>
      <button type="submit">send</button>
    </form>
  );
}
/** Drawn twice, as a page is once the answer is there: the fields stand before the error comes. */
function shown(error: unknown) {
  const { rerender } = render(<Form error={null} />);
  rerender(<Form error={error} />);
}

describe('an error with words for single fields', () => {
  it('is said at its field alone when the field is on the screen', () => {
    shown(refusal(['tag', 'This tag is taken.']));
    expect(screen.queryByRole('alert')).toBeNull();
  });

  it('is said below when its field is not on the screen, and only that', () => {
    shown(refusal(['tag', 'This tag is taken.'], ['groups', 'Choose a group.']));
    expect(screen.getByRole('alert').textContent).toContain('Choose a group.');
    expect(screen.getByRole('alert').textContent).not.toContain('This tag is taken.');
  });

  it('is left whole when it names no field', () => {
    const error = new ApiError(409, 'MOVE_NOT_ALLOWED', 'This job is on hold.', 'r-2');
    expect(unsaid(error)).toBe(error);
    shown(error);
    expect(screen.getByRole('alert').textContent).toContain('This job is on hold.');
  });
});

describe('a form that was refused', () => {
  it('can be sent again after an error at a place that is no field', async () => {
    const send = vi.fn();
    render(<Form error={null} send={send} start={[{ path: 'groups', message: 'Choose a group.' }]} />);
    fireEvent.click(screen.getByText('refuse'));
    fireEvent.click(screen.getByText('send'));
    await waitFor(() => expect(send).toHaveBeenCalled());
  });
});
