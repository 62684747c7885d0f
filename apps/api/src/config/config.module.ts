import { Module, type DynamicModule } from '@nestjs/common';
import { CONFIG, type Config } from './config.js';

@Module({})
export class ConfigModule {
  static register(config: Config): DynamicModule {
    return { module: ConfigModule, global: true, providers: [{ provide: CONFIG, useValue: config }], exports: [CONFIG] };
  }
}
