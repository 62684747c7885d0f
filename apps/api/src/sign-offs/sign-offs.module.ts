import { Module } from '@nestjs/common';
import { JobFactsService } from '../jobs/job-facts.service.js';
import { SignOffsController } from './sign-offs.controller.js';
import { SignOffsService } from './sign-offs.service.js';

@Module({ controllers: [SignOffsController], providers: [SignOffsService, JobFactsService], exports: [SignOffsService] })
export class SignOffsModule {}
