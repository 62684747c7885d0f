import type { LoadChannel, LoggerFileView } from '@shared/burnouts';
import '../../../components/data-table.css';
import { Quantity } from '../../../components/quantity.js';
import { useUnits } from '../../../components/units.js';
import { sizeOf } from '../../../lib/format.js';
import { kelvinWords, minutesWords } from '../load-words.js';
import { t } from '../text.js';

/** What the file holds: its thermocouples, and what is wrong in it, by line. */
export function FileRead({ loadId, file }: { readonly loadId: string; readonly file: LoggerFileView }) {
  return (
    <div className="stack">
      <div className="lb-table-wrap">
        <table className="lb-table" role="table">
          <caption className="visually-hidden">{t('channels')}</caption>
          <thead role="rowgroup">
            <tr role="row">
              {[t('channel'), t('where'), t('peak'), t('heating'), t('cooling'), t('gaps')].map((title, i) => (
                <th key={i} scope="col" role="columnheader">
                  {title}
                </th>
              ))}
            </tr>
          </thead>
          <tbody role="rowgroup">
            {file.channels.map((channel) => (
              <ChannelRow key={channel.name} channel={channel} />
            ))}
          </tbody>
        </table>
      </div>
      <Problems file={file} />
      <p className="muted lb-load-small">
        {t('fileFacts', { rows: file.rows, start: file.startClock, end: file.endClock, size: sizeOf(file.sizeBytes) })}{' '}
        <a className="lb-load-download" href={`/api/burnouts/${loadId}/file`}>
          {t('download')}
        </a>
      </p>
    </div>
  );
}

function ChannelRow({ channel }: { readonly channel: LoadChannel }) {
  const system = useUnits();
  const rate = (k: number | null) => (k === null ? '–' : t('perHour', { k: kelvinWords(k, system) }));
  const where = channel.onPart ? t('onPart') : t('notOnPart');
  if (channel.outcome === 'no-readings') {
    return (
      <tr role="row">
        <td role="cell">{channel.name}</td>
        <td role="cell">{where}</td>
        <td role="cell" colSpan={4} className="lb-load-warn">
          {t('noReadings')}
        </td>
      </tr>
    );
  }
  const gaps = channel.gapCount === 0 ? t('noGaps') : t('gapMinutes', { n: channel.gapCount, minutes: minutesWords(Math.round(channel.gapMinutes), system) });
  return (
    <tr role="row">
      <td role="cell">{channel.name}</td>
      <td role="cell" className={channel.onPart ? '' : 'muted'}>
        {where}
      </td>
      <td role="cell" data-title={t('peak')} className="num">
        <Quantity si={channel.peakC} kind="temperature" /> <span className="muted">{t('atClock', { clock: channel.peakAt.clock })}</span>
      </td>
      <td role="cell" data-title={t('heating')} className="num">
        {rate(channel.rampKPerH)}
      </td>
      <td role="cell" data-title={t('cooling')} className="num">
        {rate(channel.coolKPerH)}
      </td>
      <td role="cell" data-title={t('gaps')} className="num">
        {channel.gaps === null ? '–' : gaps}
      </td>
    </tr>
  );
}

function Problems({ file }: { readonly file: LoggerFileView }) {
  if (file.problemCount === 0) return <p className="muted">{t('clean')}</p>;
  return (
    <details className="lb-load-problems" open={file.problemCount <= 5}>
      <summary>
        {t('problems')}: {file.problemCount === 1 ? t('problemsOne') : t('problemsCount', { n: file.problemCount })}
      </summary>
      <ul>
        {file.problems.map((p) => (
          <li key={`${p.code}-${p.line}-${p.channel ?? ''}`}>{p.message}</li>
        ))}
      </ul>
    </details>
  );
}
