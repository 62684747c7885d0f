import { Button, ProgressBar } from '@blueprintjs/core';
import { Upload } from '@blueprintjs/icons';
import { LOGGER_FILE_LIMIT_BYTES, type LoadView } from '@shared/burnouts';
import { useRef, useState, type ChangeEvent, type DragEvent } from 'react';
import { ErrorNotice } from '../../../components/notices.js';
import { Notice } from '../../../components/notice.js';
import { useTell } from '../../../components/toaster.js';
import { sizeOf } from '../../../lib/format.js';
import { ApiError, newKey } from '../../../lib/http.js';
import { useSendFile } from '../api/load-queries.js';
import { t } from '../text.js';
import { RefusedFile } from './refused-file.js';
import '../burnouts.css';

interface FileDropProps {
  readonly load: Pick<LoadView, 'id' | 'version'>;
  /** why another file takes the place of the one that is there */
  readonly reason?: string;
  readonly onTaken?: () => void;
}

/** The logger's file by button or dropped; one that cannot be read says why, and what may be said with it. */
export function FileDrop({ load, reason = '', onTaken }: FileDropProps) {
  const sending = useSendFile(load.id);
  const tell = useTell();
  const [over, setOver] = useState(false);
  const [words, setWords] = useState<string | null>(null);
  const [file, setFile] = useState<File | null>(null);
  const input = useRef<HTMLInputElement>(null);

  const send = (chosen: File, hints: Readonly<Record<string, string>> = {}) => {
    setFile(chosen);
    sending.mutate(
      { file: chosen, version: load.version, hints: { ...hints, ...(reason === '' ? {} : { reason }) }, idempotencyKey: newKey() },
      {
        onSuccess: () => {
          tell(t('read', { name: chosen.name }));
          onTaken?.();
        },
      },
    );
  };
  const take = (files: Iterable<File>) => {
    const [first, ...more] = files;
    sending.reset();
    if (!first) return;
    if (more.length > 0) return setWords(t('oneFile'));
    if (first.size > LOGGER_FILE_LIMIT_BYTES) return setWords(t('tooLarge', { size: sizeOf(first.size) }));
    setWords(null);
    send(first);
  };
  const onPick = (event: ChangeEvent<HTMLInputElement>) => {
    take([...(event.target.files ?? [])]);
    // the same file may be chosen again after it was put right
    event.target.value = '';
  };
  const onDrop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    if (!sending.isPending) take(event.dataTransfer.files);
  };
  const refused = sending.error instanceof ApiError && sending.error.code === 'FILE_NOT_ACCEPTED' ? sending.error : null;
  return (
    <div className="stack">
      <div
        className={`lb-load-drop${over ? ' over' : ''}`}
        onDragOver={(event) => {
          event.preventDefault();
          setOver(true);
        }}
        onDragLeave={() => setOver(false)}
        onDrop={onDrop}
      >
        <span className="lb-load-drop-words">{t('drop')}</span>
        <Button icon={<Upload />} text={t('choose')} disabled={sending.isPending} onClick={() => input.current?.click()} className="lb-load-big" />
        <small className="muted">{t('accepts')}</small>
        <input ref={input} type="file" accept=".csv,.txt,.tsv,.log,text/csv,text/plain" hidden aria-label={t('choose')} onChange={onPick} />
      </div>
      <div role="status">
        {sending.isPending && file && (
          <>
            {t('sending', { name: file.name })}
            <ProgressBar />
          </>
        )}
      </div>
      {words && (
        <Notice intent="warning" role="alert">
          {words}
        </Notice>
      )}
      {refused && file ? <RefusedFile key={sending.submittedAt} name={file.name} error={refused} onAgain={(hints) => send(file, hints)} /> : <ErrorNotice error={sending.error} />}
    </div>
  );
}
