import { burnoutCurveDrawing } from '@libs/drawings';
import type { LoadView } from '@shared/burnouts';
import { Drawing } from '../../../components/drawing.js';
import { useUnits } from '../../../components/units.js';
import { celsiusWords, limitReasonWords } from '../load-words.js';
import { t } from '../text.js';
import '../burnouts.css';

/** The curve with its limit; of the thermocouples those on the parts, or all where none is. */
export function LoadCurve({ load }: { readonly load: LoadView }) {
  const system = useUnits();
  const { limitC } = load;
  const read = (load.file?.channels ?? []).flatMap((c) => (c.outcome === 'read' ? [c] : []));
  const parts = read.filter((c) => c.onPart);
  // the hottest is drawn strong and hatched: it must be one that is judged
  const shown = parts.length > 0 ? parts : read;
  const drawn = (narrow: boolean) =>
    burnoutCurveDrawing({
      narrow,
      fahrenheit: system === 'inch-pound',
    title: t('loadTitle', { number: load.number, oven: load.ovenName }),
    limit: { celsius: limitC, words: t('limitWords', { limit: celsiusWords(limitC, system), reason: limitReasonWords(load.limitReason) }) },
    channels: shown.map((c) => {
      const above = c.minutesAbove.find((a) => a.limitC === limitC);
      return { name: c.name, peakC: c.peakC, points: c.curve.map(([minute, celsius]) => ({ minute, celsius })), gaps: c.gaps ?? [], aboveLimit: above ? { minutes: above.minutes, unknownMinutes: above.unknownMinutes } : null };
    }),
  });
  return (
    <div className="lb-load-picture">
      <div className="lb-load-wide">
        <Drawing drawing={drawn(false)} withTable={t('figures')} />
      </div>
      <div className="lb-load-narrow">
        <Drawing drawing={drawn(true)} withTable={t('figures')} />
      </div>
    </div>
  );
}
