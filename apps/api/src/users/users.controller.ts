import { Body, Controller, Get, Param, Post, Put } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import { createUserSchema, updateUserSchema, type CreateUser, type UpdateUser, type UserView } from '@shared/session';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { UsersService } from './users.service.js';

@ApiTags('users')
@Controller('users')
export class UsersController {
  constructor(private readonly users: UsersService) {}

  @Get()
  @Needs('users.manage')
  list(): Promise<UserView[]> {
    return this.users.list();
  }

  @Post()
  @Needs('users.manage')
  create(@CurrentActor() actor: Actor, @Body({ schema: createUserSchema }) input: CreateUser): Promise<UserView> {
    return this.users.create(actor, input);
  }

  @Put(':id')
  @Needs('users.manage')
  update(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: updateUserSchema }) input: UpdateUser): Promise<UserView> {
    return this.users.update(actor, id, input);
  }
}
