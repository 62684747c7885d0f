import { attachmentViewSchema } from '@shared/jobs';
import { useQueryClient } from '@tanstack/react-query';
import { useCallback, useRef, useState } from 'react';
import { ApiError, http, newKey } from '../../../lib/http.js';
import { jobKeys } from '../../../lib/job-queries.js';
import { refusalBeforeSending } from '../upload-rules.js';

export interface Upload {
  readonly key: string;
  readonly file: File;
  readonly state: 'waiting' | 'sending' | 'failed' | 'refused' | 'sent';
  readonly words: string;
}

/** Sends files one after the other; each keeps its own words, and one that failed can be sent again. */
export function useUploads(jobId: string) {
  const client = useQueryClient();
  const [uploads, setUploads] = useState<readonly Upload[]>([]);
  const chain = useRef<Promise<void>>(Promise.resolve());
  const set = useCallback((key: string, change: Partial<Upload>) => setUploads((old) => old.map((u) => (u.key === key ? { ...u, ...change } : u))), []);

  const send = useCallback(
    (upload: Upload) => {
      chain.current = chain.current.then(async () => {
        set(upload.key, { state: 'sending', words: '' });
        try {
          await http.upload(`/jobs/${jobId}/attachments`, upload.file, attachmentViewSchema, { idempotencyKey: upload.key });
          set(upload.key, { state: 'sent' });
          await client.invalidateQueries({ queryKey: jobKeys.sheet(jobId) });
        } catch (error) {
          set(upload.key, { state: willNeverDo(error) ? 'refused' : 'failed', words: error instanceof Error ? error.message : String(error) });
        }
      });
    },
    [client, jobId, set],
  );

  const add = useCallback(
    (files: Iterable<File>) => {
      const fresh = [...files].map((file): Upload => {
        const words = refusalBeforeSending(file);
        return { key: newKey(), file, state: words === null ? 'waiting' : 'refused', words: words ?? '' };
      });
      setUploads((old) => [...old.filter((u) => u.state !== 'sent'), ...fresh]);
      for (const upload of fresh) if (upload.state === 'waiting') send(upload);
    },
    [send],
  );

  const dismiss = useCallback((key: string) => setUploads((old) => old.filter((u) => u.key !== key)), []);
  return { uploads, add, retry: send, dismiss };
}

/** The same file will be refused again; only a connection or a moment can be tried again. */
const willNeverDo = (error: unknown): boolean => error instanceof ApiError && (error.code === 'FILE_NOT_ACCEPTED' || error.code === 'FILE_TOO_LARGE' || error.code === 'FORBIDDEN');
