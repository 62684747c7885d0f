import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { ConfirmDialog } from './confirm-dialog.js';
import { SignDialog } from './sign-dialog.js';

const behind = vi.fn();
const inForm = (dialog: React.ReactNode) => render(<form onSubmit={behind}>{dialog}</form>);

describe('a dialog over a form', () => {
  it('answered, does not also send the form behind it', () => {
    const onConfirm = vi.fn();
    inForm(<ConfirmDialog open title="Leave without saving?" confirm="Leave" onConfirm={onConfirm} onClose={() => undefined} />);
    fireEvent.submit(screen.getByText('Leave').closest('form')!);
    expect(onConfirm).toHaveBeenCalledOnce();
    expect(behind).not.toHaveBeenCalled();
  });

  it('signed, does not also send the form behind it', () => {
    const onSign = vi.fn();
    inForm(<SignDialog open title="Sign" pending={false} error={null} onSign={onSign} onClose={() => undefined} />);
    fireEvent.change(document.querySelector('input[type="password"]')!, { target: { value: 'my own' } });
    fireEvent.submit(document.querySelector('input[type="password"]')!.closest('form')!);
    expect(onSign).toHaveBeenCalledWith('my own');
    expect(behind).not.toHaveBeenCalled();
  });
});
