import { Module } from '@nestjs/common';
import { BurnoutsController } from './burnouts.controller.js';
import { LoadHeadsService } from './load-heads.service.js';
import { LoadReadService } from './load-read.service.js';
import { LoadedJobsService } from './loaded-jobs.service.js';
import { LoadsService } from './loads.service.js';
import { LoggerFilesService } from './logger-files.service.js';
import { PartsService } from './parts.service.js';

@Module({ controllers: [BurnoutsController], providers: [LoadsService, LoadReadService, LoadHeadsService, LoadedJobsService, LoggerFilesService, PartsService] })
export class BurnoutsModule {}
