import { Button, ProgressBar } from '@blueprintjs/core';
import { Camera, Upload as UploadIcon } from '@blueprintjs/icons';
import { useRef, useState, type ChangeEvent, type DragEvent } from 'react';
import { useUploads, type Upload } from '../api/use-uploads.js';
import { t } from '../text.js';
import { ACCEPT } from '../upload-rules.js';
import './attachments.css';

/** Files by button, by camera, or dropped; every file says for itself how it went. */
export function UploadBox({ jobId }: { readonly jobId: string }) {
  const { uploads, add, retry, dismiss } = useUploads(jobId);
  const [over, setOver] = useState(false);
  const files = useRef<HTMLInputElement>(null);
  const camera = useRef<HTMLInputElement>(null);
  const onPick = (event: ChangeEvent<HTMLInputElement>) => {
    add(event.target.files ?? []);
    // the same file may be chosen again after it failed
    event.target.value = '';
  };
  const onDrop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    add(event.dataTransfer.files);
  };
  return (
    <div className="stack">
      <div
        className={`lb-drop${over ? ' over' : ''}`}
        onDragOver={(event) => {
          event.preventDefault();
          setOver(true);
        }}
        onDragLeave={() => setOver(false)}
        onDrop={onDrop}
      >
        <span className="lb-drop-words">{t('drop')}</span>
        <Button icon={<UploadIcon />} text={t('choose')} onClick={() => files.current?.click()} />
        <Button icon={<Camera />} text={t('camera')} onClick={() => camera.current?.click()} />
        <small className="muted">{t('accepts')}</small>
        <input ref={files} type="file" multiple accept={ACCEPT} hidden aria-label={t('choose')} onChange={onPick} />
        <input ref={camera} type="file" accept="image/*" capture="environment" hidden aria-label={t('camera')} onChange={onPick} />
      </div>
      <div role="status">
        {uploads.length > 0 && (
          <ul className="lb-uploads">
            {uploads.map((upload) => (
              <UploadLine key={upload.key} upload={upload} onRetry={() => retry(upload)} onDismiss={() => dismiss(upload.key)} />
            ))}
          </ul>
        )}
      </div>
    </div>
  );
}

function UploadLine({ upload, onRetry, onDismiss }: { readonly upload: Upload; readonly onRetry: () => void; readonly onDismiss: () => void }) {
  const { name } = upload.file;
  switch (upload.state) {
    case 'waiting':
      return <li className="muted">{t('waiting', { name })}</li>;
    case 'sending':
      return (
        <li>
          {t('sending', { name })}
          <ProgressBar />
        </li>
      );
    case 'sent':
      return <li>{t('sent', { name })}</li>;
    default:
      return (
        <li className="failed">
          <span>{t('failed', { name, words: upload.words })}</span>
          <span className="row">
            {upload.state === 'failed' && <Button text={t('retry')} onClick={onRetry} />}
            <Button variant="minimal" text={t('dismiss')} onClick={onDismiss} />
          </span>
        </li>
      );
  }
}
