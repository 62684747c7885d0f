import { Button, HTMLSelect, InputGroup } from '@blueprintjs/core';
import { Search } from '@blueprintjs/icons';
import { useEffect, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { isFiltered, STATE_FILTERS, type InvoiceFilter } from '../invoice-filter.js';
import { t } from '../invoice-text.js';

/** State and text of the list; both stand in the address. */
export function InvoiceFilters({ filter }: { readonly filter: InvoiceFilter }) {
  const [, setParams] = useSearchParams();
  const asked = filter.q ?? '';
  const [typed, setTyped] = useState(asked);
  const [seen, setSeen] = useState(asked);
  if (asked !== seen) {
    setSeen(asked);
    setTyped(asked);
  }
  const set = (changes: Record<string, string | null>) =>
    setParams(
      (old) => {
        const next = new URLSearchParams(old);
        next.delete('page');
        for (const [key, value] of Object.entries(changes)) {
          if (value === null || value === '') next.delete(key);
          else next.set(key, value);
        }
        return next;
      },
      { replace: true },
    );
  useEffect(() => {
    if (typed.trim() === asked) return;
    const later = setTimeout(() => set({ q: typed.trim() }), 300);
    return () => clearTimeout(later);
    // eslint-disable-next-line react-hooks/exhaustive-deps
  }, [typed]);
  return (
    <form className="row" role="search" aria-label={t('filters')} onSubmit={(e) => e.preventDefault()}>
      <InputGroup type="search" className="lb-invoice-search" leftElement={<span className="lb-invoice-search-icon"><Search /></span>} value={typed} onChange={(e) => setTyped(e.target.value)} placeholder={t('search')} aria-label={t('search')} />
      <HTMLSelect aria-label={t('state')} value={filter.state ?? 'all'} onChange={(e) => set({ state: e.target.value === 'all' ? null : e.target.value })}>
        {STATE_FILTERS.map((state) => (
          <option key={state} value={state}>
            {t(state)}
          </option>
        ))}
      </HTMLSelect>
      {isFiltered(filter) && <Button variant="minimal" text={t('clear')} onClick={() => set({ state: null, q: null })} />}
    </form>
  );
}
