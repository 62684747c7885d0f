import { outboxListSchema, outboxRowSchema } from '@shared/messages';
import { useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { DataTable, type Column } from '../../../components/data-table.js';
import { Answer, Empty } from '../../../components/faces.js';
import { Panel } from '../../../components/panel.js';
import { momentOf } from '../../../lib/format.js';
import { http } from '../../../lib/http.js';
import { messageState, t } from '../work-text.js';

type Message = z.infer<typeof outboxRowSchema>;

const COLUMNS: Column<Message>[] = [
  { key: 'subject', title: t('subject'), cell: (m) => m.subject },
  { key: 'to', title: t('to'), cell: (m) => m.to },
  {
    key: 'state',
    title: t('state'),
    cell: (m) => (
      <span>
        {messageState(m.state)}
        {m.state !== 'sent' && m.lastError && <small className="muted"> {m.lastError}</small>}
      </span>
    ),
  },
  { key: 'at', title: t('when'), cell: (m) => <span className="num">{momentOf(m.sentAt ?? m.createdAt)}</span> },
];

/** What was sent to the customer about this job, and whether it left the house. */
export function MessagesPanel({ jobId }: { readonly jobId: string }) {
  const messages = useQuery({ queryKey: ['jobs', jobId, 'messages'], queryFn: ({ signal }) => http.get(`/messages?jobId=${jobId}`, outboxListSchema, { signal }) });
  return (
    <Panel title={t('messages')}>
      <Answer query={messages} isEmpty={(rows) => rows.length === 0} empty={<Empty title={t('noMessages')} />}>
        {(rows) => <DataTable caption={t('messages')} columns={COLUMNS} rows={rows} rowKey={(m) => m.id} />}
      </Answer>
    </Panel>
  );
}
