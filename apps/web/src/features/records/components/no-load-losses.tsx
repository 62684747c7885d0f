import type { NoLoadDerived } from '@libs/machine-tests';
import { Facts } from '../../../components/panel.js';
import { Quantity } from '../../../components/quantity.js';
import { t } from '../text.js';

/** Where the watts went, as far as the points tell. */
export function NoLoadLosses({ derived }: { readonly derived: NoLoadDerived | null }) {
  if (!derived) return null;
  const { atRated, separation } = derived;
  const watts = (si: number) => <Quantity si={si} kind="power" />;
  const rows = [
    ...(atRated ? ([[t('windingLoss'), watts(atRated.windingLossW)], [t('constantLoss'), watts(atRated.constantLossW)]] as const) : []),
    ...(separation ? [[t('friction', { n: separation.pointsInFit }), watts(separation.frictionAndWindageW)] as const] : []),
    ...(separation && separation.coreLossW !== null ? [[t('coreLoss'), watts(separation.coreLossW)] as const] : []),
  ];
  return rows.length === 0 ? null : (
    <div className="measured" aria-live="polite">
      <Facts rows={rows} />
    </div>
  );
}
