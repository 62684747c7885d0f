import { deriveGeometry, geometryProblems } from '@libs/core-loss';
import { formatQuantity, formatUsual, unitOf } from '@libs/quantities';
import { useFormContext } from 'react-hook-form';
import { ChoiceField } from '../../../components/fields.js';
import { Quantity } from '../../../components/quantity.js';
import { Ring } from '../../../components/ring.js';
import { useUnits } from '../../../components/units.js';
import type { BenchFigure, BenchValues } from '../bench-form.js';
import type { LiveTest } from '../live-test.js';
import { t } from '../text.js';
import { BenchField } from './bench-field.js';

const SIZES = ['outerDiameterM', 'innerDiameterM', 'slotDepthM', 'slots', 'stackLengthM', 'ducts', 'ductWidthM', 'stackingFactor', 'densityKgPerM3'] as const;

/** The ring to scale, as it is typed, and the size it is drawn from. */
export function CoreColumn({ live }: { readonly live: LiveTest }) {
  const { control } = useFormContext<BenchValues>();
  const armature = live.readings.geometry.kind === 'armature';
  return (
    <section className="lb-bench-column" aria-label={t('core')}>
      <LiveRing live={live} />
      <div className="lb-bench-sizes">
        {SIZES.map((size) => (
          <BenchField key={size} name={`geometry.${size}` satisfies BenchFigure} label={t(armature && size === 'innerDiameterM' ? 'innerArmature' : size)} />
        ))}
      </div>
      <div className="lb-bench-pair">
        <ChoiceField
          control={control}
          name="geometry.kind"
          label={t('kind')}
          options={[
            { value: 'stator', label: t('stator') },
            { value: 'armature', label: t('armature') },
          ]}
        />
        <Iron live={live} />
      </div>
    </section>
  );
}

function LiveRing({ live }: { readonly live: LiveTest }) {
  const system = useUnits();
  const { result, flux, geometry } = live;
  const { excitingTurns } = live.readings.reading;
  const { hottestSlot, meanC, hottestC } = live.readings.temperatures;
  const turns = Number.isInteger(excitingTurns) && excitingTurns > 0 ? excitingTurns : 0;
  return (
    <Ring
      geometry={geometry}
      turns={turns}
      {...middleOf(live, system)}
      {...(turns > 0 && flux ? { cableWords: turns === 1 ? t('oneTurn', { volts: voltsEach(live, system) }) : t('turnsWords', { turns, volts: voltsEach(live, system) }) } : {})}
      {...(hottestSlot === undefined ? {} : { hottestSlot })}
      {...(hottestSlot !== undefined && meanC !== undefined && hottestC !== undefined ? { heat: new Map([[hottestSlot, hottestC - meanC]]), heatFullK: result?.hotSpotLimitK ?? 10 } : {})}
    />
  );
}

const voltsEach = ({ flux, readings }: LiveTest, system: 'si' | 'inch-pound') =>
  formatQuantity((flux?.wantedSearchVoltsV ?? 0) / readings.reading.searchTurns, 'voltage', system, { digits: 2 });

/** In the middle: watts per kilogram once there are any, else the flux while the volts go up. */
function middleOf({ result, flux, readings }: LiveTest, system: 'si' | 'inch-pound') {
  const share = (fluxT: number) => t('share', { flux: formatUsual(fluxT, 'flux-density', system), share: formatUsual(fluxT / readings.target.fluxDensityT, 'percent', system) });
  if (result) {
    return { reading: { figure: formatUsual(result.wattsPerKgReferred, 'specific-loss', system, { unit: false }), unit: unitOf('specific-loss', system), below: share(result.fluxDensityT) } };
  }
  if (flux?.fluxDensityT === undefined) return {};
  return {
    reading: {
      figure: formatUsual(flux.fluxDensityT, 'flux-density', system, { unit: false }),
      unit: unitOf('flux-density', system),
      below: t('ofTarget', { share: formatUsual(flux.fluxDensityT / readings.target.fluxDensityT, 'percent', system) }),
    },
  };
}

function Iron({ live }: { readonly live: LiveTest }) {
  const { geometry } = live;
  if (!geometry || geometryProblems(geometry).length > 0) return null;
  const derived = deriveGeometry(geometry);
  return (
    <dl className="lb-bench-facts">
      <div>
        <dt>{t('backIron')}</dt>
        <dd>
          <Quantity si={derived.backIronDepthM} kind="length" />
        </dd>
      </div>
      <div>
        <dt>{t('mass')}</dt>
        <dd>
          <Quantity si={derived.massKg} kind="mass" />
        </dd>
      </div>
    </dl>
  );
}
