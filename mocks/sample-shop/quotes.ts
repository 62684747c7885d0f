interface Line {
  readonly kind: 'labour' | 'material' | 'outside-work' | 'test' | 'other';
  readonly description: string;
  readonly quantityThousandths: number;
  readonly unit: string;
  readonly unitPriceMinor: number;
  readonly taxRateBasisPoints: number;
}
const line = (kind: Line['kind'], description: string, quantity: number, unit: string, unitPriceMinor: number): Line => ({ kind, description, quantityThousandths: Math.round(quantity * 1000), unit, unitPriceMinor, taxRateBasisPoints: 1900 });

/** A rewind priced by its hours and copper, as the shop does it. */
export function rewindLines(hours: number, copperKg: number, bearings: string): Line[] {
  return [
    line('test', 'Incoming test, core test before and after', 1, '', 38_000),
    line('labour', 'Dismantle, strip, clean, rewind, assemble', hours, 'h', 7_800),
    line('material', 'Winding wire', copperKg, 'kg', 2_150),
    line('material', 'Slot insulation, resin, leads', 1, '', 14_500),
    line('material', `Bearings ${bearings}`, 1, 'set', 18_900),
    line('test', 'Final test and certificate', 1, '', 22_000),
  ];
}

export function reconditionLines(hours: number, bearings: string): Line[] {
  return [
    line('labour', 'Clean, dip and bake, assemble', hours, 'h', 7_800),
    line('material', `Bearings ${bearings}`, 1, 'set', 9_400),
    line('test', 'Final test and certificate', 1, '', 12_000),
  ];
}
