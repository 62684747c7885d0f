import type { Nameplate } from '@shared/machines';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { Customer } from '../src/customers/customer.entity.js';
import { Ids } from '../src/ids/ids.js';
import { Job } from '../src/jobs/job.entity.js';
import { Machine } from '../src/machines/machine.entity.js';
import { EMPTY_PROFILE, type ShopProfile } from '../src/shop/shop-profile.js';
import { ShopService } from '../src/shop/shop.service.js';
import type { Person, TestShop } from './test-app.js';

const NAMEPLATE: Nameplate = {
  kind: 'induction', maker: '', model: '', serial: 'MP-75-0117', ratedPowerW: 75_000, ratedVoltageV: 400, connection: 'delta', ratedFrequencyHz: 50, ratedSpeedRpm: 985, ratedCurrentA: 139,
  poles: 6, powerFactor: 0.83, efficiencyPercent: 93.7, frame: '315S', mounting: 'B3', enclosure: 'TEFC', ingressProtection: 'IP55', thermalClass: 'F', duty: 'S1', bearingDriveEnd: '6316', bearingNonDriveEnd: '6316', explosiveAtmosphere: false,
};

export interface JobInShop {
  readonly jobId: string;
  readonly jobNumber: string;
  readonly customerId: string;
  readonly machineId: string;
}

let made = 0;

/** A customer with a machine in the shop, as booked in at the counter. */
export async function jobInShop(shop: TestShop, bookedBy: Person, customer: Partial<Customer> = {}, job: Partial<Job> = {}): Promise<JobInShop> {
  made += 1;
  const ids = shop.app.get(Ids);
  const at = shop.clock.iso();
  const customerId = customer.id ?? ids.next();
  const [machineId, jobId, jobNumber] = [ids.next(), ids.next(), `J2026-9${String(made).padStart(3, '0')}`];
  await shop.app.get(UnitOfWork).run(async (manager) => {
    if (!customer.id) {
      await manager.insert(Customer, {
        id: customerId, name: `Murgen Paperboard ${made}`, contactName: 'H. Brandt', email: `murgen${made}@customer.test`, phone: '', addressLine1: 'Mill Lane 1', addressLine2: '', postcode: '79000', city: 'Murgen', country: 'DE',
        taxNumber: '', terms: 'account', netDays: 30, creditStop: false, createdAt: at, version: 1, ...customer,
      });
    }
    await manager.insert(Machine, { id: machineId, customerId, description: '75 kW 6-pole pump motor', serial: NAMEPLATE.serial, nameplate: NAMEPLATE as never, coreGeometry: null, createdAt: at, version: 1 });
    await manager.insert(Job, {
      id: jobId, number: jobNumber, customerId, machineId, route: 'rewind', step: 'awaiting-approval', state: 'open', holdReason: null, waitingFor: null, complaint: 'Hums and trips', accessories: '', contamination: 'none', contaminationWords: '',
      customerReference: '', promisedOn: null, receivedAt: at, bookedByUserId: bookedBy.userId!, warrantyOfJobId: null, limitsVersion: 1, releasedAt: null, version: 1, ...job,
    });
  });
  return { jobId, jobNumber, customerId, machineId };
}

/** The shop's own profile, as a manager would have filled it in. */
export async function shopProfile(shop: TestShop, more: Partial<ShopProfile> = {}): Promise<void> {
  const profile: ShopProfile = { ...EMPTY_PROFILE, name: 'Kestrel Rewinds', email: 'office@shop.test', phone: '+49 7000 1', bank: { accountHolder: 'Kestrel Rewinds', iban: 'DE00 0000 0000', bic: 'TOWNDEXX', bankName: 'Town Bank' }, ...more };
  await shop.app.get(UnitOfWork).run((manager) => shop.app.get(ShopService).write(manager, 'profile', profile));
}

export const QUOTE = {
  lines: [
    { kind: 'labour', description: 'Rewind stator', quantityThousandths: 1500, unit: 'h', unitPriceMinor: 8533, taxRateBasisPoints: 1900 },
    { kind: 'material', description: 'Copper wire', quantityThousandths: 34_500, unit: 'kg', unitPriceMinor: 1420, taxRateBasisPoints: 1900 },
    { kind: 'other', description: 'Handbook', quantityThousandths: 1000, unit: '', unitPriceMinor: 1999, taxRateBasisPoints: 700 },
  ],
  validUntil: '2026-03-31',
  note: 'Bearings on top if they are worn.',
};
/** Reckoned by hand: 1.5 h at 85.33 = 127.995, so 128.00; 34.5 kg at 14.20 = 489.90; 19.99; tax 24.32 + 93.08 + 1.40. */
export const QUOTE_SUMS = { netMinor: 63_789, taxMinor: 11_880, grossMinor: 75_669 };
