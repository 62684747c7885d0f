import { type Drawing, type StripBar, ringDrawing, stripDrawing } from '@libs/drawings';
import { toShown, unitOf } from '@libs/quantities';
import type { CertificateModel, CoreTestOnPaper } from './certificate-model.js';
import { bareFigure, plateWords, signedPercent } from './figures.js';
import { CERTIFICATE, DRAWINGS } from './words.js';

/** The core's end view with the loop, the result in its bore and the hottest slot. */
export function ringOnPaper(model: CertificateModel, { input, result }: CoreTestOnPaper): Drawing {
  const { units } = model;
  const slot = input.temperatures.hottestSlot;
  const voltsPerTurn = bareFigure(result.voltsPerTurn, 'voltage', units, 2);
  return ringDrawing({
    geometry: input.geometry,
    turns: input.reading.excitingTurns,
    reading: {
      figure: bareFigure(result.wattsPerKgReferred, 'specific-loss', units),
      unit: unitOf('specific-loss', units),
      below: `${plateWords(input.target.fluxDensityT, 'flux-density', units, 3)}, ${plateWords(input.reading.frequencyHz, 'frequency', units)}`,
    },
    cableWords: DRAWINGS.turns(input.reading.excitingTurns, `${voltsPerTurn}\u00a0V`),
    ...(slot === undefined ? {} : { hottestSlot: slot, ...(result.hotSpotK === undefined ? {} : { heat: new Map([[slot, result.hotSpotK]]) }) }),
    ...(result.hotSpotLimitK === undefined ? {} : { heatFullK: result.hotSpotLimitK }),
  });
}

/** Longer than this a title would run into its bar. */
const LONGEST_LABEL = 12;

/** Before, the valid tests between, and the one that decides, on one scale of specific loss. */
export function stripOnPaper(model: CertificateModel): Drawing | null {
  const { coreBefore, coreAfter, coreBetween, units } = model;
  if (!coreBefore && !coreAfter) return null;
  const unit = unitOf('specific-loss', units);
  const shown = (wattsPerKg: number) => toShown(wattsPerKg, 'specific-loss', units);
  const bar = (label: string, { result }: CoreTestOnPaper): StripBar => ({
    label,
    value: shown(result.wattsPerKgReferred),
    uncertainty: shown(result.expandedUncertaintyWPerKg),
    words: `${bareFigure(result.wattsPerKgReferred, 'specific-loss', units)} ± ${bareFigure(result.expandedUncertaintyWPerKg, 'specific-loss', units)}`,
  });
  const between = coreBetween.filter(({ input, result }) => input.phase === 'after' && result.valid);
  return stripDrawing({
    before: coreBefore && bar(DRAWINGS.before, coreBefore),
    after: [...between.map((test, index) => bar(test.title.length <= LONGEST_LABEL ? test.title : DRAWINGS.afterNumber(index + 1), test)), ...(coreAfter ? [bar(DRAWINGS.after, coreAfter)] : [])],
    limit: limitOnStrip(model),
    increase: increaseOnStrip(model),
    unit,
  });
}

function limitOnStrip({ coreBefore, coreAfter, units }: CertificateModel) {
  if (!coreAfter) return null;
  const figure = (wattsPerKg: number) => bareFigure(wattsPerKg, 'specific-loss', units);
  const judged = (test: string) => coreAfter.result.judgements.find((judgement) => judgement.test === test && judgement.verdict !== 'shown-not-judged' && judgement.verdict !== 'not-valid')?.limit;
  const increase = judged('increase');
  if (coreBefore && increase !== undefined) {
    const wattsPerKg = coreBefore.result.wattsPerKgReferred * (1 + increase);
    return { value: toShown(wattsPerKg, 'specific-loss', units), words: `${CERTIFICATE.limit.toLowerCase()} ${signedPercent(increase)} (${figure(wattsPerKg)})` };
  }
  const absolute = judged('absolute');
  return absolute === undefined ? null : { value: toShown(absolute, 'specific-loss', units), words: `${CERTIFICATE.limit.toLowerCase()} ${figure(absolute)}` };
}

/** The drawing has words of its own for a test that is still to come; on a certificate nothing is. */
function increaseOnStrip({ coreBefore, coreAfter }: CertificateModel) {
  if (!coreAfter) return { figure: '', interval: '' };
  const { comparison, increaseEstablished } = coreAfter.result;
  if (comparison && increaseEstablished) return { figure: signedPercent(comparison.increase), interval: CERTIFICATE.increaseInterval(signedPercent(comparison.low), signedPercent(comparison.high)) };
  return coreBefore ? { figure: '', interval: `${CERTIFICATE.increaseNotEstablished}: ${CERTIFICATE.notComparable}` } : null;
}
