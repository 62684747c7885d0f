import type { Kind } from '@libs/quantities';
import { type Block, type Cell, type Run, type TableRow, cell } from '../press/blocks.js';
import { verdictRuns } from './certificate-core.js';
import type { CertificateModel, CoreTestOnPaper } from './certificate-model.js';
import { momentWords } from './dates.js';
import { bareFigure, figureRuns, plateWords } from './figures.js';
import { type Field, TYPE, fields, heading } from './paper-head.js';
import type { PaperUnits } from './paper-model.js';
import { CABLE_PATH_WORDS, CERTIFICATE, COMMON, FRAME_MATERIAL_WORDS, FRAME_WORDS, READINGS, TARGET_WORDS, VOLTMETER_WORDS, WATTMETER_LEAD_WORDS } from './words.js';

/** More tests than this stand in a second table. */
const TESTS_ABREAST = 4;

type Told = (test: CoreTestOnPaper, units: PaperUnits) => readonly Run[] | null;
interface ReadingRow {
  readonly name: string;
  readonly told: Told;
  readonly strong?: boolean;
}

const text = (value: string): readonly Run[] | null => (value === '' ? null : [{ text: value }]);
const measured =
  (kind: Kind, pick: (test: CoreTestOnPaper) => number | undefined, strong = false): Told =>
  (test, units) => {
    const value = pick(test);
    return value === undefined ? null : figureRuns(value, kind, units, { bold: strong });
  };

/** Rows in the order of the work: set-up, readings, what they reduce to, temperatures. */
const ROWS: readonly ReadingRow[] = [
  { name: READINGS.by, told: (test) => text(test.testedBy) },
  { name: READINGS.frame, told: ({ input }) => text(frameWords(input.frame.state, input.frame.material)) },
  { name: READINGS.cablePath, told: ({ input }) => text(CABLE_PATH_WORDS[input.cablePath]) },
  { name: READINGS.target, told: ({ input }, units) => [...figureRuns(input.target.fluxDensityT, 'flux-density', units), { text: `, ${TARGET_WORDS[input.target.basis]}`, ink: 'muted' }] },
  { name: READINGS.frequency, told: ({ input }, units) => text(plateWords(input.reading.frequencyHz, 'frequency', units)) },
  { name: READINGS.turns, told: ({ input }) => text(`${input.reading.excitingTurns} / ${input.reading.searchTurns}`) },
  { name: READINGS.searchVolts, told: ({ input }, units) => [...figureRuns(input.reading.searchVoltsV, 'voltage', units, { digits: 3 }), { text: `, ${VOLTMETER_WORDS[input.reading.voltmeter]}`, ink: 'muted' }] },
  { name: READINGS.formFactor, told: ({ input }) => (input.reading.formFactor === undefined ? null : text(input.reading.formFactor.toFixed(4))) },
  { name: READINGS.amps, told: measured('current', ({ input }) => input.reading.excitingA) },
  { name: READINGS.watts, told: ({ input }, units) => [...figureRuns(input.reading.wattsW, 'power', units, { digits: 2 }), { text: `, ${WATTMETER_LEAD_WORDS[input.reading.wattmeterLead]}`, ink: 'muted' }] },
  { name: READINGS.cableLoss, told: measured('power', ({ result }) => result.cableLossW) },
  { name: READINGS.flux, told: measured('flux-density', ({ result }) => result.fluxDensityT, true) },
  { name: READINGS.excitingVolts, told: measured('voltage', ({ result }) => result.excitingVoltsV) },
  { name: READINGS.coreWatts, told: measured('power', ({ result }) => result.coreWatts) },
  { name: READINGS.atFlux, told: measured('specific-loss', ({ result }) => result.wattsPerKg) },
  {
    name: READINGS.referred,
    strong: true,
    told: ({ result }, units) => {
      const [figure, unit] = figureRuns(result.wattsPerKgReferred, 'specific-loss', units, { bold: true });
      const band: Run = { text: `\u00a0±\u00a0${bareFigure(result.expandedUncertaintyWPerKg, 'specific-loss', units)}` };
      return [...(figure ? [figure] : []), band, ...(unit ? [unit] : [])];
    },
  },
  { name: READINGS.kva, told: measured('apparent-power', ({ result }) => result.apparentVA) },
  { name: READINGS.vaPerKg, told: measured('specific-apparent-power', ({ result }) => result.vaPerKg) },
  { name: READINGS.powerFactor, told: measured('number', ({ result }) => result.powerFactor) },
  { name: READINGS.field, told: measured('field', ({ result }) => result.fieldRmsAPerM) },
  { name: READINGS.innerEdge, told: measured('flux-density', ({ result }) => result.innerEdgeFluxT) },
  { name: READINGS.ambientAndStart, told: ({ input }, units) => [{ text: `${bareFigure(input.temperatures.ambientC, 'temperature', units)} / ` }, ...figureRuns(input.temperatures.startC, 'temperature', units)] },
  { name: READINGS.minutes, told: measured('duration', ({ input }) => input.temperatures.minutes) },
  { name: READINGS.mean, told: measured('temperature', ({ input }) => input.temperatures.meanC) },
  {
    name: READINGS.hottest,
    told: ({ input }, units) => {
      const { hottestC, hottestSlot } = input.temperatures;
      if (hottestC === undefined) return null;
      return [...figureRuns(hottestC, 'temperature', units), ...(hottestSlot === undefined ? [] : [{ text: `, ${READINGS.slot(hottestSlot)}`, ink: 'muted' as const }])];
    },
  },
  {
    name: READINGS.hotSpot,
    told: ({ result }, units) => {
      if (result.hotSpotK === undefined) return null;
      const limit = result.hotSpotLimitK === undefined ? [] : [{ text: `, ${CERTIFICATE.limit.toLowerCase()} ${bareFigure(result.hotSpotLimitK, 'temperature-difference', units)}`, ink: 'muted' as const }];
      return [...figureRuns(result.hotSpotK, 'temperature-difference', units, { bold: true }), ...limit];
    },
  },
  { name: CERTIFICATE.verdict, told: ({ result }) => verdictRuns(result.verdict) },
  { name: READINGS.why, told: ({ result }) => text(result.validityReasons.map((reason) => reason.words).join(' ')) },
  { name: READINGS.warnings, told: ({ result }) => text(result.warnings.map((warning) => warning.words).join(' ')) },
  { name: CERTIFICATE.remark, told: (test) => text(test.remark) },
  { name: READINGS.calculation, told: ({ result }) => text(result.calculation) },
];

