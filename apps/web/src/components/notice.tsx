import { Callout, type CalloutProps } from '@blueprintjs/core';
import './notices.css';

/** A callout whose title is words and no heading, so that the page's headings keep their order wherever it stands. */
export function Notice({ title, children, ...rest }: Omit<CalloutProps, 'title'> & { readonly title?: string }) {
  return (
    <Callout {...rest}>
      {title !== undefined && <p className="lb-notice-title">{title}</p>}
      {children}
    </Callout>
  );
}
