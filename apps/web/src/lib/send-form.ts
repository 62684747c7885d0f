import type { FieldValues, UseFormReturn } from 'react-hook-form';

/**
 * Sends a form anew. What was said of the last try is taken back first: an error at a place that is no input of its own,
 * such as a group of ticks, would never be cleared by typing and would keep the form from being sent for good.
 */
export const sendForm = <F extends FieldValues>({ clearErrors, handleSubmit }: Pick<UseFormReturn<F>, 'clearErrors' | 'handleSubmit'>, send: (values: F) => void): void => {
  clearErrors();
  void handleSubmit(send)();
};
