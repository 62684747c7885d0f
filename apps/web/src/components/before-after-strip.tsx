import { stripDrawing, type StripDrawingInput } from '@libs/drawings';
import { defineText } from '../lib/text.js';
import { Drawing } from './drawing.js';
import './before-after-strip.css';

const t = defineText({ table: 'Figures as a table' });

/** Before and after on one scale; on a phone, and in a narrow panel, its words stand over the bars. */
export function BeforeAfterStrip({ withTable = true, ...input }: StripDrawingInput & { readonly withTable?: boolean }) {
  const table = withTable ? t('table') : undefined;
  return (
    <div className="lb-strip">
      <div className="lb-strip-wide">
        <Drawing drawing={stripDrawing({ ...input, narrow: false })} withTable={table} />
      </div>
      <div className="lb-strip-narrow">
        <Drawing drawing={stripDrawing({ ...input, narrow: true })} withTable={table} />
      </div>
    </div>
  );
}
