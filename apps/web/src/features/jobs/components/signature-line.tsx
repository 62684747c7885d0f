import { momentOf } from '../../../lib/format.js';
import type { SignOff } from '@shared/waivers';
import './signature-line.css';

/** A signature that stands: the words around who, when and why. */
export function SignatureLine({ signOff, words }: { readonly signOff: SignOff; readonly words: (s: { who: string; when: string; reason: string }) => string }) {
  return (
    <p className="lb-signature">
      <svg viewBox="0 0 20 16" width="20" height="16" aria-hidden="true">
        <path d="M1 12C5 2 7 2 7 7S9 13 11 8 13 3 14 7 16 11 19 9M1 15H19" fill="none" stroke="currentColor" strokeWidth="1.6" />
      </svg>
      <span>{words({ who: signOff.by, when: momentOf(signOff.at), reason: signOff.reason })}</span>
    </p>
  );
}
