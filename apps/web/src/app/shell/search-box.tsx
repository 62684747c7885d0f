import { Button, InputGroup, Overlay2 } from '@blueprintjs/core';
import { Search } from '@blueprintjs/icons';
import { searchResultSchema, type SearchHit } from '@shared/jobs';
import { useQuery } from '@tanstack/react-query';
import { useEffect, useId, useState, type KeyboardEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { http } from '../../lib/http.js';
import { useMay } from '../../lib/me.js';
import { t } from './text.js';

const TYPING = new Set(['INPUT', 'TEXTAREA', 'SELECT']);

/** Jumps to a job, customer, machine or invoice, or starts an action. A scanner that types lands here too. */
export function SearchBox() {
  const [open, setOpen] = useState(false);
  const [q, setQ] = useState('');
  const [at, setAt] = useState(0);
  const listId = useId();
  const navigate = useNavigate();
  const mayBook = useMay('jobs.book');
  const asked = q.trim();
  const { data, isFetching } = useQuery({
    queryKey: ['search', asked],
    queryFn: ({ signal }) => http.get(`/search?q=${encodeURIComponent(asked)}`, searchResultSchema, { signal }),
    enabled: open && asked.length > 0,
    placeholderData: (old) => old,
  });
  const actions: SearchHit[] = mayBook && (asked === '' || t('bookIn').toLowerCase().includes(asked.toLowerCase())) ? [{ kind: 'job', id: 'book-in', title: t('bookIn'), detail: t('counter'), path: '/counter/book-in' }] : [];
  const hits = [...(asked === '' ? [] : (data?.hits ?? [])), ...actions];

  useEffect(() => {
    const onKey = (event: globalThis.KeyboardEvent) => {
      const typing = event.target instanceof HTMLElement && (TYPING.has(event.target.tagName) || event.target.isContentEditable);
      if ((event.key === '/' && !typing) || (event.key.toLowerCase() === 'k' && (event.ctrlKey || event.metaKey))) {
        event.preventDefault();
        setOpen(true);
      }
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, []);

  const close = () => {
    setOpen(false);
    setQ('');
    setAt(0);
  };
  const go = (hit: SearchHit | undefined) => {
    if (!hit) return;
    close();
    void navigate(hit.path);
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'ArrowDown') setAt((i) => Math.min(i + 1, hits.length - 1));
    else if (event.key === 'ArrowUp') setAt((i) => Math.max(i - 1, 0));
    else if (event.key === 'Enter') go(hits[at]);
    else return;
    event.preventDefault();
  };
  return (
    <>
      <Button className="lb-search-button" icon={<Search />} text={t('search')} onClick={() => setOpen(true)} aria-keyshortcuts="/ Control+K" />
      <Overlay2 isOpen={open} onClose={close} className="lb-search-overlay" hasBackdrop>
        <div className="lb-search" role="dialog" aria-label={t('searchLabel')}>
          <InputGroup
            autoFocus
            leftElement={<Search className="lb-search-icon" />}
            value={q}
            onChange={(e) => {
              setQ(e.target.value);
              setAt(0);
            }}
            onKeyDown={onKeyDown}
            placeholder={t('searchLabel')}
            aria-label={t('searchLabel')}
            role="combobox"
            aria-expanded={hits.length > 0}
            aria-controls={listId}
            aria-activedescendant={hits[at] ? `${listId}-${at}` : undefined}
          />
          <ul id={listId} role="listbox" aria-label={t('searchLabel')}>
            {hits.map((hit, i) => (
              <li key={`${hit.kind}${hit.id}`} id={`${listId}-${i}`} role="option" aria-selected={i === at} className={i === at ? 'active' : ''} onMouseEnter={() => setAt(i)} onClick={() => go(hit)}>
                <b>{hit.title}</b> <span className="muted">{hit.detail}</span>
              </li>
            ))}
          </ul>
          <p className="muted" role="status">
            {asked !== '' && hits.length === 0 && !isFetching ? t('nothing', { q: asked }) : t('searchHint')}
          </p>
        </div>
      </Overlay2>
    </>
  );
}
