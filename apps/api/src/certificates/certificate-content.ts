import type { CoreTestResult } from '@libs/core-loss';
import type { BurnoutOnPaper, CertificateModel, CoreTestOnPaper, InstrumentOnPaper, MissingBeforeTest, SignatureOnPaper, StatementOnPaper, TestRowOnPaper, VerdictOnPaper } from '@libs/documents';
import type { StripResult } from '@shared/burnout-limit';
import type { ReadingsOf, RecordKind } from '@shared/records';
import type { WAIVER_REASONS } from '@shared/waivers';
import { coreTestInput } from '../records/evaluate-record.js';
import { RECORD_NAMES } from '../records/record-names.js';
import type { CertifiedRecord, CertifiedSignOff } from './certificate-source.js';
import { finalTestRows } from './final-test-rows.js';
import { windingRows } from './winding-rows.js';

export type CertificateContent = Pick<
  CertificateModel,
  'coreBefore' | 'coreAfter' | 'coreBetween' | 'missingBefore' | 'statements' | 'burnouts' | 'winding' | 'finalTests' | 'instruments' | 'signatures'
>;

/** Turns a job's records and signatures into what its certificate says. */
export function certificateContent(records: readonly CertifiedRecord[], signOffs: readonly CertifiedSignOff[]): CertificateContent {
  const of = (kind: RecordKind) => records.filter((r) => r.kind === kind);
  const befores = of('core-test-before');
  const before = befores.filter((r) => r.verdict !== 'not-valid').at(-1) ?? null;
  const afters = of('core-test-after');
  const after = afters.at(-1) ?? null;
  const between = [...befores.filter((r) => r !== before), ...afters.filter((r) => r !== after)].sort((a, b) => (a.id < b.id ? -1 : 1));
  const found = of('winding-as-found').at(-1)?.readings as ReadingsOf<'winding-as-found'> | undefined;
  const wound = of('winding-as-wound').at(-1)?.readings as ReadingsOf<'winding-as-wound'> | undefined;
  return {
    coreBefore: before && coreTest(before, 'before'),
    coreAfter: after && coreTest(after, afterTitle(after, records)),
    coreBetween: between.map((r) => coreTest(r, r.kind === 'core-test-before' ? 'before, not valid' : `after, no. ${r.ordinal}`)),
    missingBefore: before ? null : missingBefore(signOffs),
    statements: statements(records, signOffs),
    burnouts: of('strip').map(burnout),
    winding: windingRows(found, wound),
    finalTests: of('final-test').slice(-1).flatMap((r): TestRowOnPaper[] => finalTestRows(r.result)),
    instruments: instrumentsOf([...(before ? [before] : []), ...afters, ...of('final-test').slice(-1)]),
    signatures: signaturesOf(signOffs),
  };
}

function coreTest(record: CertifiedRecord, title: string): CoreTestOnPaper {
  const readings = record.readings as ReadingsOf<'core-test-before'>;
  return {
    title,
    testedAt: record.at,
    testedBy: record.byName,
    input: coreTestInput(record.kind === 'core-test-before' ? 'before' : 'after', readings),
    result: record.result as unknown as CoreTestResult,
    remark: readings.remark,
  };
}

function afterTitle(after: CertifiedRecord, records: readonly CertifiedRecord[]): string {
  if (records.some((r) => r.kind === 'core-repair' && r.id < after.id)) return 'after core repair';
  const strip = records.filter((r) => r.kind === 'strip' && r.id < after.id).at(-1);
  return strip?.readings['method'] === 'oven-burnout' ? 'after burnout' : 'after strip';
}

function missingBefore(signOffs: readonly CertifiedSignOff[]): MissingBeforeTest | null {
  const waiver = signOffs.filter((s) => s.kind === 'waiver').at(-1);
  if (!waiver) return null;
  const countersignature = signOffs.find((s) => s.kind === 'waiver-countersignature' && s.refersTo === waiver.id);
  return {
    reason: waiver.detail['reason'] as (typeof WAIVER_REASONS)[number],
    words: waiver.reason,
    askedBy: waiver.byName,
    askedAt: waiver.at,
    countersignature: countersignature ? signature(countersignature, 'countersigned') : null,
  };
}

