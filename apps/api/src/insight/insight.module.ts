import { Module } from '@nestjs/common';
import { InsightController } from './insight.controller.js';
import { InsightService } from './insight.service.js';

@Module({ controllers: [InsightController], providers: [InsightService] })
export class InsightModule {}
