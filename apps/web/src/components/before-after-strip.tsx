import { useMemo } from 'react';
import type { CoreRecord } from '../lib/core-figures.js';
import { coreStrip } from '../lib/core-strip.js';
import { defineText } from '../lib/text.js';
import { Drawing } from './drawing.js';
import { useUnits } from './units.js';

const t = defineText({ figures: 'Figures of the core tests' });

/** The core's loss before and after on one scale, each with its uncertainty, and the limit where one applies. */
export function BeforeAfterStrip({ records }: { readonly records: readonly CoreRecord[] }) {
  const units = useUnits();
  const drawing = useMemo(() => coreStrip(records, units), [records, units]);
  return <Drawing drawing={drawing} withTable={t('figures')} />;
}
