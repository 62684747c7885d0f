import { createContext, useCallback, useContext, useEffect, useRef, useState, type ReactNode } from 'react';
import './toaster.css';

type Tone = 'success' | 'warning';
const Tell = createContext<(words: string, tone?: Tone) => void>(() => undefined);
/** Says briefly that something was done; errors stand where they can be acted on instead. */
export const useTell = () => useContext(Tell);

const SHOWN_MS = 5_000;

/**
 * A line at the foot of the page that comes and goes by itself. It takes neither focus nor taps: a toast that does
 * covers the field below it and stays while it is focused, which a gloved hand cannot mend.
 */
export function ToasterProvider({ children }: { readonly children: ReactNode }) {
  const [said, setSaid] = useState<{ readonly words: string; readonly tone: Tone; readonly key: number } | null>(null);
  const last = useRef(0);
  const tell = useCallback((words: string, tone: Tone = 'success') => {
    last.current += 1;
    setSaid({ words, tone, key: last.current });
  }, []);
  useEffect(() => {
    if (!said) return;
    const timer = setTimeout(() => setSaid(null), SHOWN_MS);
    return () => clearTimeout(timer);
  }, [said]);
  return (
    <Tell.Provider value={tell}>
      {children}
      <div className="lb-toasts no-print" role="status" aria-live="polite">
        {said && (
          <p key={said.key} className={`lb-toast lb-toast-${said.tone}`}>
            {said.words}
          </p>
        )}
      </div>
    </Tell.Provider>
  );
}
