import { formatQuantity, type Kind, type UnitSystem } from '@libs/quantities';
import { defineText } from '../../lib/text.js';

const t = defineText({ yes: 'yes', no: 'no', none: 'not recorded', no_: 'no. {n}', of: '{part}: {name}' });

/** What every figure and choice of a record is called, and what kind of figure it is: for kept records, revisions and conflicts. */
const LEAVES: Record<string, readonly [label: string, kind?: Kind]> = {
  // core
  kind: ['Core is a'],
  outerDiameterM: ['Outside diameter', 'length'],
  innerDiameterM: ['Bore or inside diameter', 'length'],
  slotDepthM: ['Slot depth', 'length'],
  slots: ['Slots', 'count'],
  stackLengthM: ['Stack', 'length'],
  ducts: ['Ducts', 'count'],
  ductWidthM: ['Duct width', 'length'],
  stackingFactor: ['Stacking factor', 'number'],
  densityKgPerM3: ['Density', 'density'],
  basis: ['Target taken from'],
  fluxDensityT: ['Target flux', 'flux-density'],
  state: ['Core stands'],
  material: ['Material'],
  cablePath: ['Cable runs'],
  massBasis: ['Mass'],
  excitingTurns: ['Exciting turns', 'count'],
  searchTurns: ['Search turns', 'count'],
  searchVoltsV: ['Search-coil volts', 'voltage'],
  voltmeter: ['Voltmeter'],
  formFactor: ['Form factor', 'number'],
  excitingA: ['Exciting amps', 'current'],
  wattsW: ['Watts', 'power'],
  wattmeterLead: ['Wattmeter’s voltage lead'],
  cableResistanceOhm: ['Loop cable', 'resistance'],
  searchBurdenOhm: ['Meters’ resistance', 'resistance'],
  frequencyHz: ['Frequency', 'frequency'],
  ambientC: ['Ambient', 'temperature'],
  startC: ['Core at start', 'temperature'],
  meanC: ['Mean of the core', 'temperature'],
  coolestC: ['Coolest', 'temperature'],
  hottestC: ['Hottest', 'temperature'],
  hottestSlot: ['Hottest at slot', 'count'],
  minutes: ['Minutes at full flux', 'duration'],
  wattmeterRange: ['Wattmeter’s range'],
  clampMeter: ['Clamp meter used'],
  rotorOut: ['Rotor out'],
  leadsOpen: ['Leads open'],
  parallelsOpened: ['Parallels opened'],
  onePointEarthed: ['One point earthed'],
  throughBoltsMeasured: ['Through-bolts measured'],
  boreClear: ['Bore clear'],
  barrierUp: ['Barrier up'],
  supplyId: ['Supply'],
  cableId: ['Loop cable used'],
  parallelCables: ['Cables in parallel', 'count'],
  // workshop
  corePlate: ['Core plate'],
  frameMaterial: ['Frame'],
  commutatorOrSlipRings: ['Commutator or slip rings'],
  inspection: ['Seen'],
  fits: ['Fits'],
  method: ['Method'],
  ovenId: ['Oven'],
  commutatorOrSlipRingsOn: ['Commutator or slip rings on'],
  wiresCountedAtCut: ['Wires counted at the cut', 'count'],
  sampleCoilKept: ['Sample coil kept'],
  partPeakC: ['Part peak', 'temperature'],
  minutesAbove345C: ['Above 345 °C', 'duration'],
  sensorPosition: ['Sensor sat'],
  explanation: ['Explanation'],
  methods: ['Done'],
  slotFrom: ['From slot', 'count'],
  slotTo: ['To slot', 'count'],
  words: ['In words'],
  process: ['Process'],
  batch: ['Batch'],
  bakeTemperatureC: ['Bake temperature', 'temperature'],
  bakeMinutes: ['Bake time', 'duration'],
  cycles: ['Cycles', 'count'],
  bearingDriveEnd: ['Bearing, drive end'],
  bearingNonDriveEnd: ['Bearing, non-drive end'],
  grease: ['Grease'],
  turnsFreely: ['Shaft turns freely'],
  // winding
  poles: ['Poles', 'count'],
  layers: ['Layers', 'count'],
  coils: ['Coils', 'count'],
  turnsPerCoil: ['Turns of a coil', 'number'],
  spanFrom: ['Span from slot', 'count'],
  spanTo: ['Span to slot', 'count'],
  grouping: ['Grouping'],
  connection: ['Connection'],
  circuits: ['Circuits', 'count'],
  strands: ['Strands', 'count'],
  bareDiameterM: ['Bare diameter', 'wire-diameter'],
  coilExtensionM: ['Coil extension', 'length'],
  meanTurnM: ['Mean turn', 'length'],
  leads: ['Leads'],
  // electrical
  windingKind: ['Winding'],
  ratedVoltageV: ['Rated volts', 'voltage'],
  testVoltsV: ['Test volts', 'voltage'],
  resistanceOhm: ['After one minute', 'resistance-mega'],
  windingTemperatureC: ['Winding temperature', 'temperature'],
  correctionRule: ['Carried to 40 °C by'],
  tenMinuteResistanceOhm: ['After ten minutes', 'resistance-mega'],
  resistancesOhm: ['Resistance', 'resistance'],
  construction: ['Coils'],
  surgeDifferenceFraction: ['Surge difference', 'percent'],
  surgePeakV: ['Surge peak', 'voltage'],
  polarityRight: ['Polarity right'],
  case: ['Case'],
  secondaryVoltsV: ['Slip-ring volts', 'voltage'],
  ratedPowerW: ['Rated power', 'rated-power'],
  supply: ['Test supply'],
  appliedVoltsV: ['Applied', 'voltage'],
  seconds: ['Seconds', 'number'],
  held: ['Held'],
  voltsV: ['Volts', 'voltage'],
  ampsA: ['Amps', 'current'],
  lineResistanceOhm: ['Resistance between leads', 'resistance'],
  speedRpm: ['Speed', 'speed'],
  standard: ['Judged by'],
  mounting: ['Mounting'],
  shaftHeightM: ['Shaft height', 'length'],
  velocitiesMPerS: ['Vibration', 'vibration-velocity'],
  directionRight: ['Direction right'],
  driveEndC: ['Drive end', 'temperature'],
  nonDriveEndC: ['Non-drive end', 'temperature'],
  changeInHalfHourK: ['Change in half an hour', 'temperature-difference'],
  remark: ['Remark'],
};

