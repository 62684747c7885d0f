import { Button } from '@blueprintjs/core';
import { Notice } from '../../../components/notice.js';
import type { ApiError } from '../../../lib/http.js';
import { t } from '../text.js';

interface RefusedFileProps {
  readonly name: string;
  readonly error: ApiError;
  readonly onAgain: (hints: Readonly<Record<string, string>>) => void;
}

/** Why a file could not be read, and the answers to what it leaves open. */
export function RefusedFile({ name, error, onAgain }: RefusedFileProps) {
  const asks = (path: string) => error.fields.some((f) => f.path === path);
  const lines = error.fields.filter((f) => f.path === 'file' && f.message !== error.message);
  return (
    <Notice intent="danger" role="alert" title={t('refusedTitle', { name })}>
      <div className="stack">
        <p>{error.message}</p>
        {lines.length > 0 && (
          <ul>
            {lines.map((f) => (
              <li key={f.message}>{f.message}</li>
            ))}
          </ul>
        )}
        {asks('elapsedUnit') && <Hint label={t('hintUnit')} options={[['s', t('hint_s')], ['min', t('hint_min')], ['h', t('hint_h')]]} onChoose={(elapsedUnit) => onAgain({ elapsedUnit })} />}
        {asks('dateOrder') && <Hint label={t('hintOrder')} options={[['dmy', t('hint_dmy')], ['mdy', t('hint_mdy')]]} onChoose={(dateOrder) => onAgain({ dateOrder })} />}
        <p className="muted">{t('refusedKept')}</p>
      </div>
    </Notice>
  );
}

function Hint({ label, options, onChoose }: { readonly label: string; readonly options: readonly (readonly [value: string, words: string])[]; readonly onChoose: (value: string) => void }) {
  return (
    <div className="row" role="group" aria-label={label}>
      <span>{label}</span>
      {options.map(([value, words]) => (
        <Button key={value} text={words} onClick={() => onChoose(value)} />
      ))}
    </div>
  );
}
