import { formatQuantity } from '@libs/quantities';
import type { BayView } from '@shared/instruments';
import { Link } from 'react-router-dom';
import { Panel } from '../../../components/panel.js';
import { useUnits } from '../../../components/units.js';
import { t } from '../text.js';

/** Supplies, cables and ovens, and how the instruments stand. */
export function Equipment({ bay }: { readonly bay: BayView }) {
  const system = useUnits();
  const amps = (si: number) => formatQuantity(si, 'current', system, { digits: 0 });
  const hertz = (si: number) => formatQuantity(si, 'frequency', system, { digits: 0 });
  const count = (standing: BayView['instruments'][number]['standing']) => bay.instruments.filter((i) => i.standing === standing).length;
  return (
    <Panel title={t('equipment')}>
      <div className="stack lb-equipment">
        <List title={t('supplies')} none={t('noSupplies')}>
          {bay.supplies.map((s) => (
            <li key={s.id}>
              <b>{s.name}</b>{' '}
              <span className="num">
                {s.kind === 'taps' && s.tapsV
                  ? t('taps', { taps: s.tapsV.join(', '), amps: amps(s.maxAmpsA), frequency: hertz(s.frequencyHz) })
                  : t('supply', { low: s.minVoltsV, high: s.maxVoltsV, amps: amps(s.maxAmpsA), frequency: hertz(s.frequencyHz) })}
              </span>
            </li>
          ))}
        </List>
        <List title={t('cables')} none={t('noCables')}>
          {bay.cables.map((c) => (
            <li key={c.id}>
              <b>{c.name}</b> <span className="num">{t('cable', { length: formatQuantity(c.lengthM, 'cable-length', system, { digits: 0 }), amps: amps(c.maxAmpsA) })}</span>
            </li>
          ))}
        </List>
        <List title={t('ovens')} none={t('noOvens')}>
          {bay.ovens.map((o) => (
            <li key={o.id}>
              <b>{o.name}</b> {o.remark}
            </li>
          ))}
        </List>
        <div>
          <h3>{t('instruments')}</h3>
          <p className="num">{t('standing', { good: count('in-calibration'), soon: count('due-soon'), overdue: count('overdue') })}</p>
          <Link className="lb-equipment-link" to="/bay/instruments">
            {t('toInstruments')}
          </Link>{' '}
          <Link className="lb-equipment-link" to="/shop/equipment">
            {t('toEquipment')}
          </Link>
        </div>
      </div>
    </Panel>
  );
}

function List({ title, none, children }: { readonly title: string; readonly none: string; readonly children: React.ReactNode[] }) {
  return (
    <div>
      <h3>{title}</h3>
      {children.length === 0 ? <p className="muted">{none}</p> : <ul>{children}</ul>}
    </div>
  );
}
