import { Body, Controller, Get, Param, Post, Put, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import { createMachineSchema, machineQuerySchema, updateMachineSchema, type CreateMachine, type MachinePage, type MachineQuery, type MachineView, type UpdateMachine } from '@shared/machines';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { MachinesService } from './machines.service.js';

@ApiTags('machines')
@Controller()
export class MachinesController {
  constructor(private readonly machines: MachinesService) {}

  @Get('machines')
  @Needs('customers.read')
  page(@Query({ schema: machineQuerySchema }) query: MachineQuery): Promise<MachinePage> {
    return this.machines.page(query);
  }

  @Get('machines/:id')
  @Needs('customers.read')
  one(@Param('id', { schema: idField }) id: string): Promise<MachineView> {
    return this.machines.one(id);
  }

  @Post('customers/:id/machines')
  @Needs('machines.edit')
  create(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: createMachineSchema }) input: CreateMachine): Promise<MachineView> {
    return this.machines.create(actor, id, input);
  }

  @Put('machines/:id')
  @Needs('machines.edit')
  update(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: updateMachineSchema }) input: UpdateMachine): Promise<MachineView> {
    return this.machines.update(actor, id, input);
  }
}
