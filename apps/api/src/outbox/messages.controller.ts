import { Controller, Get, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import { z } from 'zod';
import { Needs } from '../auth/needs.js';
import { MessagesService } from './messages.service.js';

const querySchema = z.strictObject({ jobId: idField.optional() });

@ApiTags('messages')
@Controller('messages')
export class MessagesController {
  constructor(private readonly messages: MessagesService) {}

  @Get()
  @Needs('messages.read')
  latest(@Query({ schema: querySchema }) query: z.infer<typeof querySchema>) {
    return this.messages.latest(query.jobId ?? null);
  }
}
