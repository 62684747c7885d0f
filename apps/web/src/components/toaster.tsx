import { OverlayToaster, type ToastProps } from '@blueprintjs/core';
import { createContext, useCallback, useContext, useRef, type ReactNode } from 'react';

const Tell = createContext<(words: string, intent?: ToastProps['intent']) => void>(() => undefined);
/** Says briefly that something was done; errors stand where they can be acted on instead. */
export const useTell = () => useContext(Tell);

export function ToasterProvider({ children }: { readonly children: ReactNode }) {
  const toaster = useRef<OverlayToaster>(null);
  const tell = useCallback((words: string, intent: ToastProps['intent'] = 'success') => void toaster.current?.show({ message: words, intent, timeout: 5000 }), []);
  return (
    <Tell.Provider value={tell}>
      {children}
      <OverlayToaster ref={toaster} position="bottom" />
    </Tell.Provider>
  );
}
