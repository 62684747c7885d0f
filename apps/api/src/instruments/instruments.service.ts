import { Inject, Injectable } from '@nestjs/common';
import type { BayView, CreateInstrument, InstrumentView, UpdateInstrument } from '@shared/instruments';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { shopDate } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import type { QuerySource } from '../database/query-source.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { ShopService } from '../shop/shop.service.js';
import { calibrationStanding, pastGrace } from './calibration-state.js';
import { InstrumentCalibration } from './instrument-calibration.entity.js';
import { Instrument } from './instrument.entity.js';

type Row = Omit<InstrumentView, 'standing'>;
const COLUMNS = 'id, tag, kind, description, serial, percentOfReading, percentOfRange, rangeText, calibratedOn, dueOn, certificateNumber, version';

/** A change of any of these is told in the history of calibrations. */
const CALIBRATION = ['calibratedOn', 'dueOn', 'certificateNumber', 'percentOfReading', 'percentOfRange'] as const;

const taken = () => new AppError('TAKEN', 'An instrument has this tag already.', { fields: [{ path: 'tag', code: 'taken', message: 'An instrument has this tag already.' }] });

/** An instrument as it stood on the day it was used: kept with the record. */
export interface InstrumentOnTheDay {
  readonly id: string;
  readonly tag: string;
  readonly description: string;
  readonly serial: string;
  readonly dueOn: string;
  readonly calibratedOn: string;
  readonly certificateNumber: string;
  readonly overdueOnTheDay: boolean;
}

/** The register of instruments, and what the bay has. */
@Injectable()
export class InstrumentsService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
    private readonly shop: ShopService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  private today(): string {
    return shopDate(this.clock.now(), this.config.timeZone);
  }

  async list(): Promise<InstrumentView[]> {
    const today = this.today();
    const rows = await this.db.all<Row>(`SELECT ${COLUMNS} FROM instruments ORDER BY tag`);
    return rows.map((row) => ({ ...row, standing: calibrationStanding(row.dueOn, today) }));
  }

  async one(id: string): Promise<InstrumentView> {
    const row = await this.db.one<Row>(`SELECT ${COLUMNS} FROM instruments WHERE id = ?`, [id]);
    if (!row) throw notFound('instrument');
    return { ...row, standing: calibrationStanding(row.dueOn, this.today()) };
  }

  async bay(): Promise<BayView> {
    const equipment = await this.shop.bay();
    return {
      supplies: equipment.supplies.map(({ tapsV, ...s }) => ({ ...s, ...(tapsV ? { tapsV: [...tapsV] } : {}) })),
      cables: equipment.cables.map((c) => ({ ...c })),
      ovens: equipment.ovens.map(({ id, name, remark }) => ({ id, name, remark })),
      instruments: await this.list(),
    };
  }

  async create(actor: Actor, input: CreateInstrument): Promise<InstrumentView> {
    return this.unitOfWork.run(async (manager) => {
      if (await manager.existsBy(Instrument, { tag: input.tag })) throw taken();
      const instrument = { id: this.ids.next(), ...input, version: 1 };
      await manager.insert(Instrument, instrument);
      await this.noteCalibration(manager, actor, instrument.id, input);
      await this.history.record(manager, { actor, subject: { kind: 'instrument', id: instrument.id }, event: 'instrument.added', words: `${input.tag} added to the register.`, data: { ...input } });
      return { ...instrument, standing: calibrationStanding(input.dueOn, this.today()) };
    });
  }

  async update(actor: Actor, id: string, input: UpdateInstrument): Promise<InstrumentView> {
    return this.unitOfWork.run(async (manager) => {
      const before = await manager.findOneBy(Instrument, { id });
      if (!before) throw notFound('instrument');
      if (before.version !== input.version) throw changedMeanwhile('instrument', { ...before });
      if (input.tag !== before.tag && (await manager.existsBy(Instrument, { tag: input.tag }))) throw taken();
      const changed = { ...input, version: before.version + 1 };
      await manager.update(Instrument, { id }, changed);
      if (CALIBRATION.some((key) => before[key] !== input[key])) await this.noteCalibration(manager, actor, id, input);
      await this.history.record(manager, { actor, subject: { kind: 'instrument', id }, event: 'instrument.changed', words: `${input.tag} changed.`, data: { from: { ...before }, to: changed } });
      return { ...changed, id, standing: calibrationStanding(input.dueOn, this.today()) };
    });
  }

  /** What the register says of a calibration goes into its history; what was found that day stays with it. */
  private async noteCalibration(manager: EntityManager, actor: Actor, instrumentId: string, input: CreateInstrument): Promise<void> {
    const { calibratedOn, dueOn, certificateNumber, percentOfReading, percentOfRange } = input;
    const known = await manager.findOne(InstrumentCalibration, { where: { instrumentId, calibratedOn }, order: { at: 'DESC', id: 'DESC' } });
    await manager.insert(InstrumentCalibration, {
      id: this.ids.next(),
      instrumentId,
      calibratedOn,
      dueOn,
      certificateNumber,
      percentOfReading,
      percentOfRange,
      laboratory: known?.laboratory ?? '',
      asFound: known?.asFound ?? 'not-stated',
      asFoundWords: known?.asFoundWords ?? '',
      byUserId: actor.userId,
      byName: actor.name,
      at: this.clock.iso(),
    });
  }

  /** The instruments of a record as they are today; an identifier the register does not know is refused. */
  async onTheDay(source: QuerySource, ids: readonly string[]): Promise<InstrumentOnTheDay[]> {
    const wanted = [...new Set(ids)];
    if (wanted.length === 0) return [];
    const rows = await source.query<Row[]>(`SELECT ${COLUMNS} FROM instruments WHERE id IN (${wanted.map(() => '?').join(', ')}) ORDER BY tag`, wanted);
    if (rows.length !== wanted.length) throw new AppError('READINGS_NOT_VALID', 'One of the instruments is not in the register.');
    const today = this.today();
    return rows.map((r) => ({ id: r.id, tag: r.tag, description: r.description, serial: r.serial, dueOn: r.dueOn, calibratedOn: r.calibratedOn, certificateNumber: r.certificateNumber, overdueOnTheDay: pastGrace(r.dueOn, today) }));
  }
}
