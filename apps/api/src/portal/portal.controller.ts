import { Controller, Get, Param } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import type { PortalHome, PortalJob } from '@shared/portal';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { PortalService, type PortalMachines } from './portal.service.js';

@ApiTags('portal')
@Controller('portal')
export class PortalController {
  constructor(private readonly portal: PortalService) {}

  @Get()
  @Needs('portal.use')
  home(@CurrentActor() actor: Actor): Promise<PortalHome> {
    return this.portal.home(actor);
  }

  @Get('machines')
  @Needs('portal.use')
  machines(@CurrentActor() actor: Actor): Promise<PortalMachines> {
    return this.portal.machines(actor);
  }

  @Get('jobs/:id')
  @Needs('portal.use')
  job(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string): Promise<PortalJob> {
    return this.portal.job(actor, id);
  }
}
