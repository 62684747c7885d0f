import { Button, Checkbox, HTMLSelect, InputGroup } from '@blueprintjs/core';
import { Search } from '@blueprintjs/icons';
import { JOB_STATES, STEPS } from '@shared/route';
import { useEffect, useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { stateName, stepName } from '../../../lib/step-names.js';
import { isFiltered, type FloorFilter } from '../floor-filter.js';
import { t } from '../floor-text.js';

const SORTS = [
  ['promisedOn', t('sortPromised')],
  ['number', t('sortNumber')],
  ['step', t('sortStep')],
  ['customer', t('sortCustomer')],
  ['receivedAt', t('sortReceived')],
] as const;

/** Step, state, late, text and order of the list; all of it stands in the address. */
export function FloorFilters({ filter }: { readonly filter: FloorFilter }) {
  const [, setParams] = useSearchParams();
  const [typed, setTyped] = useState(filter.q ?? '');
  const asked = filter.q ?? '';
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
    <form className="lb-filters" role="search" aria-label={t('filters')} onSubmit={(e) => e.preventDefault()}>
      <InputGroup className="lb-filter-text" type="search" leftElement={<span className="lb-filter-icon"><Search /></span>} value={typed} onChange={(e) => setTyped(e.target.value)} placeholder={t('search')} aria-label={t('searchLabel')} />
      <HTMLSelect aria-label={t('step')} value={filter.step ?? ''} onChange={(e) => set({ step: e.target.value })}>
        <option value="">{t('anyStep')}</option>
        {STEPS.map((step) => (
          <option key={step} value={step}>
            {stepName(step)}
          </option>
        ))}
      </HTMLSelect>
      <HTMLSelect aria-label={t('state')} value={filter.state ?? 'not-ended'} onChange={(e) => set({ state: e.target.value === 'not-ended' ? null : e.target.value })}>
        <option value="not-ended">{t('notEnded')}</option>
        {JOB_STATES.map((state) => (
          <option key={state} value={state}>
            {stateName(state)}
          </option>
        ))}
        <option value="all">{t('all')}</option>
      </HTMLSelect>
      <Checkbox className="lb-filter-late" checked={filter.late === 'yes'} onChange={(e) => set({ late: e.currentTarget.checked ? 'yes' : null })} label={t('late')} />
      <HTMLSelect aria-label={t('sort')} value={filter.sort ?? 'promisedOn'} onChange={(e) => set({ sort: e.target.value })}>
        {SORTS.map(([value, label]) => (
          <option key={value} value={value}>
            {`${t('sort')}: ${label}`}
          </option>
        ))}
      </HTMLSelect>
      {isFiltered(filter) && <Button variant="minimal" text={t('clear')} onClick={() => set({ step: null, state: null, late: null, q: null })} />}
    </form>
  );
}
