import { Button } from '@blueprintjs/core';
import type { JobLoad } from '@shared/burnouts';
import { formatUsual } from '@libs/quantities';
import { useFormContext } from 'react-hook-form';
import { Link } from 'react-router-dom';
import { Panel } from '../../../components/panel.js';
import { StateMark } from '../../../components/state-mark.js';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { calendarDay } from '../../../lib/format.js';
import { loadText as t } from '../from-load-text.js';
import type { RecordContext } from '../record-definition.js';
import { takenFromLoad, type StripValues } from '../strip-form.js';

/** What the logger of the job's load wrote: peak and minutes are taken over by one tap instead of by hand. */
export function FromLoad({ context }: { readonly context: RecordContext }) {
  const { loads = [] } = context;
  if (loads.length === 0) return null;
  return (
    <Panel title={t('title')}>
      <ul className="lb-plain">
        {loads.map((load) => (
          <li key={load.id}>
            <OneLoad load={load} context={context} />
          </li>
        ))}
      </ul>
    </Panel>
  );
}

function OneLoad({ load, context: { system } }: { readonly load: JobLoad; readonly context: RecordContext }) {
  const { setValue, getValues } = useFormContext<StripValues>();
  const take = () => {
    for (const [name, value] of Object.entries(takenFromLoad(load, getValues(), system))) setValue(name as keyof StripValues, value as never, { shouldDirty: true, shouldTouch: true, shouldValidate: true });
  };
  return (
    <div className="stack">
      <div className="row spread">
        <Link to={`/bay/burnouts/${load.id}`}>{t('load', { number: load.number, oven: load.ovenName, day: calendarDay(load.day) })}</Link>
        {isVerdict(load.verdict) ? <VerdictTag verdict={load.verdict} /> : <StateMark tone="waiting" words={t('waits')} />}
      </div>
      {load.peakC !== null && load.minutesAbove345C !== null && (
        <Button className="lb-record-big" onClick={take} text={t('take', { peak: formatUsual(load.peakC, 'temperature', system), minutes: Math.round(load.minutesAbove345C) })} />
      )}
    </div>
  );
}
