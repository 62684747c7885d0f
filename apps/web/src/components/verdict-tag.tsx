import { defineText } from '../lib/text.js';
import './verdict-tag.css';

const t = defineText({
  conforms: 'conforms',
  'does-not-conform': 'does not conform',
  inconclusive: 'inconclusive',
  'not-valid': 'not valid',
  'shown-not-judged': 'shown, not judged',
});
export type ShownVerdict = 'conforms' | 'does-not-conform' | 'inconclusive' | 'not-valid' | 'shown-not-judged';

const MARKS: Record<ShownVerdict, React.ReactNode> = {
  conforms: <circle cx="8" cy="8" r="6" fill="currentColor" />,
  'does-not-conform': <rect x="2.5" y="2.5" width="11" height="11" fill="currentColor" />,
  inconclusive: (
    <>
      <path d="M8 1 15 8 8 15 1 8Z" fill="none" stroke="currentColor" strokeWidth="2" />
      <path d="M8 1 8 15 1 8Z" fill="currentColor" />
    </>
  ),
  'not-valid': <path d="M8 2 15 14 1 14Z" fill="none" stroke="currentColor" strokeWidth="2" />,
  'shown-not-judged': <path d="M2 8H14" stroke="currentColor" strokeWidth="2" />,
};

export const isVerdict = (word: string | null | undefined): word is ShownVerdict => word !== null && word !== undefined && word in MARKS;

/** Word, shape and colour: a verdict is never told by colour alone. */
export function VerdictTag({ verdict, large = false }: { readonly verdict: ShownVerdict; readonly large?: boolean }) {
  return (
    <span className={`lb-verdict lb-verdict-${verdict}${large ? ' lb-verdict-large' : ''}`}>
      <svg viewBox="0 0 16 16" width={large ? 20 : 15} height={large ? 20 : 15} aria-hidden="true">
        {MARKS[verdict]}
      </svg>
      {t(verdict)}
    </span>
  );
}
