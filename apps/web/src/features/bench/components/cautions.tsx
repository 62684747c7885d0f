import { Button } from '@blueprintjs/core';
import { useState, type ReactNode } from 'react';
import { Mark } from '../../../components/mark.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { shopToday } from '../../../lib/format.js';
import { useMe } from '../../../lib/me.js';
import { t } from '../text.js';

const LINES = ['cautionShock', 'cautionTurn', 'cautionHeart', 'cautionHot', 'cautionSupply', 'cautionLift'] as const;

/** The usual cautions stand before the bench until this person has read them this shift. */
export function Cautions({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  const me = useMe();
  const key = `loopbay.cautions.core.${me.id}.${shopToday(new Date())}`;
  const [read, setRead] = useState(() => localStorage.getItem(key) === 'read');
  if (read) return children;
  return (
    <div className="stack">
      <PageHeader title={title} />
      <Panel>
        <div className="lb-cautions">
          <Mark size={120} />
          <div className="stack">
            <h2>{t('cautionTitle')}</h2>
            <ul>
              {LINES.map((line) => (
                <li key={line}>{t(line)}</li>
              ))}
            </ul>
            <p>
              <b>{t('cautionLaw')}</b>
            </p>
            <div className="row">
              <Button
                className="lb-bench-big"
                intent="primary"
                text={t('cautionOk')}
                onClick={() => {
                  localStorage.setItem(key, 'read');
                  setRead(true);
                }}
              />
              <span className="muted">{t('cautionFor', { name: me.name })}</span>
            </div>
          </div>
        </div>
      </Panel>
    </div>
  );
}
