import { Global, Module } from '@nestjs/common';
import { CalibrationsController } from './calibrations.controller.js';
import { CalibrationsService } from './calibrations.service.js';
import { InstrumentCertificatesService } from './instrument-certificates.service.js';
import { InstrumentsController } from './instruments.controller.js';
import { InstrumentsService } from './instruments.service.js';
import { MeasuredWithService } from './measured-with.service.js';

@Global()
@Module({ controllers: [InstrumentsController, CalibrationsController], providers: [InstrumentsService, CalibrationsService, InstrumentCertificatesService, MeasuredWithService], exports: [InstrumentsService] })
export class InstrumentsModule {}
