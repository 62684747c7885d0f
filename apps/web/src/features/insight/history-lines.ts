import { addOvenHistorySchema, type AddOvenHistory } from '@shared/insight';
import { parseQuantity } from '@libs/quantities';
import { t } from './text.js';

type Read = { readonly ok: true; readonly input: AddOvenHistory } | { readonly ok: false; readonly problems: readonly string[] };

/** Lines of a day and a percentage, as typed or pasted from two columns; what is wrong is said by its line. */
export function readHistoryLines(text: string, today: string): Read {
  const rows: { day: string; change: number }[] = [];
  const problems: string[] = [];
  text.split(/\r\n|\r|\n/).forEach((raw, i) => {
    const words = raw.trim();
    const line = i + 1;
    if (words === '') return;
    const [, day, figure] = /^(\d{4}-\d{1,2}-\d{1,2})[\s;,]+(\S+)(?:\s*%)?$/.exec(words) ?? [];
    if (day === undefined || figure === undefined) return void problems.push(t('line_shape', { line }));
    const full = day.replace(/-(\d)(?!\d)/g, '-0$1');
    if (!isDay(full)) return void problems.push(t('line_day', { line, day }));
    if (full > today) return void problems.push(t('line_future', { line }));
    const parsed = parseQuantity(figure.replace('−', '-'), 'percent', 'si');
    if (!parsed.ok) return void problems.push(t('line_number', { line, figure }));
    if (!(parsed.si > -1 && parsed.si <= 10)) return void problems.push(t('line_range', { line }));
    rows.push({ day: full, change: parsed.si });
  });
  if (problems.length > 0) return { ok: false, problems };
  const input = addOvenHistorySchema.safeParse({ rows });
  return input.success ? { ok: true, input: input.data } : { ok: false, problems: rows.length === 0 ? [t('noLines')] : input.error.issues.map((issue) => issue.message) };
}

function isDay(day: string): boolean {
  const time = Date.parse(`${day}T00:00:00Z`);
  return Number.isFinite(time) && new Date(time).toISOString().slice(0, 10) === day;
}
