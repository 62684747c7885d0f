import { Button } from '@blueprintjs/core';
import { useId, type ReactNode } from 'react';
import { t } from '../text.js';
import './book-in.css';

interface FlowPanelProps {
  readonly number: number;
  readonly title: string;
  readonly open: boolean;
  /** what was chosen or typed, in one line, once the panel is folded */
  readonly summary: string;
  readonly wrong: boolean;
  readonly onOpen: () => void;
  readonly onNext: (() => void) | null;
  readonly children: ReactNode;
}

/** One of the four panels: open, or folded to its one line. */
export function FlowPanel({ number, title, open, summary, wrong, onOpen, onNext, children }: FlowPanelProps) {
  const id = useId();
  return (
    <section className={`lb-flow${open ? ' open' : ''}${wrong ? ' wrong' : ''}`}>
      <h2>
        <button type="button" aria-expanded={open} aria-controls={id} onClick={onOpen}>
          <span className="lb-flow-number num" aria-hidden="true">
            {number}
          </span>
          <span>
            {title}
            <span className="visually-hidden"> {t('step', { n: number })}</span>
          </span>
          {!open && summary && <span className="lb-flow-summary">{summary}</span>}
        </button>
      </h2>
      <div id={id} hidden={!open} className="lb-flow-body">
        {open && children}
        {open && onNext && (
          <div>
            <Button intent="primary" size="large" text={t('next')} onClick={onNext} />
          </div>
        )}
      </div>
    </section>
  );
}
