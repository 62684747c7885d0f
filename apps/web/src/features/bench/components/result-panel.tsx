import { formatUsual, type UnitSystem } from '@libs/quantities';
import type { CoreTestResult, Judgement, Reason } from '@libs/core-loss';
import { Quantity } from '../../../components/quantity.js';
import { useUnits } from '../../../components/units.js';
import { VerdictTag } from '../../../components/verdict-tag.js';
import { increaseWords } from '../strip-of.js';
import { t } from '../text.js';

/** What the readings come to: the figure, the verdicts with their limits, and every reason in words. */
export function ResultPanel({ result }: { readonly result: CoreTestResult }) {
  return (
    <div className="lb-bench-result" aria-live="polite">
      <div className="lb-bench-figure">
        <p className="lb-bench-loss measured">
          <Quantity si={result.wattsPerKgReferred} kind="specific-loss" />
        </p>
        <p className="muted num">
          <Uncertainty result={result} />
        </p>
        <VerdictTag verdict={result.verdict} large />
        <dl className="lb-bench-facts">
          <Fact name={t('flux')}>
            <Quantity si={result.fluxDensityT} kind="flux-density" /> <Quantity si={result.fluxShareOfTarget} kind="percent" />
          </Fact>
          <Fact name={t('vaPerKg')}>
            <Quantity si={result.vaPerKg} kind="specific-apparent-power" />
          </Fact>
          <Fact name={t('powerFactor')}>
            <Quantity si={result.powerFactor} kind="number" />
          </Fact>
          <Fact name={t('watts')}>
            <Quantity si={result.coreWatts} kind="power" />
          </Fact>
        </dl>
      </div>
      <div className="lb-bench-judged">
        <ul>
          {result.judgements.map((j) => (
            <JudgedRow key={j.test} judgement={j} result={result} />
          ))}
        </ul>
        <Reasons title={t('notValidBecause')} reasons={result.validityReasons} />
        <Reasons title={t('comparisonBecause')} reasons={(result.comparison?.reasons ?? []).filter((r) => !result.validityReasons.some((v) => v.code === r.code))} />
        <Reasons title={t('warnings')} reasons={result.warnings} />
        <details>
          <summary>{t('sources')}</summary>
          <ul>
            {result.judgements.map((j) => (
              <li key={j.test}>
                {t(j.test)}: {j.source} ({j.standing})
              </li>
            ))}
          </ul>
        </details>
      </div>
    </div>
  );
}

const Fact = ({ name, children }: { readonly name: string; readonly children: React.ReactNode }) => (
  <div>
    <dt>{name}</dt>
    <dd>{children}</dd>
  </div>
);

function Uncertainty({ result }: { readonly result: CoreTestResult }) {
  const system = useUnits();
  return <>{t('uncertainty', { value: formatUsual(result.expandedUncertaintyWPerKg, 'specific-loss', system) })}</>;
}

function JudgedRow({ judgement, result }: { readonly judgement: Judgement; readonly result: CoreTestResult }) {
  const system = useUnits();
  const { measured, limit, reasons } = judgement;
  // what spoils the comparison is said once, in its own list
  const own = judgement.test === 'increase' && judgement.verdict === 'not-valid' && result.comparison ? [] : reasons;
  return (
    <li>
      <span className="lb-judged-name">
        {t(judgement.test)} <small className="muted num">{limit === undefined ? '' : t('limit', { limit: inUnit(limit, judgement, system) })}</small>
      </span>
      <b className="num">{measured === undefined ? '–' : figureOf(judgement, measured, result, system)}</b>
      <VerdictTag verdict={judgement.verdict} />
      {own.length > 0 && judgement.verdict !== 'conforms' && <span className="lb-judged-why muted">{own.map((r) => r.words).join(' ')}</span>}
    </li>
  );
}

const KIND_OF = { '1': 'percent', K: 'temperature-difference', 'W/kg': 'specific-loss' } as const;
const inUnit = (si: number, { unit }: Judgement, system: UnitSystem) => formatUsual(si, KIND_OF[unit], system);

function figureOf(judgement: Judgement, measured: number, result: CoreTestResult, system: UnitSystem): string {
  return judgement.test === 'increase' ? (increaseWords(result)?.figure ?? inUnit(measured, judgement, system)) : inUnit(measured, judgement, system);
}

function Reasons({ title, reasons }: { readonly title: string; readonly reasons: readonly Reason[] }) {
  if (reasons.length === 0) return null;
  return (
    <div className="lb-bench-reasons">
      <b>{title}</b>
      <ul>
        {reasons.map((r) => (
          <li key={r.code}>{r.words}</li>
        ))}
      </ul>
    </div>
  );
}
