/** What stands at the head of the shop's papers, and what its numbers go by. */
export interface ShopProfile {
  readonly name: string;
  readonly addressLines: readonly string[];
  readonly phone: string;
  readonly email: string;
  readonly taxNumber: string;
  readonly website: string;
  /** a line the law or the shop wants on every paper */
  readonly registration: string;
  readonly bank: { readonly accountHolder: string; readonly iban: string; readonly bic: string; readonly bankName: string } | null;
  readonly paperSize: 'A4' | 'Letter';
  /** the shop's conditions on the intake receipt, in its own words */
  readonly conditions: string;
  readonly currency: string;
  readonly defaultTaxRateBasisPoints: number;
  /** in a one-person shop the tester may also release; off unless the manager switches it on */
  readonly onePersonMayRelease: boolean;
}

export interface BaySupply {
  readonly id: string;
  readonly name: string;
  readonly kind: 'variable' | 'taps';
  readonly minVoltsV: number;
  readonly maxVoltsV: number;
  readonly maxAmpsA: number;
  readonly frequencyHz: number;
  readonly tapsV?: readonly number[];
}
export interface BayCable {
  readonly id: string;
  readonly name: string;
  readonly crossSectionM2: number;
  readonly lengthM: number;
  readonly maxAmpsA: number;
}
export interface Oven {
  readonly id: string;
  readonly name: string;
  readonly remark: string;
  /** when its control thermocouple was last held against a calibrated one */
  readonly thermocoupleCheckedOn?: string | null;
  /** reads this much too high (+) or too low (−) */
  readonly thermocoupleOffsetK?: number | null;
}
/** Gone from the bay, but still named in records. */
export interface RemovedEquipment {
  readonly id: string;
  readonly list: 'supplies' | 'cables' | 'ovens';
  readonly name: string;
  readonly removedOn: string;
}
export interface BayEquipment {
  readonly supplies: readonly BaySupply[];
  readonly cables: readonly BayCable[];
  readonly ovens: readonly Oven[];
  readonly removed?: readonly RemovedEquipment[];
}

export const EMPTY_PROFILE: ShopProfile = {
  name: 'Your rewind shop',
  addressLines: [],
  phone: '',
  email: '',
  taxNumber: '',
  website: '',
  registration: '',
  bank: null,
  paperSize: 'A4',
  conditions: '',
  currency: 'EUR',
  defaultTaxRateBasisPoints: 1900,
  onePersonMayRelease: false,
};
export const EMPTY_BAY: BayEquipment = { supplies: [], cables: [], ovens: [] };
