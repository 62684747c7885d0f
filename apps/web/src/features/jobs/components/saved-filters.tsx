import { Button, InputGroup } from '@blueprintjs/core';
import { Cross } from '@blueprintjs/icons';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { t } from '../floor-text.js';

interface Saved {
  readonly name: string;
  readonly params: string;
}
const KEY = 'loopbay.floor-filters';

function read(): Saved[] {
  try {
    const kept = JSON.parse(localStorage.getItem(KEY) ?? '[]') as unknown;
    return Array.isArray(kept) ? kept.filter((s): s is Saved => typeof s === 'object' && s !== null && typeof (s as Saved).name === 'string' && typeof (s as Saved).params === 'string') : [];
  } catch {
    return [];
  }
}

/** Filters kept by name on this device. */
export function SavedFilters({ params, filtered }: { readonly params: string; readonly filtered: boolean }) {
  const [saved, setSaved] = useState(read);
  const [naming, setNaming] = useState<string | null>(null);
  const keep = (next: Saved[]) => {
    setSaved(next);
    try {
      localStorage.setItem(KEY, JSON.stringify(next));
    } catch {
      // a full or forbidden storage only costs the name
    }
  };
  const isSaved = saved.some((s) => s.params === params);
  if (saved.length === 0 && !filtered) return null;
  return (
    <div className="lb-saved">
      {saved.length > 0 && (
        <ul aria-label={t('saved')}>
          {saved.map((s) => (
            <li key={s.name}>
              <Link to={`?${s.params}`} aria-current={s.params === params ? 'true' : undefined}>
                {s.name}
              </Link>
              <Button variant="minimal" size="small" icon={<Cross />} aria-label={t('savedRemove', { name: s.name })} onClick={() => keep(saved.filter((o) => o.name !== s.name))} />
            </li>
          ))}
        </ul>
      )}
      {filtered && !isSaved && naming === null && <Button variant="minimal" text={t('save')} onClick={() => setNaming('')} />}
      {naming !== null && (
        <form
          className="row"
          onSubmit={(e) => {
            e.preventDefault();
            const name = naming.trim();
            if (name === '') return;
            keep([...saved.filter((s) => s.name !== name), { name, params }]);
            setNaming(null);
          }}
        >
          <InputGroup autoFocus aria-label={t('saveName')} placeholder={t('saveName')} value={naming} maxLength={40} onChange={(e) => setNaming(e.target.value)} onKeyDown={(e) => e.key === 'Escape' && setNaming(null)} />
          <Button type="submit" text={t('saveIt')} />
        </form>
      )}
    </div>
  );
}
