import { Module } from '@nestjs/common';
import { CertificateCheckService } from './certificate-check.service.js';
import { CertificatesController } from './certificates.controller.js';
import { CertificatesService } from './certificates.service.js';

@Module({ controllers: [CertificatesController], providers: [CertificatesService, CertificateCheckService], exports: [CertificatesService] })
export class CertificatesModule {}
