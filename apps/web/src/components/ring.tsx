import { ringDrawing, type RingDrawingInput } from '@libs/drawings';
import { formatUsual } from '@libs/quantities';
import { useState, type KeyboardEvent } from 'react';
import { defineText } from '../lib/text.js';
import { Drawing } from './drawing.js';
import { useUnits } from './units.js';
import './ring.css';

const t = defineText({
  slots: 'Slots of the core: arrow keys go round',
  slot: 'Slot {slot}',
  heat: 'Slot {slot}: {rise} over the mean',
  look: 'Tap a slot for its figures.',
  table: 'Temperatures as a table',
});

interface RingProps extends Omit<RingDrawingInput, 'units'> {
  readonly width?: string | number;
  /** with slots that answer to hover, tap and arrow keys */
  readonly interactive?: boolean;
  readonly onSlot?: (slot: number) => void;
  /** what to say of a slot; its rise over the mean unless told */
  readonly wordsOf?: (slot: number) => string;
}

const slotOf = (target: EventTarget): number | null => {
  const mark = target instanceof Element ? target.getAttribute('data-mark') : null;
  return mark?.startsWith('slot-') ? Number(mark.slice(5)) : null;
};

/** The core's end view, to scale, in the person's units. */
export function Ring({ width, interactive = false, onSlot, wordsOf, ...input }: RingProps) {
  const units = useUnits();
  const [slot, setSlot] = useState<number | null>(null);
  const drawing = ringDrawing({ ...input, units });
  if (!interactive) return <Drawing drawing={drawing} width={width} />;

  const slots = input.geometry?.slots ?? 0;
  const rise = slot === null ? undefined : input.heat?.get(slot);
  const words = slot === null ? t('look') : wordsOf ? wordsOf(slot) : rise === undefined ? t('slot', { slot }) : t('heat', { slot, rise: formatUsual(rise, 'temperature-difference', units) });
  const onKeyDown = (event: KeyboardEvent) => {
    const step = event.key === 'ArrowRight' || event.key === 'ArrowDown' ? 1 : event.key === 'ArrowLeft' || event.key === 'ArrowUp' ? -1 : 0;
    if (step !== 0 && slots > 0) {
      event.preventDefault();
      setSlot((at) => (at === null ? 1 : ((at - 1 + step + slots) % slots) + 1));
    } else if (event.key === 'Enter' && slot !== null) onSlot?.(slot);
  };
  return (
    <div className="lb-ring">
      <div className="lb-ring-slots" role="group" tabIndex={0} aria-label={t('slots')} onKeyDown={onKeyDown}>
        <Drawing
          drawing={drawing}
          width={width}
          withTable={drawing.table ? t('table') : undefined}
          shownMark={slot === null ? undefined : `slot-${slot}`}
          onMark={(mark) => {
            const tapped = Number(mark.slice(5));
            setSlot(tapped);
            onSlot?.(tapped);
          }}
          svgProps={{
            onPointerMove: (event) => {
              if (event.pointerType === 'mouse') setSlot((at) => slotOf(event.target) ?? at);
            },
          }}
        />
      </div>
      <p className="lb-ring-words num" role="status">
        {words}
      </p>
    </div>
  );
}
