import { Body, Controller, Param, Post } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import {
  askWaiverSchema,
  countersignSchema,
  liftCreditSchema,
  recordDecisionSchema,
  releaseInconclusiveSchema,
  signConcessionSchema,
  signRecordSchema,
  type AskWaiver,
  type Countersign,
  type LiftCredit,
  type RecordDecision,
  type ReleaseInconclusive,
  type SignConcession,
  type SignOff,
  type SignRecord,
} from '@shared/waivers';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { SignOffsService } from './sign-offs.service.js';

@ApiTags('signatures')
@Controller()
export class SignOffsController {
  constructor(private readonly signOffs: SignOffsService) {}

  @Post('jobs/:id/waiver')
  @Needs('waivers.ask')
  askWaiver(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: askWaiverSchema }) input: AskWaiver): Promise<SignOff> {
    return this.signOffs.askWaiver(actor, id, input);
  }

  @Post('waivers/:id/countersignature')
  @Needs('waivers.countersign')
  countersign(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: countersignSchema }) input: Countersign): Promise<SignOff> {
    return this.signOffs.countersignWaiver(actor, id, input);
  }

  @Post('jobs/:id/decisions')
  @Needs('decisions.record')
  decision(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: recordDecisionSchema }) input: RecordDecision): Promise<SignOff> {
    return this.signOffs.recordDecision(actor, id, input);
  }

  @Post('jobs/:id/concession')
  @Needs('concessions.sign')
  concession(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: signConcessionSchema }) input: SignConcession): Promise<SignOff> {
    return this.signOffs.signConcession(actor, id, input);
  }

  @Post('records/:id/inconclusive-release')
  @Needs('concessions.sign')
  inconclusive(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: releaseInconclusiveSchema }) input: ReleaseInconclusive): Promise<SignOff> {
    return this.signOffs.releaseInconclusive(actor, id, input);
  }

  @Post('records/:id/signature')
  @Needs('records.sign')
  tested(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: signRecordSchema }) input: SignRecord): Promise<SignOff> {
    return this.signOffs.signTested(actor, id, input);
  }

  @Post('records/:id/release')
  @Needs('final-test.release')
  release(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: signRecordSchema }) input: SignRecord): Promise<SignOff> {
    return this.signOffs.releaseTested(actor, id, input);
  }

  @Post('jobs/:id/credit-lift')
  @Needs('credit.lift')
  liftCredit(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: liftCreditSchema }) input: LiftCredit): Promise<SignOff> {
    return this.signOffs.liftCredit(actor, id, input);
  }
}
