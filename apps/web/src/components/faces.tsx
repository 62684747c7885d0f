import { Button, Spinner } from '@blueprintjs/core';
import type { UseQueryResult } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { ApiError } from '../lib/http.js';
import { defineText } from '../lib/text.js';
import { Notice } from './notice.js';
import { PageHeader } from './panel.js';
import './faces.css';

const t = defineText({
  waiting: 'Loading…',
  failed: 'This could not be loaded',
  again: 'Try again',
  number: 'Request number {id}',
  notFound: 'There is nothing at this address',
  notFoundWords: 'The link may be old, or belong to somebody else. Go back to the start and look from there.',
  home: 'To the start',
});

export function Waiting({ words = t('waiting') }: { readonly words?: string }) {
  return (
    <div className="lb-face" role="status">
      <Spinner size={28} aria-label={words} />
    </div>
  );
}

export function Failed({ error, onAgain }: { readonly error: unknown; readonly onAgain?: () => void }) {
  const api = error instanceof ApiError ? error : null;
  return (
    <Notice className="lb-face-failed" intent="danger" title={t('failed')} role="alert">
      <p>{error instanceof Error ? error.message : String(error)}</p>
      {api?.requestId && <p className="muted">{t('number', { id: api.requestId })}</p>}
      {onAgain && <Button text={t('again')} onClick={onAgain} />}
    </Notice>
  );
}

/** Nothing there yet, and what to do about it. */
export function Empty({ title, children }: { readonly title: string; readonly children?: ReactNode }) {
  return (
    <div className="lb-face lb-face-empty">
      <p className="lb-face-title">{title}</p>
      {children && <div className="muted">{children}</div>}
    </div>
  );
}

/** An address behind which there is nothing for this person; trying again would not help. */
export function NothingHere() {
  return (
    <>
      <PageHeader title={t('notFound')} />
      <Empty title={t('notFoundWords')}>
        <Link to="/">{t('home')}</Link>
      </Empty>
    </>
  );
}

interface AnswerProps<T> {
  readonly query: UseQueryResult<T>;
  readonly children: (data: T) => ReactNode;
  readonly isEmpty?: (data: T) => boolean;
  readonly empty?: ReactNode;
}

/** The four faces of a question to the server: waiting, failed, empty, filled. */
export function Answer<T>({ query, children, isEmpty, empty }: AnswerProps<T>) {
  if (query.data === undefined && query.error instanceof ApiError && query.error.status === 404) return <NothingHere />;
  if (query.data === undefined && query.error) return <Failed error={query.error} onAgain={() => void query.refetch()} />;
  if (query.data === undefined) return <Waiting />;
  if (isEmpty?.(query.data) && empty !== undefined) return empty;
  return children(query.data);
}
