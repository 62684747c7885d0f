import { AnchorButton } from '@blueprintjs/core';
import { useQuery } from '@tanstack/react-query';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { messagesQuery } from '../../../features/shop/api/shop-queries.js';
import { MessageTable } from '../../../features/shop/components/message-table.js';
import { ShopTabs } from '../../../features/shop/components/shop-tabs.js';
import { t } from '../../../features/shop/text.js';
import { useMe } from '../../../lib/me.js';

/** What left the shop by e-mail, and what still waits to leave. */
export function MessagesPage() {
  const messages = useQuery(messagesQuery);
  const { shop } = useMe();
  return (
    <div>
      <PageHeader title={t('messages')} below={t('messagesHelp')} actions={shop.mailboxUrl && <AnchorButton text={t('mailbox')} href={shop.mailboxUrl} target="_blank" rel="noreferrer" />} />
      <ShopTabs />
      <Answer query={messages} isEmpty={(all) => all.length === 0} empty={<Empty title={t('noMessages')}>{t('noMessagesWords')}</Empty>}>
        {(all) => (
          <div className="stack">
            {all.some((m) => m.state === 'given-up') && <p>{t('givenUpHelp')}</p>}
            <Panel tight>
              <MessageTable messages={all} />
            </Panel>
          </div>
        )}
      </Answer>
    </div>
  );
}
