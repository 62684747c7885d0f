import { Button, Callout } from '@blueprintjs/core';
import type { GateCondition } from '@shared/errors';
import type { ReactNode } from 'react';
import { ApiError } from '../lib/http.js';
import { defineText } from '../lib/text.js';
import { Notice } from './notice.js';
import './notices.css';

const t = defineText({
  kept: 'What you typed is still here.',
  number: 'Request number {id}',
  conflict: 'Somebody else changed this meanwhile',
  conflictHelp: 'Compare, then take theirs or keep yours and save again.',
  field: 'Field',
  theirs: 'As it stands now',
  yours: 'As you have it',
  takeTheirs: 'Take theirs',
  keepMine: 'Keep mine and save',
  met: 'met',
  missing: 'missing',
});

/** What happened, what is kept, what to do: shown once, where it can be acted on. */
export function ErrorNotice({ error }: { readonly error: unknown }) {
  if (!error) return null;
  const api = error instanceof ApiError ? error : null;
  if (api?.code === 'NOT_SIGNED_IN') return null;
  const fields = api?.fields.filter((f, i, all) => f.message !== api.message && all.findIndex((g) => g.message === f.message) === i) ?? [];
  return (
    <Callout intent="danger" role="alert" className="lb-error">
      <p>{error instanceof Error ? error.message : String(error)}</p>
      {api && api.conditions.length > 0 && <Conditions conditions={api.conditions} />}
      {fields.length > 0 && (
        <ul>
          {fields.map((f) => (
            <li key={`${f.path}${f.code}`}>{f.message}</li>
          ))}
        </ul>
      )}
      {api && (
        <p className="muted">
          {t('kept')} {api.requestId && t('number', { id: api.requestId })}
        </p>
      )}
    </Callout>
  );
}

/** The conditions of a gate, each met or not, in words; what is missing leads to its place. */
export function Conditions({ conditions, linkOf }: { readonly conditions: readonly GateCondition[]; readonly linkOf?: (place: string, words: string) => ReactNode }) {
  return (
    <ul className="lb-conditions">
      {conditions.map((c) => (
        <li key={c.code + c.words} className={c.met ? 'met' : 'missing'}>
          <svg viewBox="0 0 16 16" width="15" height="15" role="img" aria-label={c.met ? t('met') : t('missing')}>
            {c.met ? <path d="M2 8.5 6.5 13 14 4" fill="none" stroke="currentColor" strokeWidth="2.4" /> : <path d="M2 8H14M8 2V14" stroke="currentColor" strokeWidth="2.4" />}
          </svg>
          <span>{!c.met && c.place && linkOf ? linkOf(c.place, c.words) : c.words}</span>
        </li>
      ))}
    </ul>
  );
}

export interface Difference {
  readonly label: string;
  readonly theirs: string;
  readonly yours: string;
}

/** Two people changed one thing: both values side by side, and the person decides. */
export function ConflictNotice({ differences, onTakeTheirs, onKeepMine }: { readonly differences: readonly Difference[]; readonly onTakeTheirs: () => void; readonly onKeepMine: () => void }) {
  return (
    <Notice intent="warning" role="alert" title={t('conflict')}>
      <p>{t('conflictHelp')}</p>
      <table className="lb-conflict">
        <thead>
          <tr>
            <th scope="col">{t('field')}</th>
            <th scope="col">{t('theirs')}</th>
            <th scope="col">{t('yours')}</th>
          </tr>
        </thead>
        <tbody>
          {differences.map((d) => (
            <tr key={d.label}>
              <th scope="row">{d.label}</th>
              <td>{d.theirs}</td>
              <td>{d.yours}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <div className="row">
        <Button text={t('takeTheirs')} onClick={onTakeTheirs} />
        <Button intent="primary" text={t('keepMine')} onClick={onKeepMine} />
      </div>
    </Notice>
  );
}
