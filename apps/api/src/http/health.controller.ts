import { Controller, Get, ServiceUnavailableException } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { Needs } from '../auth/needs.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';

@ApiTags('health')
@Controller('health')
export class HealthController {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
  ) {}

  @Get('live')
  @Needs('public')
  live(): { ok: true } {
    return { ok: true };
  }

  @Get('ready')
  @Needs('public')
  async ready(): Promise<{ ok: true; unitsWaiting: number }> {
    await this.db.one('SELECT 1').catch(() => {
      throw new ServiceUnavailableException();
    });
    return { ok: true, unitsWaiting: this.unitOfWork.depth };
  }
}
