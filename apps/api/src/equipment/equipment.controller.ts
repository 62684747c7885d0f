import { Body, Controller, Get, Put } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { saveEquipmentSchema, type EquipmentView, type SaveEquipment } from '@shared/equipment';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { EquipmentService } from './equipment.service.js';

@ApiTags('equipment')
@Controller('equipment')
export class EquipmentController {
  constructor(private readonly equipment: EquipmentService) {}

  @Get()
  @Needs('instruments.read')
  read(): Promise<EquipmentView> {
    return this.equipment.read();
  }

  @Put()
  @Needs('equipment.edit')
  save(@CurrentActor() actor: Actor, @Body({ schema: saveEquipmentSchema }) input: SaveEquipment): Promise<EquipmentView> {
    return this.equipment.save(actor, input);
  }
}
