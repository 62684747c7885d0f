import { Global, Module } from '@nestjs/common';
import { PaperBaseService } from './paper-base.service.js';
import { PapersController } from './papers.controller.js';
import { PapersService } from './papers.service.js';

@Global()
@Module({ controllers: [PapersController], providers: [PapersService, PaperBaseService], exports: [PapersService, PaperBaseService] })
export class PapersModule {}
