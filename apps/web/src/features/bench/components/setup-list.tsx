import { Button } from '@blueprintjs/core';
import { planSetups, setupObstacles, geometryProblems, type CoreTestResult, type Reason, type SetupOption, type SetupRequest } from '@libs/core-loss';
import { OutOfRangeError, formatUsual, formatQuantity } from '@libs/quantities';
import type { BayView } from '@shared/instruments';
import { useState } from 'react';
import { useFormContext, useWatch } from 'react-hook-form';
import { useUnits } from '../../../components/units.js';
import { typedFrom } from '../../../lib/typed.js';
import type { BenchValues } from '../bench-form.js';
import type { LiveTest } from '../live-test.js';
import { t } from '../text.js';

interface SetupListProps {
  readonly live: LiveTest;
  readonly bay: BayView;
  readonly before: { readonly turns: number; readonly result: CoreTestResult } | null;
  /** the least flux that is worth testing at */
  readonly minimumTargetT: number;
}

type Plan = { readonly options: readonly SetupOption[]; readonly obstacles: readonly Reason[] };

/** Null while size, target or frequency cannot be planned with yet. */
function planFor({ live, bay, before, minimumTargetT }: SetupListProps): Plan | null {
  const { geometry, target, reading } = live.readings;
  if (geometryProblems(geometry).length > 0 || !(target.fluxDensityT > 0) || !(reading.frequencyHz > 0)) return null;
  const request: SetupRequest = {
    geometry,
    targetT: target.fluxDensityT,
    frequencyHz: reading.frequencyHz,
    supplies: bay.supplies.map(({ tapsV, ...s }) => (tapsV === undefined ? s : { ...s, tapsV })),
    cables: bay.cables,
    minimumTargetT,
    ...(before ? { turnsWound: before.turns, measured: before.result } : {}),
  };
  try {
    return { options: planSetups(request), obstacles: setupObstacles(request) };
  } catch (error) {
    if (!(error instanceof OutOfRangeError)) throw error;
    return { options: [], obstacles: [{ code: 'target', words: error.message }] };
  }
}

/** What the bay can do, best first; choosing one fills in turns, supply and cable. */
export function SetupList(props: SetupListProps) {
  const { control, setValue } = useFormContext<BenchValues>();
  const system = useUnits();
  const turns = props.live.readings.reading.excitingTurns;
  const supplyId = useWatch({ control, name: 'setup.supplyId' });
  const [all, setAll] = useState(false);
  const plan = planFor(props);
  if (!plan) return <p className="lb-bench-hint">{t('setupsWait')}</p>;
  if (plan.options.length === 0) {
    return (
      <div className="lb-bench-hint" role="status">
        <b>{t('noSetup')}</b>
        {plan.obstacles.map((o) => (
          <p key={o.code}>{o.words}</p>
        ))}
      </div>
    );
  }
  const choose = (option: SetupOption) => {
    const put = { shouldDirty: true, shouldTouch: true } as const;
    setValue('reading.excitingTurns', typedFrom(option.turns, 'count', system), put);
    setValue('reading.searchTurns', typedFrom(option.searchTurns, 'count', system), put);
    setValue('setup', { supplyId: option.supplyId, cableId: option.cableId, parallelCables: option.parallelCables }, put);
    if (!option.reachesTarget) {
      setValue('target.fluxDensityT', typedFrom(Math.round(option.fluxReachedT * 1000) / 1000, 'flux-density', system), put);
      setValue('target.basis', 'supply', put);
    }
  };
  const isChosen = (option: SetupOption) => option.turns === turns && option.supplyId === supplyId;
  const chosen = plan.options.find(isChosen);
  const shown = all || !chosen ? plan.options : [chosen];
  return (
    <>
      <div role="radiogroup" aria-label={t('setups')} className="lb-setups">
        {shown.map((option) => (
          <Option
            key={`${option.supplyId}-${option.turns}-${option.volts}`}
            option={option}
            best={option === plan.options[0]}
            chosen={option === chosen}
            bay={props.bay}
            onChoose={() => {
              choose(option);
              setAll(false);
            }}
          />
        ))}
      </div>
      {chosen && plan.options.length > 1 && <Button variant="minimal" text={all ? t('setupsLess') : t('setupsMore', { n: plan.options.length - 1 })} onClick={() => setAll(!all)} aria-expanded={all} />}
    </>
  );
}

function Option({ option, best, chosen, bay, onChoose }: { readonly option: SetupOption; readonly best: boolean; readonly chosen: boolean; readonly bay: BayView; readonly onChoose: () => void }) {
  const system = useUnits();
  const supply = bay.supplies.find((s) => s.id === option.supplyId);
  const cable = bay.cables.find((c) => c.id === option.cableId);
  const amps = (si: number) => formatUsual(si, 'current', system);
  const volts = (si: number) => formatUsual(si, 'voltage', system);
  const length = (si: number) => formatQuantity(si, 'cable-length', system, { digits: 0 });
  const wire = { cable: cable?.name ?? option.cableId, length: length(option.cableLengthNeededM), drum: length(cable?.lengthM ?? 0), n: option.parallelCables };
  return (
    <button type="button" role="radio" aria-checked={chosen} className="lb-setup" onClick={onChoose}>
      <span className="lb-setup-head">
        <b>{t('turns', { n: option.turns })}</b>
        <span>{supply?.name ?? option.supplyId}</span>
        {best && <span className="lb-setup-best">{t('best')}</span>}
      </span>
      <Band option={option} most={supply?.maxAmpsA ?? option.ampsHigh} supply={supply?.name ?? option.supplyId} />
      <span className="num">
        {t('option', {
          volts: volts(option.volts),
          amps: amps(option.amps),
          low: formatUsual(option.ampsLow, 'current', system, { unit: false }),
          high: amps(option.ampsHigh),
          kva: formatUsual(option.kva * 1000, 'apparent-power', system),
          flux: formatUsual(option.fluxReachedT, 'flux-density', system),
        })}
      </span>
      <span className="num">{option.parallelCables > 1 ? t('optionParallel', wire) : t('optionCable', wire)}</span>
      {(best || chosen) && <span className="lb-setup-why">{option.why}</span>}
      {chosen && (
        <>
          <span className="num">{t('optionSearch', { turns: option.searchTurns, volts: volts(option.searchVolts), trial: volts(option.trialVolts) })}</span>
          {option.problems.map((p) => (
            <span key={p} className="lb-setup-problem">
              {p}
            </span>
          ))}
        </>
      )}
    </button>
  );
}

/** The current that may be expected, low to high with the estimate marked, on the scale of what the supply gives. */
function Band({ option, most, supply }: { readonly option: SetupOption; readonly most: number; readonly supply: string }) {
  const end = Math.max(most, option.ampsHigh) * 1.02;
  const at = (amps: number) => (amps / end) * 100;
  return (
    <svg className="lb-setup-band" viewBox="0 0 100 10" preserveAspectRatio="none" role="img" aria-label={t('bandTitle', { supply })}>
      <rect x="0" y="4" width={at(most)} height="2" className="rail" />
      <rect x={at(option.ampsLow)} y="2" width={at(option.ampsHigh) - at(option.ampsLow)} height="6" className={option.ampsHigh > most ? 'band over' : 'band'} />
      <rect x={at(option.amps) - 0.5} y="0" width="1" height="10" className="mark" />
      <rect x={at(most) - 0.5} y="0" width="1" height="10" className="end" />
    </svg>
  );
}
