import { Button } from '@blueprintjs/core';
import { useState, type ReactNode } from 'react';
import { shopToday } from '../lib/format.js';
import { useMe } from '../lib/me.js';
import { defineText } from '../lib/text.js';
import { Mark } from './mark.js';
import { PageHeader, Panel } from './panel.js';
import './cautions.css';

const t = defineText({
  law: 'Local codes and a licensed or qualified person decide how this is done and who may do it. What is computed here is an aid.',
  read: 'Read. I begin the shift with this.',
  once: 'Shown once a shift, for {name}.',
});

interface CautionsProps {
  /** what the cautions are about: each topic is read once a shift */
  readonly topic: 'core' | 'electrical' | 'oven';
  /** of the page behind them */
  readonly title: string;
  readonly heading: string;
  readonly lines: readonly string[];
  readonly children: ReactNode;
}

const keyOf = (topic: string, personId: string) => `loopbay.cautions.${topic}.${personId}.${shopToday(new Date())}`;

function wasRead(key: string): boolean {
  try {
    return localStorage.getItem(key) === 'read';
  } catch {
    return false;
  }
}

/** The usual cautions stand before the work until this person has read them today. */
export function Cautions({ topic, title, heading, lines, children }: CautionsProps) {
  const me = useMe();
  const key = keyOf(topic, me.id);
  const [read, setRead] = useState(() => wasRead(key));
  if (read) return children;
  const onRead = () => {
    try {
      localStorage.setItem(key, 'read');
    } catch {
      // a forbidden storage only means that they are shown again
    }
    setRead(true);
  };
  return (
    <div>
      <PageHeader title={title} />
      <Panel>
        <div className="lb-cautions">
          <Mark size={120} />
          <div className="stack">
            <h2>{heading}</h2>
            <ul>
              {lines.map((line) => (
                <li key={line}>{line}</li>
              ))}
            </ul>
            <p>
              <b>{t('law')}</b>
            </p>
            <div className="row">
              <Button className="lb-cautions-read" intent="primary" text={t('read')} onClick={onRead} />
              <span className="muted">{t('once', { name: me.name })}</span>
            </div>
          </div>
        </div>
      </Panel>
    </div>
  );
}
