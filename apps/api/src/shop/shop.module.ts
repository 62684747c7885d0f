import { Global, Module } from '@nestjs/common';
import { NumberSeriesService } from '../series/number-series.service.js';
import { ShopService } from './shop.service.js';

@Global()
@Module({ providers: [ShopService, NumberSeriesService], exports: [ShopService, NumberSeriesService] })
export class ShopModule {}
