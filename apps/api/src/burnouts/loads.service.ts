import type { Readable } from 'node:stream';
import { Injectable } from '@nestjs/common';
import type { CorrectLoad, CreateLoad, LoadView, LoggerFileQuery } from '@shared/burnouts';
import type { FastifyRequest } from 'fastify';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { BurnoutLoad } from './burnout-load.entity.js';
import { judgeLoad, type LoadJudgement } from './judge-load.js';
import type { KeptRead } from './kept-read.js';
import { fileOf, LoadHeadsService, type LoadHead } from './load-heads.service.js';
import { loadLimit } from './load-limit.js';
import { LoadReadService } from './load-read.service.js';
import { loadWords } from './load-words.js';
import { LoadedJobsService, type LoadedJob } from './loaded-jobs.service.js';
import { LoggerFilesService } from './logger-files.service.js';
import { guessPartChannels } from './part-channels.js';

const NOT_JUDGED = { verdict: null, reasons: [], hottest: null, peakC: null, minutesAboveLimit: null, minutesAbove345C: null };
const NO_FILE = { fileName: null, storedName: null, sizeBytes: null, sha256: null, readAt: null, hints: {}, read: null, partChannels: null };
type Judged = LoadJudgement | typeof NOT_JUDGED;

/** Puts jobs into an oven together, takes in what its logger wrote, and puts right what was said. */
@Injectable()
export class LoadsService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
    private readonly heads: LoadHeadsService,
    private readonly loaded: LoadedJobsService,
    private readonly loads: LoadReadService,
    private readonly files: LoggerFilesService,
  ) {}

  async create(actor: Actor, input: CreateLoad): Promise<LoadView> {
    const id = this.ids.next();
    await this.unitOfWork.run(async (manager) => {
      const { jobs, limit, ovenName } = await this.loaded.checked(manager, input);
      const number = await this.heads.nextNumber(manager);
      const load = { id, number, ovenId: input.ovenId, ovenName, day: input.day, remark: input.remark, ...limit, offsetK: 0, ...NOT_JUDGED, ...NO_FILE, byUserId: actor.userId!, byName: actor.name, createdAt: this.clock.iso(), version: 1 };
      await manager.insert(BurnoutLoad, load as never);
      await this.loaded.put(manager, id, jobs);
      await this.tell(manager, actor, load, jobs, 'burnout.loaded', loadWords(load), { ovenId: load.ovenId, day: load.day, limitC: limit.limitC, jobs: jobs.map((j) => j.number) });
    });
    return this.loads.one(id);
  }

  /** Received and read before the unit begins; a limit that changed on the way asks to try again. */
  async takeFile(actor: Actor, id: string, { version, reason, ...hints }: LoggerFileQuery, request: FastifyRequest): Promise<LoadView> {
    const before = await this.heads.at(this.db, id, version);
    if (before.storedName !== null && reason === '') throw new AppError('ALREADY_DONE', 'This load has its file already. Say why another one takes its place.', { fields: [{ path: 'reason', code: 'missing', message: 'Say why another file takes its place.' }] });
    const { limitC } = loadLimit((await this.loaded.inLoad(this.db, id)).map((j) => j.limit));
    const { file, read } = await this.files.takeIn(request, { limitC, offsetK: 0, hints });
    try {
      await this.unitOfWork.run(async (manager) => {
        const head = await this.heads.at(manager, id, version);
        const jobs = await this.loaded.inLoad(manager, id);
        const limit = loadLimit(jobs.map((j) => j.limit));
        await this.assertSameLimit(manager, id, limit.limitC, limitC);
        const partChannels = guessPartChannels(read.channels.map((c) => c.name));
        const next = { ...head, ...limit, ...file, offsetK: 0, partChannels, readAt: this.clock.iso(), version: version + 1, ...judgeLoad(read, limitC, partChannels) };
        await this.keep(manager, next, read, jobs);
        const words = reason === '' ? loadWords(next) : `Load ${head.number}, another file: ${reason} ${loadWords(next)}`;
        await this.tell(manager, actor, next, jobs, 'burnout.read', words, { file: file.fileName, sha256: file.sha256, limitC, verdict: next.verdict, peakC: next.peakC, ...(head.sha256 === null ? {} : { instead: { file: head.fileName, sha256: head.sha256 } }) });
      });
    } catch (error) {
      await this.files.remove(file.storedName);
      throw error;
    }
    return this.loads.one(id);
  }

  /** The kept file is read again, and the load judged anew by the limits its parts have now. */
  async correct(actor: Actor, id: string, input: CorrectLoad): Promise<LoadView> {
    const before = await this.heads.at(this.db, id, input.version);
    const already = await this.loaded.inLoad(this.db, id);
    const { limitC } = (await this.loaded.checked(this.db, input, already)).limit;
    const file = fileOf(before);
    const read = file && (await this.files.readAgain(file, { limitC, offsetK: input.offsetK }));
    const partChannels = read && channelsOf(read, input.partChannels);
    await this.unitOfWork.run(async (manager) => {
      const head = await this.heads.at(manager, id, input.version);
      const { jobs, limit, ovenName } = await this.loaded.checked(manager, input, already);
      await this.assertSameLimit(manager, id, limit.limitC, limitC);
      const judged: Judged = read && partChannels ? judgeLoad(read, limitC, partChannels) : NOT_JUDGED;
      const next = { ...head, ovenId: input.ovenId, ovenName, day: input.day, remark: input.remark, ...limit, offsetK: input.offsetK, partChannels, version: input.version + 1, ...judged };
      await this.keep(manager, next, read, jobs);
      const touched = [...jobs, ...already.filter((j) => !jobs.some((now) => now.jobId === j.jobId))];
      await this.tell(manager, actor, next, touched, 'burnout.corrected', `Load ${head.number} corrected: ${input.reason} ${loadWords(next)}`, { from: shortOf(head, already), to: shortOf(next, jobs) });
    });
    return this.loads.one(id);
  }

  async openFile(id: string): Promise<{ stream: Readable; name: string; length: number }> {
    const file = fileOf(await this.heads.one(this.db, id));
    if (!file) throw notFound('file');
    return { stream: await this.files.open(file), name: file.fileName, length: file.sizeBytes };
  }

  private async keep(manager: EntityManager, { id, number: _number, ...head }: LoadHead, read: KeptRead | null, jobs: readonly LoadedJob[]): Promise<void> {
    await manager.update(BurnoutLoad, { id }, { ...head, read } as never);
    await this.loaded.put(manager, id, jobs);
  }

  private async assertSameLimit(manager: EntityManager, id: string, now: number, before: number): Promise<void> {
    if (now !== before) throw changedMeanwhile('load', await this.loads.one(id, manager));
  }

  /** One entry for each job: whoever opens one of them sees what its oven did. */
  private async tell(manager: EntityManager, actor: Actor, load: Pick<LoadHead, 'id' | 'number'>, jobs: readonly LoadedJob[], event: string, words: string, data: Record<string, unknown>): Promise<void> {
    for (const { jobId } of jobs) await this.history.record(manager, { actor, subject: { kind: 'burnout-load', id: load.id }, jobId, event, words, data: { load: load.number, ...data } });
  }
}

const shortOf = (load: LoadHead, jobs: readonly LoadedJob[]) => ({ ovenId: load.ovenId, day: load.day, limitC: load.limitC, offsetK: load.offsetK, partChannels: load.partChannels, verdict: load.verdict, peakC: load.peakC, jobs: jobs.map((j) => j.number) });

function channelsOf(read: KeptRead, asked: readonly string[] | null): string[] {
  const names = read.channels.map((c) => c.name);
  if (asked === null) return guessPartChannels(names);
  const strange = asked.filter((name) => !names.includes(name));
  if (strange.length > 0) throw new AppError('READINGS_NOT_VALID', 'The file has no such thermocouple.', { fields: [{ path: 'partChannels', code: 'no-such-channel', message: `The file has no thermocouple called ${strange.join(', ')}.` }] });
  return [...new Set(asked)];
}
