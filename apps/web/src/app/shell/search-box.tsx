import { Button, InputGroup, Overlay2 } from '@blueprintjs/core';
import { Search } from '@blueprintjs/icons';
import { searchResultSchema, type SearchHit } from '@shared/jobs';
import { useQuery } from '@tanstack/react-query';
import { useEffect, useId, useState, type KeyboardEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { http } from '../../lib/http.js';
import { useMay } from '../../lib/me.js';
import { isTyping, useScanner } from './scanner.js';
import { useSingleKeys } from './single-keys.js';
import { t } from './text.js';

interface Choice extends Omit<SearchHit, 'kind'> {
  readonly kind: SearchHit['kind'] | 'action';
}

/** Jumps to a job, customer, machine or invoice, or starts an action. A scanner that types lands here too. */
export function SearchBox() {
  const [open, setOpen] = useState(false);
  const [q, setQ] = useState('');
  const [at, setAt] = useState(0);
  // Enter came before the answer, as it does from a scanner: the first hit is opened when it is there
  const [opensFirst, setOpensFirst] = useState(false);
  const listId = useId();
  const navigate = useNavigate();
  const mayBook = useMay('jobs.book');
  const singleKeys = useSingleKeys();
  const asked = q.trim();
  const { data, isFetching, isPlaceholderData, error } = useQuery({
    queryKey: ['search', asked],
    queryFn: ({ signal }) => http.get(`/search?q=${encodeURIComponent(asked)}`, searchResultSchema, { signal }),
    enabled: open && asked.length > 0,
    placeholderData: (old) => old,
  });
  const settled = asked === '' || (data !== undefined && !isPlaceholderData);
  const bookIn: Choice = { kind: 'action', id: 'book-in', title: t('bookIn'), detail: t('counter'), path: '/counter/book-in' };
  const actions = mayBook && bookIn.title.toLowerCase().includes(asked.toLowerCase()) ? [bookIn] : [];
  const choices: readonly Choice[] = [...(asked === '' ? [] : (data?.hits ?? [])), ...actions];

  const show = (text = '') => {
    setQ(text);
    setAt(0);
    setOpensFirst(text !== '');
    setOpen(true);
  };
  const close = () => {
    setOpen(false);
    setOpensFirst(false);
  };
  const go = (choice: Choice | undefined) => {
    if (!choice) return;
    close();
    void navigate(choice.path);
  };

  const scan = useScanner(show);
  useEffect(() => {
    const onKey = (event: globalThis.KeyboardEvent) => {
      const slash = event.key === '/' && singleKeys && !isTyping(event.target) && !event.ctrlKey && !event.metaKey && !event.altKey && !scan.isRunning(event.timeStamp);
      if (!slash && !(event.key.toLowerCase() === 'k' && (event.ctrlKey || event.metaKey))) return;
      event.preventDefault();
      show();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [singleKeys, scan]);

  const waitsForFirst = open && opensFirst && settled && asked !== '';
  const firstPath = waitsForFirst ? choices[0]?.path : undefined;
  useEffect(() => {
    if (firstPath === undefined) return;
    void Promise.resolve(navigate(firstPath)).then(close);
  }, [firstPath, navigate]);

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key === 'ArrowDown') setAt((i) => Math.min(i + 1, choices.length - 1));
    else if (event.key === 'ArrowUp') setAt((i) => Math.max(i - 1, 0));
    else if (event.key === 'Enter' && settled) go(choices[at]);
    else if (event.key === 'Enter') setOpensFirst(true);
    else return;
    event.preventDefault();
  };
  const words = error
    ? t('searchFailed', { why: error.message })
    : asked === ''
      ? t('searchHint')
      : !settled || isFetching
        ? t('searching')
        : choices.length === 0
          ? t('nothing', { q: asked })
          : t('found', { count: choices.length });
  return (
    <>
      <Button className="lb-search-button" icon={<Search />} text={t('search')} onClick={() => show()} aria-keyshortcuts={singleKeys ? '/ Control+K' : 'Control+K'} />
      <Overlay2 isOpen={open} onClose={close} className="lb-search-overlay" hasBackdrop>
        <div className="lb-search" role="dialog" aria-modal="true" aria-label={t('searchLabel')}>
          <InputGroup
            autoFocus
            leftIcon={<Search />}
            value={q}
            onChange={(e) => {
              setQ(e.target.value);
              setAt(0);
              setOpensFirst(false);
            }}
            onKeyDown={onKeyDown}
            placeholder={t('searchLabel')}
            aria-label={t('searchLabel')}
            role="combobox"
            aria-expanded={choices.length > 0}
            aria-controls={listId}
            aria-activedescendant={choices[at] ? `${listId}-${at}` : undefined}
            autoComplete="off"
            spellCheck={false}
          />
          <ul id={listId} role="listbox" aria-label={t('searchLabel')}>
            {choices.map((choice, i) => (
              <li key={`${choice.kind}${choice.id}`} id={`${listId}-${i}`} role="option" aria-selected={i === at} className={i === at ? 'active' : ''} onMouseEnter={() => setAt(i)} onClick={() => go(choice)}>
                <span>
                  <b>{choice.title}</b> <span className="muted">{choice.detail}</span>
                </span>
                <span className="lb-search-kind">{t(choice.kind)}</span>
              </li>
            ))}
          </ul>
          <p className="muted" role="status">
            {words}
          </p>
        </div>
      </Overlay2>
    </>
  );
}
