import { Global, Module } from '@nestjs/common';
import { PapersController } from './papers.controller.js';
import { PapersService } from './papers.service.js';

@Global()
@Module({ controllers: [PapersController], providers: [PapersService], exports: [PapersService] })
export class PapersModule {}
