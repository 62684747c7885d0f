import { Body, Controller, Get, Param, Post, Put } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import { createInstrumentSchema, updateInstrumentSchema, type BayView, type CreateInstrument, type InstrumentView, type UpdateInstrument } from '@shared/instruments';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { InstrumentsService } from './instruments.service.js';

@ApiTags('instruments')
@Controller()
export class InstrumentsController {
  constructor(private readonly instruments: InstrumentsService) {}

  @Get('bay')
  @Needs('instruments.read')
  bay(): Promise<BayView> {
    return this.instruments.bay();
  }

  @Get('instruments')
  @Needs('instruments.read')
  list(): Promise<InstrumentView[]> {
    return this.instruments.list();
  }

  @Post('instruments')
  @Needs('instruments.edit')
  create(@CurrentActor() actor: Actor, @Body({ schema: createInstrumentSchema }) input: CreateInstrument): Promise<InstrumentView> {
    return this.instruments.create(actor, input);
  }

  @Put('instruments/:id')
  @Needs('instruments.edit')
  update(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: updateInstrumentSchema }) input: UpdateInstrument): Promise<InstrumentView> {
    return this.instruments.update(actor, id, input);
  }
}
