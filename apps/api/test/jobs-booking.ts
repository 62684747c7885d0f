import { AcceptanceService } from '../src/acceptance/acceptance.service.js';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { LimitsVersion } from '../src/acceptance/limits-version.entity.js';
import { Ids } from '../src/ids/ids.js';
import type { BookInForm, CreatedJob, JobSheet } from '@shared/jobs';
import type { Person, TestShop } from './test-app.js';

export const PLATE = {
  kind: 'induction', maker: '', model: '', serial: 'PM-75-0001', ratedPowerW: 75_000, ratedVoltageV: 400, connection: 'delta', ratedFrequencyHz: 50, ratedSpeedRpm: 985, ratedCurrentA: 139,
  poles: 6, powerFactor: 0.83, efficiencyPercent: 93.7, frame: '315S', mounting: 'B3', enclosure: '', ingressProtection: 'IP55', thermalClass: 'F', duty: 'S1', bearingDriveEnd: '6316', bearingNonDriveEnd: '6316',
} as const;
export const NEW_CUSTOMER = { name: 'Oberau Water Board', contactName: 'Dr. Tilo Marx', email: 'pumpen@oberau.example', city: 'Oberau', postcode: '99903' } as const;

/** A machine over the counter: customer and machine new, unless said otherwise. */
export const bookIn = (more: Partial<BookInForm> = {}): BookInForm => ({
  customer: { kind: 'new', details: NEW_CUSTOMER },
  machine: { kind: 'new', details: { description: '75 kW 6-pole pump motor', nameplate: PLATE } },
  route: 'rewind',
  complaint: 'Trips after ten minutes',
  contamination: 'none',
  promisedOn: '2026-03-20',
  ...more,
});

export async function bookedIn(by: Person, more: Partial<BookInForm> = {}): Promise<CreatedJob> {
  const answer = await by.post('/api/jobs', bookIn(more));
  if (answer.status !== 201) throw new Error(`Not booked in: ${answer.text}`);
  return answer.body as CreatedJob;
}

export const sheetOf = async (by: Person, id: string): Promise<JobSheet> => (await by.get(`/api/jobs/${id}`).expect(200)).body as JobSheet;

/** The next version of the limits, the same but for its number. */
export async function publishNextLimits(shop: TestShop): Promise<number> {
  const [newest] = await shop.app.get(AcceptanceService).versions();
  const version = (newest?.version ?? 0) + 1;
  await shop.app.get(UnitOfWork).run((manager) =>
    manager.insert(LimitsVersion, { id: shop.app.get(Ids).next(), version, set: (newest?.set ?? {}) as never, note: 'reviewed', publishedAt: shop.clock.iso(), publishedByName: 'Foreman' }),
  );
  return version;
}