const PARTS: Record<string, string> = {
  insulation: 'Insulation',
  windingResistance: 'Winding resistance',
  highPotential: 'High potential',
  noLoad: 'No load',
  vibration: 'Vibration',
  bearings: 'Bearings',
  wires: 'Wire',
  points: 'Point',
  frame: 'Frame',
  instruments: 'Instrument',
};

export interface SaidReading {
  readonly path: string;
  readonly label: string;
  readonly value: string;
}

/** Words of a choice: the code with its dashes taken out reads well enough in this trade. */
const choiceWords = (code: string) => code.replaceAll('-', ' ');

function valueWords(value: unknown, kind: Kind | undefined, name: string, system: UnitSystem, nameOf: (id: string) => string): string {
  if (value === null || value === undefined || value === '') return t('none');
  if (typeof value === 'boolean') return t(value ? 'yes' : 'no');
  if (typeof value === 'number') return kind ? formatQuantity(value, kind, system, { significant: kind === 'count' ? 20 : 6 }).replace(/(\.\d*?)0+(?=\D|$)/, '$1').replace(/\.(?=\D|$)/, '') : String(value);
  if (typeof value === 'string') return name.endsWith('Id') ? nameOf(value) : /^[a-z0-9]+(-[a-z0-9]+)*$/.test(value) ? choiceWords(value) : value;
  return t('none');
}

/** Every reading of a record in words, in the order it was recorded. */
export function saidReadings(readings: Record<string, unknown>, system: UnitSystem, nameOf: (id: string) => string = (id) => id): SaidReading[] {
  const said: SaidReading[] = [];
  const walk = (value: unknown, path: string, part: string, name: string, ordinal: string) => {
    if (Array.isArray(value)) {
      const plain = value.every((v) => typeof v === 'string');
      if (plain) said.push({ path, label: labelOf(name, part, ordinal), value: value.length === 0 ? t('none') : value.map((v) => choiceWords(String(v))).join(', ') });
      else value.forEach((v, i) => walk(v, `${path}.${i}`, typeof v === 'object' ? (PARTS[name] ?? part) : part, name, value.length > 1 ? `${ordinal} ${i + 1}`.trim() : ordinal));
    } else if (value !== null && typeof value === 'object') {
      for (const [key, inner] of Object.entries(value)) walk(inner, path === '' ? key : `${path}.${key}`, PARTS[name] ?? part, key, ordinal);
    } else if (value === null && name in PARTS && !(name in LEAVES)) {
      said.push({ path, label: PARTS[name]!, value: t('none') });
    } else {
      said.push({ path, label: labelOf(name, part, ordinal), value: valueWords(value, LEAVES[name]?.[1], name, system, nameOf) });
    }
  };
  for (const [key, value] of Object.entries(readings)) walk(value, key, '', key, '');
  return said.filter(({ path }) => path !== 'massBasis' && !path.endsWith('spanFrom'));
}

function labelOf(name: string, part: string, ordinal: string): string {
  const own = LEAVES[name]?.[0] ?? (name.endsWith('Id') ? choiceWords(name.slice(0, -2).replace(/[A-Z]/g, (c) => ` ${c.toLowerCase()}`)) : name);
  const numbered = ordinal === '' ? own : `${own} ${ordinal}`;
  return part === '' ? numbered : t('of', { part, name: numbered });
}

export interface ReadingChange {
  readonly label: string;
  readonly was: string;
  readonly is: string;
}
/** What differs between two readings of one record. */
export function changesBetween(was: Record<string, unknown>, is: Record<string, unknown>, system: UnitSystem, nameOf?: (id: string) => string): ReadingChange[] {
  const before = new Map(saidReadings(was, system, nameOf).map((r) => [r.path, r]));
  const after = new Map(saidReadings(is, system, nameOf).map((r) => [r.path, r]));
  return [...new Set([...before.keys(), ...after.keys()])].flatMap((path) => {
    const [a, b] = [before.get(path), after.get(path)];
    return a?.value === b?.value ? [] : [{ label: (a ?? b)!.label, was: a?.value ?? t('none'), is: b?.value ?? t('none') }];
  });
}
