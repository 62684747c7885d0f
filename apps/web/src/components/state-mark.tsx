import type { ReactNode } from 'react';
import './state-mark.css';

/** open: can be worked on. waiting: somebody else's turn. good, bad: how it ended. quiet: of no account any more. */
export type StateTone = 'open' | 'waiting' | 'good' | 'bad' | 'quiet';

const MARKS: Record<StateTone, ReactNode> = {
  open: <circle cx="8" cy="8" r="5.5" fill="none" stroke="currentColor" strokeWidth="2.2" />,
  waiting: <path d="M8 1.5A6.5 6.5 0 1 0 8 14.5Z M8 2.5A5.5 5.5 0 0 1 8 13.5" fill="currentColor" fillRule="evenodd" stroke="currentColor" strokeWidth="1.4" />,
  good: <path d="M2 8.5 6.5 13 14 4" fill="none" stroke="currentColor" strokeWidth="2.6" />,
  bad: <path d="M3 3 13 13M13 3 3 13" fill="none" stroke="currentColor" strokeWidth="2.6" />,
  quiet: <path d="M2 8H14" stroke="currentColor" strokeWidth="2" />,
};

/** How a quote, an invoice or a message stands: word and shape, the colour only helps. */
export function StateMark({ tone, words }: { readonly tone: StateTone; readonly words: string }) {
  return (
    <span className={`lb-state lb-state-${tone}`}>
      <svg viewBox="0 0 16 16" width="14" height="14" aria-hidden="true">
        {MARKS[tone]}
      </svg>
      {words}
    </span>
  );
}
