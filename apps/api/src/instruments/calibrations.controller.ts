import { Body, Controller, Get, Param, Post, Query, Req, StreamableFile } from '@nestjs/common';
import { ApiBody, ApiConsumes, ApiTags } from '@nestjs/swagger';
import { addCalibrationSchema, measuredQuerySchema, type AddCalibration, type InstrumentDetail, type InstrumentDue, type MeasuredPage, type MeasuredQuery } from '@shared/calibrations';
import { idField } from '@shared/fields';
import type { FastifyRequest } from 'fastify';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { CalibrationsService } from './calibrations.service.js';
import { InstrumentCertificatesService } from './instrument-certificates.service.js';
import { MeasuredWithService } from './measured-with.service.js';

@ApiTags('instruments')
@Controller('instruments')
export class CalibrationsController {
  constructor(
    private readonly calibrations: CalibrationsService,
    private readonly certificates: InstrumentCertificatesService,
    private readonly measuredWith: MeasuredWithService,
  ) {}

  @Get('due')
  @Needs('instruments.read')
  due(): Promise<InstrumentDue[]> {
    return this.calibrations.due();
  }

  @Get(':id')
  @Needs('instruments.read')
  detail(@Param('id', { schema: idField }) id: string): Promise<InstrumentDetail> {
    return this.calibrations.detail(id);
  }

  @Post(':id/calibrations')
  @Needs('instruments.edit')
  add(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: addCalibrationSchema }) input: AddCalibration): Promise<InstrumentDetail> {
    return this.calibrations.add(actor, id, input);
  }

  /** One file as form data: PDF. */
  @Post(':id/calibrations/:calibrationId/certificate')
  @Needs('instruments.edit')
  @ApiConsumes('multipart/form-data')
  @ApiBody({ schema: { type: 'object', properties: { file: { type: 'string', format: 'binary' } }, required: ['file'] } })
  addCertificate(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Param('calibrationId', { schema: idField }) calibrationId: string, @Req() request: FastifyRequest): Promise<InstrumentDetail> {
    return this.certificates.add(actor, id, calibrationId, request);
  }

  @Get(':id/certificates/:certificateId')
  @Needs('instruments.read')
  async certificate(@Param('id', { schema: idField }) id: string, @Param('certificateId', { schema: idField }) certificateId: string): Promise<StreamableFile> {
    const { stream, type, length, disposition } = await this.certificates.open(id, certificateId);
    return new StreamableFile(stream, { type, disposition, ...(length === undefined ? {} : { length }) });
  }

  @Get(':id/records')
  @Needs('instruments.read')
  records(@Param('id', { schema: idField }) id: string, @Query({ schema: measuredQuerySchema }) query: MeasuredQuery): Promise<MeasuredPage> {
    return this.measuredWith.page(id, query);
  }
}
