import type { ReactNode } from 'react';

/** Only when it appears: the function is the same on every drawing, so the reference is set once. */
const bring = (element: HTMLElement | null) => element?.scrollIntoView?.({ block: 'center' });

/** Something that must be answered comes into sight when it appears, wherever on a long page somebody is. */
export const IntoView = ({ children }: { readonly children: ReactNode }) => (
  <div className="stack" ref={bring}>
    {children}
  </div>
);
