import { useEffect } from 'react';

/** On a page of the bay everything grows for gloves: the tokens follow `data-density` on the body, floating parts included. */
export function useBayDensity(): void {
  useEffect(() => {
    document.body.dataset['density'] = 'bay';
    return () => {
      delete document.body.dataset['density'];
    };
  }, []);
}
