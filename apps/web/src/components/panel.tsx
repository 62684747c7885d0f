import type { ReactNode } from 'react';
import './panel.css';

interface PanelProps {
  readonly title?: ReactNode;
  readonly actions?: ReactNode;
  readonly children: ReactNode;
  readonly tight?: boolean;
}

/** A sheet of paper on the ground, with a heading and what can be done. */
export function Panel({ title, actions, children, tight = false }: PanelProps) {
  return (
    <section className={`lb-panel${tight ? ' lb-panel-tight' : ''}`}>
      {(title || actions) && (
        <header>
          {title && <h2>{title}</h2>}
          {actions && <div className="row">{actions}</div>}
        </header>
      )}
      {children}
    </section>
  );
}

interface PageHeaderProps {
  readonly title: string;
  readonly below?: ReactNode;
  readonly actions?: ReactNode;
}

/** The page's one heading; it also names the browser's tab. */
export function PageHeader({ title, below, actions }: PageHeaderProps) {
  return (
    <div className="lb-page-header">
      <title>{`${title} · Loopbay`}</title>
      <div>
        <h1>{title}</h1>
        {below && <div className="muted">{below}</div>}
      </div>
      {actions && <div className="row no-print">{actions}</div>}
    </div>
  );
}

/** Names beside figures, in two columns. */
export function Facts({ rows }: { readonly rows: readonly (readonly [name: string, value: ReactNode])[] }) {
  return (
    <dl className="lb-facts">
      {rows.map(([name, value]) => (
        <div key={name}>
          <dt>{name}</dt>
          <dd>{value}</dd>
        </div>
      ))}
    </dl>
  );
}
