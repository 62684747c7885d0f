import type { Nameplate } from '@shared/machines';
import type { CustomerKey } from './customers.js';

const plate = (more: Partial<Nameplate>): Nameplate => ({
  kind: 'induction',
  maker: '',
  model: '',
  serial: '',
  ratedPowerW: null,
  ratedVoltageV: null,
  connection: 'delta',
  ratedFrequencyHz: 50,
  ratedSpeedRpm: null,
  ratedCurrentA: null,
  poles: null,
  powerFactor: null,
  efficiencyPercent: null,
  frame: '',
  mounting: 'B3',
  enclosure: 'TEFC',
  ingressProtection: 'IP55',
  thermalClass: 'F',
  duty: 'S1',
  bearingDriveEnd: '',
  bearingNonDriveEnd: '',
  explosiveAtmosphere: false,
  ...more,
});
const motor = (kw: number, poles: number, frame: string, volts: number, rpm: number, amps: number, cos: number, eff: number, de: string, nde: string, more: Partial<Nameplate> = {}) =>
  plate({ ratedPowerW: kw * 1000, poles, frame, ratedVoltageV: volts, ratedSpeedRpm: rpm, ratedCurrentA: amps, powerFactor: cos, efficiencyPercent: eff, bearingDriveEnd: de, bearingNonDriveEnd: nde, ...more });

export interface SampleMachine {
  readonly customer: CustomerKey;
  readonly description: string;
  readonly nameplate: Nameplate;
}

/** The machines by their number in the scenario; 13 is the dairy's second motor. */
export const MACHINES: Record<number, SampleMachine> = {
  1: { customer: 'quarry', description: '200 kW 4-pole crusher motor', nameplate: motor(200, 4, '315L', 400, 1488, 346, 0.87, 95.8, '6319', '6319', { serial: 'SQ-20031' }) },
  2: { customer: 'sawmill', description: '90 kW 4-pole gang saw motor', nameplate: motor(90, 4, '280M', 400, 1485, 160, 0.86, 94.5, '6317', '6317', { serial: 'FS-1184' }) },
  3: { customer: 'water', description: '55 kW 2-pole pump motor', nameplate: motor(55, 2, '250M', 400, 2970, 95.4, 0.89, 93.5, '6314', '6314', { serial: 'OW-77-02', mounting: 'B35' }) },
  4: { customer: 'mill', description: '110 kW DC mill drive', nameplate: motor(110, 4, '', 440, 1500, 275, 1, 91, 'NU318', '6318', { kind: 'dc', connection: 'dc', ratedFrequencyHz: null, powerFactor: null, serial: 'TR-D9', enclosure: '' }) },
  5: { customer: 'scrap', description: 'AC lifting magnet, laminated U core', nameplate: plate({ kind: 'ac-magnet', connection: 'single', ratedVoltageV: 400, ratedCurrentA: 2.5, duty: 'S3 40 %', serial: 'RW-M1', mounting: '', enclosure: '' }) },
  6: { customer: 'energy', description: '1600 kW 8-pole fan motor', nameplate: motor(1600, 8, '560', 6600, 743, 175, 0.84, 95.5, 'sleeve', 'sleeve', { connection: 'star', serial: 'LH-F2', enclosure: 'IC611' }) },
  7: { customer: 'paper', description: '75 kW 6-pole pulper motor', nameplate: motor(75, 6, '315S', 400, 985, 139, 0.83, 93.7, '6316', '6316', { serial: 'MP-P6' }) },
  8: { customer: 'bakery', description: '0.75 kW 4-pole oven fan motor', nameplate: motor(0.75, 4, '80', 400, 1420, 1.79, 0.76, 79.6, '6204', '6204', { connection: 'star', serial: 'HB-0080', mounting: 'B14' }) },
  9: { customer: 'packaging', description: '100 hp 4-pole 60 Hz compressor motor', nameplate: motor(74.57, 4, '405T', 460, 1785, 114, 0.86, 95.4, '6316', '6313', { ratedFrequencyHz: 60, serial: 'PP-405-3' }) },
  10: { customer: 'dairy', description: '11 kW 4-pole separator motor', nameplate: motor(11, 4, '160M', 400, 1465, 21, 0.84, 89.8, '6309', '6309', { serial: 'SD-S11', mounting: 'B5' }) },
  11: { customer: 'port', description: '110 kW 6-pole slip-ring hoist motor', nameplate: motor(110, 6, '315M', 400, 978, 201, 0.85, 93, 'NU319', '6319', { kind: 'slip-ring', serial: 'HK-H2', duty: 'S4 40 %' }) },
  12: { customer: 'plastics', description: '37 kW 4-pole extruder motor', nameplate: motor(37, 4, '225S', 400, 1478, 67, 0.86, 92.7, '6313', '6312', { serial: 'CP-E37' }) },
  13: { customer: 'dairy', description: '7.5 kW 4-pole whey pump motor', nameplate: motor(7.5, 4, '132M', 400, 1455, 14.7, 0.83, 88.7, '6208', '6208', { serial: 'SD-W75' }) },
  14: { customer: 'water', description: '22 kW 4-pole booster pump motor', nameplate: motor(22, 4, '180L', 400, 1470, 41, 0.84, 91.6, '6311', '6311', { serial: 'OW-22-07' }) },
};
