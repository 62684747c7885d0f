import { Readable } from 'node:stream';
import { Inject, Injectable } from '@nestjs/common';
import type { FloorPage, FloorQuery, FloorRow, FloorSteps } from '@shared/jobs';
import { STEPS, type Step } from '@shared/route';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { shopDate } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { csvLine } from './csv.js';
import { ExportBrake } from './export-brake.js';
import { countStatement, pageStatement, type FloorPosition, type Statement } from './floor-query.js';

type Row = Omit<FloorRow, 'late'> & { late: number } & FloorPosition;
const EXPORT_PAGE = 1000;
/** A spreadsheet takes a file for UTF-8 only when it begins with this mark. */
const BYTE_ORDER_MARK = '\uFEFF';
const COLUMNS = ['number', 'customerName', 'machine', 'route', 'step', 'state', 'holdReason', 'waitingFor', 'promisedOn', 'receivedAt', 'late', 'coreVerdict'] as const satisfies readonly (keyof FloorRow)[];
const HEAD = ['Job', 'Customer', 'Machine', 'Route', 'Step', 'State', 'On hold because', 'Waiting for', 'Promised on', 'Received at', 'Late', 'Core'];

/** Every job in the house: sorted, filtered, counted, exported. */
@Injectable()
export class FloorService {
  constructor(
    private readonly db: ReadDb,
    private readonly clock: Clock,
    private readonly brake: ExportBrake,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  async page(query: FloorQuery): Promise<FloorPage> {
    const { page, size } = query;
    const today = this.today();
    const [counted] = await this.all<{ total: number }>(countStatement(query, today));
    const rows = await this.all<Row>(pageStatement(query, today, { limit: size, offset: (page - 1) * size }));
    return { rows: rows.map(toFloorRow), total: counted?.total ?? 0, page, size };
  }

  /** What stands at each step of the house, the whole route long. */
  async steps(): Promise<FloorSteps> {
    const rows = await this.db.all<{ step: Step; open: number; onHold: number; late: number }>(
      `SELECT step, SUM(state = 'open') AS open, SUM(state = 'on-hold') AS onHold, SUM(promisedOn IS NOT NULL AND promisedOn < ?) AS late
       FROM jobs WHERE state IN ('open', 'on-hold') GROUP BY step`,
      [this.today()],
    );
    return STEPS.map((step) => rows.find((row) => row.step === step) ?? { step, open: 0, onHold: 0, late: 0 });
  }

  /** The same jobs in the same order as the list, all pages of it, a thousand at a time. */
  async csv(actor: Actor, query: FloorQuery): Promise<{ name: string; stream: Readable }> {
    await this.brake.step(actor);
    return { name: `jobs-${this.today()}.csv`, stream: Readable.from(this.csvPieces(query)) };
  }

  private async *csvPieces(query: FloorQuery): AsyncGenerator<string> {
    yield BYTE_ORDER_MARK + csvLine(HEAD);
    const today = this.today();
    let after: FloorPosition | undefined;
    for (;;) {
      const rows: Row[] = await this.all<Row>(pageStatement(query, today, { limit: EXPORT_PAGE, offset: 0, ...(after ? { after } : {}) }));
      if (rows.length > 0) yield rows.map((row) => csvLine(COLUMNS.map((column) => (column === 'late' ? (row.late ? 'yes' : 'no') : row[column])))).join('');
      if (rows.length < EXPORT_PAGE) return;
      after = rows.at(-1);
    }
  }

  private async all<T>(statement: Statement | null): Promise<T[]> {
    return statement ? this.db.all<T>(statement.sql, statement.parameters) : [];
  }

  private today(): string {
    return shopDate(this.clock.now(), this.config.timeZone);
  }
}

function toFloorRow({ tier: _tier, key: _key, late, ...row }: Row): FloorRow {
  return { ...row, late: late === 1 };
}
