import type { Nameplate } from '@shared/machines';
import { plateWords } from './figures.js';
import type { Field } from './paper-head.js';
import type { MachineOnPaper, PaperUnits } from './paper-model.js';
import { COMMON, CONNECTION_WORDS, MACHINE_KIND_WORDS, PLATE } from './words.js';

const present = (parts: readonly string[]) => parts.filter((part) => part.trim() !== '');

/** The machine in a line: what it is, whose make, which piece. */
export function machineLine(machine: MachineOnPaper, units: PaperUnits): string {
  const plate = machine.nameplate;
  if (!plate) return machine.description;
  return present([machine.description, present([plate.maker, plate.model]).join(' '), plate.serial && `${COMMON.serial} ${plate.serial}`, ratingWords(plate, units)]).join(' · ');
}

/** '37 kW, 400 V delta, 50 Hz, 1478 rpm' */
export function ratingWords(plate: Nameplate, units: PaperUnits): string {
  const volts = plateWords(plate.ratedVoltageV, 'voltage', units);
  const connection = plate.connection === 'unknown' ? '' : CONNECTION_WORDS[plate.connection];
  return present([
    plateWords(plate.ratedPowerW, 'rated-power', units),
    present([volts, volts ? connection : '']).join(' '),
    plateWords(plate.ratedFrequencyHz, 'frequency', units),
    plateWords(plate.ratedSpeedRpm, 'speed', units),
  ]).join(', ');
}

/** Every field of the plate that could be read. */
export function nameplateFields(plate: Nameplate, units: PaperUnits): Field[] {
  const list: Field[] = [
    [PLATE.kind, MACHINE_KIND_WORDS[plate.kind]],
    [PLATE.maker, present([plate.maker, plate.model]).join(' ')],
    [COMMON.serial, plate.serial],
    [PLATE.rating, ratingWords(plate, units)],
    [PLATE.current, plateWords(plate.ratedCurrentA, 'current', units)],
    [PLATE.poles, plate.poles === null ? '' : String(plate.poles)],
    [PLATE.powerFactor, plate.powerFactor === null ? '' : plate.powerFactor.toFixed(2)],
    [PLATE.efficiency, plate.efficiencyPercent === null ? '' : `${plate.efficiencyPercent}\u00a0%`],
    [PLATE.frame, present([plate.frame, plate.mounting]).join(', ')],
    [PLATE.enclosure, present([plate.enclosure, plate.ingressProtection]).join(', ')],
    [PLATE.duty, present([plate.thermalClass, plate.duty]).join(', ')],
    [PLATE.bearings, present([plate.bearingDriveEnd && `${plate.bearingDriveEnd} ${PLATE.driveEnd}`, plate.bearingNonDriveEnd && `${plate.bearingNonDriveEnd} ${PLATE.nonDriveEnd}`]).join(', ')],
    [PLATE.explosive, plate.explosiveAtmosphere ? PLATE.explosiveYes : ''],
  ];
  return list.filter(([, value]) => value !== '');
}
