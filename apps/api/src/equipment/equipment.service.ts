import { Inject, Injectable } from '@nestjs/common';
import type { EquipmentView, SaveEquipment } from '@shared/equipment';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { shopDate } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import type { QuerySource } from '../database/query-source.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { EMPTY_BAY, type BayEquipment } from '../shop/shop-profile.js';
import { ShopService } from '../shop/shop.service.js';
import { changeOf, unknownThings } from './equipment-changes.js';

const SUBJECT = 'bay';
const CHANGES_SHOWN = 20;

/** Supplies, cables and ovens of the bay: three lists that are read and saved together. */
@Injectable()
export class EquipmentService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
    private readonly shop: ShopService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  read(): Promise<EquipmentView> {
    return this.viewOf(this.db);
  }

  async save(actor: Actor, input: SaveEquipment): Promise<EquipmentView> {
    await this.unitOfWork.run(async (manager) => {
      const { version, bay } = await rowOf(manager);
      if (version !== input.version) throw changedMeanwhile('list', await this.viewOf(manager));
      const unknown = unknownThings(bay, input);
      if (unknown.length > 0) throw new AppError('INPUT_NOT_VALID', 'Something in the lists is not of this bay; see the fields.', { fields: unknown });
      const { after, words } = changeOf(bay, input, shopDate(this.clock.now(), this.config.timeZone), () => this.ids.next());
      if (words.length === 0) return;
      await this.shop.write(manager, SUBJECT, after);
      await this.history.record(manager, { actor, subject: { kind: 'equipment', id: SUBJECT }, event: 'equipment.changed', words: words.join(' '), data: { from: { ...bay }, to: { ...after } } });
    });
    return this.read();
  }

  private async viewOf(source: QuerySource): Promise<EquipmentView> {
    const { version, bay } = await rowOf(source);
    const changes = await source.query<EquipmentView['changes']>("SELECT at, actorName AS who, words FROM history WHERE subjectKind = 'equipment' AND subjectId = ? ORDER BY seq DESC LIMIT ?", [SUBJECT, CHANGES_SHOWN]);
    return {
      version,
      supplies: bay.supplies.map(({ tapsV, ...s }) => ({ ...s, ...(tapsV ? { tapsV: [...tapsV] } : {}) })),
      cables: bay.cables.map((c) => ({ ...c })),
      ovens: bay.ovens.map(({ id, name, remark, thermocoupleCheckedOn = null, thermocoupleOffsetK = null }) => ({ id, name, remark, thermocoupleCheckedOn, thermocoupleOffsetK })),
      removed: (bay.removed ?? []).map((r) => ({ ...r })),
      changes,
    };
  }
}

async function rowOf(source: QuerySource | EntityManager): Promise<{ version: number; bay: BayEquipment }> {
  const [row] = await (source as QuerySource).query<{ value: string; version: number }[]>('SELECT value, version FROM settings WHERE id = ?', [SUBJECT]);
  return row ? { version: row.version, bay: { ...EMPTY_BAY, ...(JSON.parse(row.value) as Partial<BayEquipment>) } } : { version: 0, bay: EMPTY_BAY };
}
