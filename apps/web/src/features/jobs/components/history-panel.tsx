import { useQuery } from '@tanstack/react-query';
import { Answer, Empty } from '../../../components/faces.js';
import { Panel } from '../../../components/panel.js';
import { dayOf, timeOf } from '../../../lib/format.js';
import { jobHistoryQuery } from '../../../lib/job-queries.js';
import { t as jobText } from '../text.js';
import { t } from '../work-text.js';
import './history-panel.css';

/** Who did what and when, the newest first, day by day. */
export function HistoryPanel({ jobId }: { readonly jobId: string }) {
  const history = useQuery(jobHistoryQuery(jobId));
  return (
    <Panel title={jobText('tabHistory')}>
      <Answer query={history} isEmpty={(entries) => entries.length === 0} empty={<Empty title={t('historyEmpty')} />}>
        {(entries) => (
          <div className="lb-history">
            {daysOf(entries).map(([day, ofDay]) => (
              <section key={day}>
                <h3>{day}</h3>
                <ol>
                  {ofDay.map((entry) => (
                    <li key={entry.id}>
                      <time className="num muted" dateTime={entry.at}>
                        {timeOf(entry.at)}
                      </time>
                      <span>{entry.words}</span>
                      <span className="muted">{entry.who}</span>
                    </li>
                  ))}
                </ol>
              </section>
            ))}
          </div>
        )}
      </Answer>
    </Panel>
  );
}

function daysOf<E extends { readonly at: string }>(entries: readonly E[]): [string, E[]][] {
  const days = new Map<string, E[]>();
  for (const entry of entries) {
    const day = dayOf(entry.at);
    days.set(day, [...(days.get(day) ?? []), entry]);
  }
  return [...days];
}