export function readingBlocks(model: CertificateModel): Block[] {
  const tests = [model.coreBefore, ...model.coreBetween, model.coreAfter].filter((test) => test !== null);
  if (tests.length === 0) return [];
  const blocks: Block[] = [...heading(CERTIFICATE.readings)];
  for (let from = 0; from < tests.length; from += TESTS_ABREAST) blocks.push(readingTable(tests.slice(from, from + TESTS_ABREAST), model));
  const last = tests.at(-1);
  if (last) blocks.push(...coreSize(last, model.units));
  return blocks;
}

function readingTable(tests: readonly CoreTestOnPaper[], model: CertificateModel): Block {
  const rows = ROWS.flatMap((row): TableRow[] => {
    const told = tests.map((test) => row.told(test, model.units));
    if (told.every((runs) => runs === null)) return [];
    return [{ cells: [cell(row.name, row.strong ? { weight: 'bold' } : { ink: 'muted' }), ...told.map((runs): Cell => ({ runs: runs ?? [{ text: COMMON.none, ink: 'muted' }] }))] }];
  });
  return {
    kind: 'table',
    sizePt: TYPE.table,
    paddingPt: 1.1,
    columns: [{ widthPt: 128 }, ...tests.map(() => ({ share: 1 }))],
    head: [
      cell(CERTIFICATE.quantity, { ink: 'muted' }),
      ...tests.map((test): Cell => ({ runs: [{ text: test.title, weight: 'bold' }, { text: `\n${momentWords(test.testedAt, model.timeZone)}`, ink: 'muted' }] })),
    ],
    rows,
  };
}

function frameWords(state: keyof typeof FRAME_WORDS, material: keyof typeof FRAME_MATERIAL_WORDS): string {
  const of = FRAME_MATERIAL_WORDS[material];
  return state === 'in-frame' && of !== '' ? `${FRAME_WORDS[state]}, ${of}` : FRAME_WORDS[state];
}

/** The core as measured, and what follows from its size. */
function coreSize(test: CoreTestOnPaper, units: PaperUnits): Block[] {
  const { geometry } = test.input;
  const derived = test.result.geometry;
  const armature = geometry.kind === 'armature';
  const of = (kind: Kind, value: number): readonly Run[] => figureRuns(value, kind, units);
  const measuredSize: Field[] = [
    [READINGS.outerDiameter, of('length', geometry.outerDiameterM)],
    [armature ? READINGS.innerDiameter : READINGS.bore, of('length', geometry.innerDiameterM)],
    [READINGS.slots, [{ text: `${geometry.slots}, ${READINGS.deep} ` }, ...of('length', geometry.slotDepthM)]],
    [READINGS.stack, of('length', geometry.stackLengthM)],
    [READINGS.ducts, geometry.ducts === 0 ? READINGS.noDucts : [{ text: `${geometry.ducts} × ` }, ...of('length', geometry.ductWidthM)]],
    [READINGS.stacking, geometry.stackingFactor.toFixed(2)],
    [READINGS.density, of('density', geometry.densityKgPerM3)],
  ];
  const follows: Field[] = [
    [READINGS.backIron, of('length', derived.backIronDepthM)],
    [READINGS.netLength, of('length', derived.netLengthM)],
    [READINGS.area, of('area', derived.areaM2)],
    [READINGS.path, of('length', derived.meanPathM)],
    [READINGS.mass, of('mass', derived.massKg)],
  ];
  return [
    ...heading(armature ? READINGS.sizeOfArmature : READINGS.sizeOfStator),
    {
      kind: 'columns',
      gapPt: 24,
      columns: [
        { share: 1, blocks: fields(measuredSize, 128) },
        { share: 1, blocks: fields(follows, 128) },
      ],
    },
  ];
}
