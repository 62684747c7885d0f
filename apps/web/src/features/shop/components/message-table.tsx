import type { outboxRowSchema } from '@shared/messages';
import type { z } from 'zod';
import { DataTable, type Column } from '../../../components/data-table.js';
import { StateMark } from '../../../components/state-mark.js';
import { momentOf } from '../../../lib/format.js';
import { messageKind } from '../message-kinds.js';
import { t } from '../text.js';
import './shop.css';

type Message = z.infer<typeof outboxRowSchema>;

function State({ message: { state, attempts, lastError } }: { readonly message: Message }) {
  const mark =
    state === 'sent' ? <StateMark tone="good" words={t('sent')} /> : state === 'given-up' ? <StateMark tone="bad" words={t('given-up')} /> : <StateMark tone="waiting" words={attempts > 0 ? t('waitingTried', { n: attempts }) : t('waiting')} />;
  return (
    <span>
      {mark}
      {lastError !== null && state !== 'sent' && <span className="lb-message-error">{t('lastError', { words: lastError })}</span>}
    </span>
  );
}

const COLUMNS: readonly Column<Message>[] = [
  { key: 'when', title: t('when'), cell: (m) => momentOf(m.sentAt ?? m.createdAt) },
  { key: 'kind', title: t('kind'), cell: (m) => messageKind(m.kind) },
  { key: 'to', title: t('to'), cell: (m) => m.to },
  { key: 'subject', title: t('subject'), cell: (m) => m.subject },
  { key: 'state', title: t('state'), cell: (m) => <State message={m} /> },
];

export function MessageTable({ messages }: { readonly messages: readonly Message[] }) {
  return <DataTable caption={t('messages')} columns={COLUMNS} rows={messages} rowKey={(m) => m.id} />;
}
