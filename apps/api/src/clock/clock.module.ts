import { Global, Module } from '@nestjs/common';
import { Ids, TimeSortedIds } from '../ids/ids.js';
import { Clock, SystemClock } from './clock.js';

@Global()
@Module({
  providers: [
    { provide: Clock, useClass: SystemClock },
    { provide: Ids, inject: [Clock], useFactory: (clock: Clock) => new TimeSortedIds(clock) },
  ],
  exports: [Clock, Ids],
})
export class ClockModule {}