function statements(records: readonly CertifiedRecord[], signOffs: readonly CertifiedSignOff[]): StatementOnPaper[] {
  const kinds = { concession: 'concession', 'inconclusive-release': 'inconclusive-release' } as const;
  return signOffs.flatMap((s): StatementOnPaper[] => {
    const kind = kinds[s.kind as keyof typeof kinds];
    if (!kind) return [];
    const record = records.find((r) => r.id === s.recordId);
    const decision = signOffs.find((d) => d.id === s.refersTo && d.kind === 'decision');
    return [
      {
        kind,
        about: record ? `${RECORD_NAMES[record.kind]}${record.ordinal > 1 ? ` no. ${record.ordinal}` : ''}` : 'Core test after',
        words: s.reason,
        customerAnswer: decision
          ? { choice: String(decision.detail['choice']), by: String(decision.detail['answeredBy']), channel: String(decision.detail['channel']), at: decision.at, words: decision.reason }
          : null,
        signature: signature(s, 'conceded'),
      },
    ];
  });
}

const METHOD_WORDS: Record<ReadingsOf<'strip'>['method'], string> = {
  'oven-burnout': 'burnout oven',
  'warm-pull': 'pulled warm, no oven',
  'cold-pull': 'pulled cold, no oven',
  'water-jet': 'water jet, no oven',
  chemical: 'chemical, no oven',
};

function burnout(record: CertifiedRecord): BurnoutOnPaper {
  const readings = record.readings as ReadingsOf<'strip'>;
  const result = record.result as unknown as StripResult;
  return {
    method: readings.method === 'oven-burnout' ? `oven ${readings.ovenId ?? ''}`.trim() : METHOD_WORDS[readings.method],
    startedAt: record.at,
    partPeakC: readings.partPeakC,
    limitC: result.limitC,
    limitReason: result.limitReason,
    minutesAbove: readings.minutesAbove345C === null ? null : { thresholdC: 345, minutes: readings.minutesAbove345C },
    verdict: (record.verdict ?? 'not-valid') as VerdictOnPaper,
    remark: readings.explanation,
  };
}

/** Each instrument once, with what it was used for. */
function instrumentsOf(records: readonly CertifiedRecord[]): InstrumentOnPaper[] {
  const seen = new Map<string, InstrumentOnPaper & { uses: Set<string> }>();
  for (const record of records) {
    for (const i of record.instruments) {
      const entry = seen.get(i.id) ?? { use: '', name: `${i.tag}${i.description ? `, ${i.description}` : ''}`, serial: i.serial, calibratedOn: i.calibratedOn, dueOn: i.dueOn, uses: new Set<string>() };
      entry.uses.add(record.kind === 'final-test' ? 'final test' : 'core test');
      seen.set(i.id, entry);
    }
  }
  return [...seen.values()].map(({ uses, ...i }) => ({ ...i, use: [...uses].join(', ') }));
}

const ACTS: Partial<Record<CertifiedSignOff['kind'], SignatureOnPaper['act']>> = { tested: 'tested', 'released-by-second': 'released', 'waiver-countersignature': 'countersigned', concession: 'conceded', 'inconclusive-release': 'conceded' };

/** The last signature of each act; older ones were for revisions that are corrected since. */
function signaturesOf(signOffs: readonly CertifiedSignOff[]): SignatureOnPaper[] {
  const last = new Map<string, SignatureOnPaper>();
  for (const s of signOffs) {
    const act = ACTS[s.kind];
    if (act) last.set(s.kind, signature(s, act));
  }
  return [...last.values()];
}

function signature(s: CertifiedSignOff, act: SignatureOnPaper['act']): SignatureOnPaper {
  return { act, name: s.byName, role: s.byRoles, at: s.at, contentHash: s.contentHash };
}
