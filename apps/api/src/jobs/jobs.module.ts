import { Module } from '@nestjs/common';
import { CustomersModule } from '../customers/customers.module.js';
import { MachinesModule } from '../machines/machines.module.js';
import { SignOffsModule } from '../sign-offs/sign-offs.module.js';
import { AcknowledgementService } from './acknowledgement.service.js';
import { BookingService } from './booking.service.js';
import { DeliveryService } from './delivery.service.js';
import { ExportBrake } from './export-brake.js';
import { FloorController } from './floor.controller.js';
import { FloorService } from './floor.service.js';
import { JobFactsService } from './job-facts.service.js';
import { JobMovesService } from './job-moves.service.js';
import { JobSheetService } from './job-sheet.service.js';
import { JobsController } from './jobs.controller.js';
import { TagsService } from './tags.service.js';

@Module({
  imports: [CustomersModule, MachinesModule, SignOffsModule],
  controllers: [FloorController, JobsController],
  providers: [AcknowledgementService, BookingService, DeliveryService, ExportBrake, FloorService, JobFactsService, JobMovesService, JobSheetService, TagsService],
  exports: [BookingService, JobFactsService, JobMovesService, JobSheetService, DeliveryService],
})
export class JobsModule {}
