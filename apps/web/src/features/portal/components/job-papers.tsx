import type { PortalJob } from '@shared/portal';
import { Link } from 'react-router-dom';
import { Panel } from '../../../components/panel.js';
import { StateMark } from '../../../components/state-mark.js';
import { dayOf, moneyOf, shopToday } from '../../../lib/format.js';
import { invoiceStateWords, paperName, quoteStateWords } from '../state-words.js';
import { t } from '../text.js';
import './portal.css';

export function JobMoneyList({ job }: { readonly job: PortalJob }) {
  const today = shopToday(new Date());
  return (
    <Panel title={t('money')}>
      {job.quotes.length + job.invoices.length === 0 ? (
        <p className="muted">{t('noMoney')}</p>
      ) : (
        <ul className="lb-portal-list">
          {job.invoices.map((invoice) => (
            <li key={invoice.id} className="lb-portal-line">
              <span className="row">
                <Link to={`/portal/invoices/${invoice.id}`}>{t('invoice', { number: invoice.number })}</Link>
                <StateMark {...invoiceStateWords(invoice)} />
              </span>
              <b className="num">{moneyOf(invoice.grossMinor, invoice.currency)}</b>
            </li>
          ))}
          {job.quotes.map((quote) => (
            <li key={quote.id} className="lb-portal-line">
              <span className="row">
                <Link to={`/portal/quotes/${quote.id}`}>{t('quote', { number: quote.number })}</Link>
                <StateMark {...quoteStateWords(quote, today)} />
              </span>
              <b className="num">{moneyOf(quote.grossMinor, quote.currency)}</b>
            </li>
          ))}
        </ul>
      )}
    </Panel>
  );
}

export function JobPapers({ job }: { readonly job: PortalJob }) {
  return (
    <Panel title={t('papers')}>
      {job.papers.length === 0 ? (
        <p className="muted">{t('noPapers')}</p>
      ) : (
        <ul className="lb-portal-list">
          {job.papers.map((paper) => (
            <li key={paper.id} className="lb-portal-line">
              <a href={`/api/portal/papers/${paper.id}/pdf`} target="_blank" rel="noreferrer">
                {t('paperPdf', { kind: paperName(paper.kind), number: paper.number })}
              </a>
              <span className="muted">{paper.supersededBy ? t('paperOld', { number: paper.supersededBy }) : dayOf(paper.issuedAt)}</span>
            </li>
          ))}
        </ul>
      )}
    </Panel>
  );
}

export function JobPhotos({ photos }: { readonly photos: PortalJob['photos'] }) {
  if (photos.length === 0) return null;
  return (
    <Panel title={t('photos')}>
      <ul className="lb-portal-photos">
        {photos.map((photo, i) => (
          <li key={photo.id}>
            <a href={`/api/portal/attachments/${photo.id}`} target="_blank" rel="noreferrer">
              <img src={`/api/portal/attachments/${photo.id}/thumb`} alt={t('photo', { n: i + 1, name: photo.name })} loading="lazy" />
            </a>
          </li>
        ))}
      </ul>
    </Panel>
  );
}
