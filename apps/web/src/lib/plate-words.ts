import { formatUsual, unitOf, type Kind, type UnitSystem } from '@libs/quantities';
import type { Nameplate } from '@shared/machines';

/** A rated figure as a plate says it: 37 kW, not 37.00 kW. */
export function plateFigure(si: number, kind: Kind, system: UnitSystem): string {
  const figure = formatUsual(si, kind, system, { unit: false }).replace(/(\.\d*?)0+$/, '$1').replace(/\.$/, '');
  const unit = unitOf(kind, system);
  return unit === '' ? figure : `${figure}\u202f${unit}`;
}

/** Power, volts and frequency in one line; what cannot be read is left out. */
export function plateLine({ ratedPowerW, ratedVoltageV, ratedFrequencyHz, ratedSpeedRpm }: Nameplate, system: UnitSystem): string {
  const figures: [number | null, Kind][] = [
    [ratedPowerW, 'rated-power'],
    [ratedVoltageV, 'voltage'],
    [ratedFrequencyHz, 'frequency'],
    [ratedSpeedRpm, 'speed'],
  ];
  return figures.flatMap(([si, kind]) => (si === null ? [] : [plateFigure(si, kind, system)])).join(', ');
}
