import { Injectable } from '@nestjs/common';
import type { EntityManager } from 'typeorm';
import { ReadDb } from '../database/read-db.js';
import { Setting } from './setting.entity.js';
import { EMPTY_BAY, EMPTY_PROFILE, type BayEquipment, type ShopProfile } from './shop-profile.js';

/** The shop's own settings, each under its name. */
@Injectable()
export class ShopService {
  constructor(private readonly db: ReadDb) {}

  async profile(): Promise<ShopProfile> {
    return { ...EMPTY_PROFILE, ...(await this.read<ShopProfile>('profile')) };
  }

  async bay(): Promise<BayEquipment> {
    return (await this.read<BayEquipment>('bay')) ?? EMPTY_BAY;
  }

  async write(manager: EntityManager, id: 'profile' | 'bay', value: ShopProfile | BayEquipment): Promise<void> {
    const row = await manager.findOneBy(Setting, { id });
    if (row) await manager.update(Setting, { id }, { value: value as never, version: row.version + 1 });
    else await manager.insert(Setting, { id, value: value as never, version: 1 });
  }

  private async read<T>(id: string): Promise<T | undefined> {
    const row = await this.db.one<{ value: string }>('SELECT value FROM settings WHERE id = ?', [id]);
    return row ? (JSON.parse(row.value) as T) : undefined;
  }
}
