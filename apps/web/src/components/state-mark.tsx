import type { ReactNode } from 'react';
import './state-mark.css';

/** open: can be worked on. waiting: somebody else's turn. good, bad: how it ended. quiet: of no account any more. */
export type StateTone = 'open' | 'waiting' | 'good' | 'bad' | 'quiet';

const MARKS: Record<StateTone, ReactNode> = {
  open: <circle cx="8" cy="8" r="5.5" fill="none" stroke="currentColor" strokeWidth="2.2" />,
  waiting: (
    <>
      <circle cx="8" cy="8" r="5.8" fill="none" stroke="currentColor" strokeWidth="1.8" />
      <path d="M8 2.2A5.8 5.8 0 0 0 8 13.8Z" fill="currentColor" />
    </>
  ),
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
