import { Injectable } from '@nestjs/common';
import type { AmendRecord, MakeRecord, RecordInput, RecordKind, RecordView } from '@shared/records';
import type { JobState, Route, Step } from '@shared/route';
import type { Nameplate } from '@shared/machines';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { InstrumentsService, type InstrumentOnTheDay } from '../instruments/instruments.service.js';
import type { JobFacts } from '../jobs/job-facts.js';
import { JobFactsService } from '../jobs/job-facts.service.js';
import { Job } from '../jobs/job.entity.js';
import { Machine } from '../machines/machine.entity.js';
import { sha256 } from '../papers/paper-files.js';
import { evaluateRecord } from './evaluate-record.js';
import type { Evaluation } from './evaluation.js';
import { JobRecord } from './job-record.entity.js';
import { recordingProblem } from './record-rules.js';
import { RecordRevision } from './record-revision.entity.js';
import { RECORD_SELECT, toRecordView, type RecordRow } from './record-view.js';
import { RECORD_NAMES } from './record-names.js';

/** Test records: readings in, result computed here, every correction a revision. */
@Injectable()
export class RecordsService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
    private readonly facts: JobFactsService,
    private readonly instruments: InstrumentsService,
  ) {}

  async ofJob(jobId: string): Promise<RecordView[]> {
    if (!(await this.db.one('SELECT id FROM jobs WHERE id = ?', [jobId]))) throw notFound('job');
    const rows = await this.db.all<RecordRow>(`${RECORD_SELECT} AND v.revision = r.revision WHERE r.jobId = ? ORDER BY r.createdAt, r.id`, [jobId]);
    return rows.map(toRecordView);
  }

  async one(recordId: string): Promise<RecordView> {
    const row = await this.db.one<RecordRow>(`${RECORD_SELECT} AND v.revision = r.revision WHERE r.id = ?`, [recordId]);
    if (!row) throw notFound('record');
    return toRecordView(row);
  }

  async revisions(recordId: string): Promise<RecordView[]> {
    const rows = await this.db.all<RecordRow>(`${RECORD_SELECT} WHERE r.id = ? ORDER BY v.revision DESC`, [recordId]);
    if (rows.length === 0) throw notFound('record');
    return rows.map(toRecordView);
  }

  async make(actor: Actor, jobId: string, { record }: MakeRecord): Promise<RecordView> {
    const id = await this.unitOfWork.run(async (manager) => {
      const facts = await this.facts.load(manager, jobId);
      const already = await manager.countBy(JobRecord, { jobId, kind: record.kind });
      const problem = recordingProblem(facts, record.kind, already);
      if (problem) throw new AppError('STEP_NOT_OPEN', problem);
      const derived = await this.derive(manager, jobId, record, facts);
      const head = { id: this.ids.next(), jobId, machineId: derived.job.machineId, kind: record.kind, ordinal: already + 1, revision: 1, ...derived.figures, createdAt: this.clock.iso(), version: 1 };
      await manager.insert(JobRecord, head);
      await this.keepRevision(manager, actor, head, record, derived, '');
      await this.history.record(manager, {
        actor,
        subject: { kind: 'record', id: head.id },
        jobId,
        event: `${record.kind}.recorded`,
        words: `${RECORD_NAMES[record.kind]}${head.ordinal > 1 ? ` no. ${head.ordinal}` : ''} recorded${derived.figures.verdict ? `: ${VERDICT_WORDS[derived.figures.verdict] ?? derived.figures.verdict}` : ''}.`,
        data: { revision: 1, verdict: derived.figures.verdict, wattsPerKg: derived.figures.wattsPerKg },
      });
      return head.id;
    });
    return this.one(id);
  }

  /** A correction: the old revision stays, and signatures given for it do not count for the new one. */
  async amend(actor: Actor, recordId: string, input: AmendRecord): Promise<RecordView> {
    await this.unitOfWork.run(async (manager) => {
      const head = await manager.findOneBy(JobRecord, { id: recordId });
      if (!head) throw notFound('record');
      if (head.kind !== input.record.kind) throw new AppError('INPUT_NOT_VALID', 'A record stays of its kind.');
      if (head.version !== input.version) throw changedMeanwhile('record', await this.currentIn(manager, recordId));
      const facts = withoutRecord(await this.facts.load(manager, head.jobId), head.kind, head.ordinal);
      const derived = await this.derive(manager, head.jobId, input.record, facts);
      const next = { ...head, revision: head.revision + 1, version: head.version + 1, ...derived.figures };
      await manager.update(JobRecord, { id: recordId }, { revision: next.revision, version: next.version, ...derived.figures });
      await this.keepRevision(manager, actor, next, input.record, derived, input.reason);
      await this.history.record(manager, {
        actor,
        subject: { kind: 'record', id: recordId },
        jobId: head.jobId,
        event: `${head.kind}.corrected`,
        words: `${RECORD_NAMES[head.kind]} corrected (revision ${next.revision}): ${input.reason}`,
        data: { from: { revision: head.revision, verdict: head.verdict }, to: { revision: next.revision, verdict: derived.figures.verdict } },
      });
    });
    return this.one(recordId);
  }

  private async currentIn(manager: EntityManager, recordId: string): Promise<RecordView> {
    const [row] = await manager.query<RecordRow[]>(`${RECORD_SELECT} AND v.revision = r.revision WHERE r.id = ?`, [recordId]);
    return toRecordView(row!);
  }

  private async derive(manager: EntityManager, jobId: string, record: RecordInput, facts: JobFacts): Promise<Derived> {
    const job = await manager.findOneByOrFail(Job, { id: jobId });
    const machine = await manager.findOneByOrFail(Machine, { id: job.machineId });
    const instruments = await this.instruments.onTheDay(manager, instrumentIds(record));
    const evaluation = evaluateRecord(record, { facts, machine: { nameplate: machine.nameplate as Nameplate }, instrumentsPastGrace: instruments.filter((i) => i.overdueOnTheDay).map((i) => i.tag) });
    if (evaluation.problems.length > 0) {
      throw new AppError('READINGS_NOT_VALID', 'Some readings cannot be right; see the fields. Nothing was saved, and nothing you typed is lost.', {
        fields: evaluation.problems.map((p) => ({ ...p, path: `record.readings.${p.path}` })),
      });
    }
    if (record.kind === 'core-test-before' || record.kind === 'core-test-after') {
      await manager.update(Machine, { id: machine.id }, { coreGeometry: record.readings.geometry });
    }
    return { job, evaluation, instruments, limitsVersion: job.limitsVersion, figures: { verdict: evaluation.verdict, wattsPerKg: evaluation.wattsPerKg, increase: evaluation.increase } };
  }

  private async keepRevision(manager: EntityManager, actor: Actor, head: { id: string; revision: number }, record: RecordInput, derived: Derived, reason: string): Promise<void> {
    const content = { recordId: head.id, revision: head.revision, readings: record.readings, entered: record.entered, result: derived.evaluation.result, limitsVersion: derived.limitsVersion, instruments: derived.instruments };
    await manager.insert(RecordRevision, {
      id: this.ids.next(),
      recordId: head.id,
      revision: head.revision,
      readings: record.readings as never,
      entered: record.entered as never,
      result: derived.evaluation.result as never,
      verdict: derived.evaluation.verdict,
      calculation: derived.evaluation.calculation,
      limitsVersion: derived.limitsVersion,
      instruments: derived.instruments as never,
      reason,
      byUserId: actor.userId!,
      byName: actor.name,
      at: this.clock.iso(),
      contentHash: sha256(JSON.stringify(content)),
    });
  }
}

interface Derived {
  readonly job: { readonly machineId: string; readonly route: Route; readonly step: Step; readonly state: JobState };
  readonly evaluation: Evaluation;
  readonly instruments: readonly InstrumentOnTheDay[];
  readonly limitsVersion: number;
  readonly figures: { readonly verdict: string | null; readonly wattsPerKg: number | null; readonly increase: number | null };
}

const VERDICT_WORDS: Record<string, string> = { conforms: 'conforms', 'does-not-conform': 'does not conform', inconclusive: 'inconclusive', 'not-valid': 'not valid' };

/** A corrected test is judged by what stood before it, not by itself or by what came later. */
function withoutRecord(facts: JobFacts, kind: RecordKind, ordinal: number): JobFacts {
  return { ...facts, records: facts.records.filter((r) => r.kind !== kind || r.ordinal < ordinal) };
}

function instrumentIds(record: RecordInput): string[] {
  const instruments = (record.readings as { instruments?: Record<string, unknown> }).instruments ?? {};
  return Object.entries(instruments).flatMap(([key, value]) => (key.endsWith('Id') && typeof value === 'string' ? [value] : []));
}
