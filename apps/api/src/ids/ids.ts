import { randomBytes } from 'node:crypto';
import { Clock } from '../clock/clock.js';

/** Opaque identifiers that sort by the time they were made (UUID version 7, RFC 9562). */
export abstract class Ids {
  abstract next(): string;
}

export class TimeSortedIds extends Ids {
  private lastMs = 0;
  private counter = 0;

  constructor(
    private readonly clock: Clock,
    private readonly random: (bytes: number) => Buffer = randomBytes,
  ) {
    super();
  }

  next(): string {
    const ms = Math.max(this.clock.now().getTime(), this.lastMs);
    this.counter = ms === this.lastMs ? this.counter + 1 : 0;
    this.lastMs = ms;
    const bytes = this.random(16);
    bytes.writeUIntBE(ms, 0, 6);
    // twelve bits of counter keep the order within one millisecond
    bytes.writeUInt16BE(0x7000 | (this.counter & 0x0fff), 6);
    bytes[8] = (bytes[8]! & 0x3f) | 0x80;
    const hex = bytes.toString('hex');
    return `${hex.slice(0, 8)}-${hex.slice(8, 12)}-${hex.slice(12, 16)}-${hex.slice(16, 20)}-${hex.slice(20)}`;
  }
}
