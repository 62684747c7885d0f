import type { ReactNode } from 'react';
import './fold.css';

interface FoldProps {
  readonly summary: string;
  /** opened from outside, when something in it must be seen */
  readonly open?: boolean;
  readonly children: ReactNode;
}

/** What is seldom needed stays folded until it is asked for. */
export function Fold({ summary, open, children }: FoldProps) {
  return (
    <details className="lb-fold" open={open || undefined}>
      <summary>{summary}</summary>
      <div className="lb-fold-body">{children}</div>
    </details>
  );
}
