import type { MachineView } from '@shared/machines';
import { describe, expect, it } from 'vitest';
import { emptyNameplate, readNameplate } from '../../lib/nameplate-form.js';
import { FormReader } from '../../lib/typed.js';
import { coreVisitOf } from './core-visits.js';
import { customerDifferences, emptyCustomer } from './customer-form.js';
import { machineDifferences, machineFormOf, machineInputOf } from './machine-form.js';
import { termsOf } from './terms-form.js';

const plate = { ...readNameplate(emptyNameplate('si'), new FormReader(), ''), ratedPowerW: 37_000, ratedVoltageV: 400, poles: 4 };
const machine: MachineView = { id: '01a16268-ext', customerId: '01a16268-cor', customerName: 'Corvel Plastics', description: '37 kW extruder motor', nameplate: plate, coreGeometry: null, version: 3, visits: [] };

describe('how a customer pays', () => {
  it('gives no days to whoever pays before collection', () => {
    expect(termsOf({ terms: 'prepayment', netDays: '30', creditStop: true }, 2)).toEqual({ version: 2, terms: 'prepayment', netDays: 0, creditStop: true });
  });

  it('takes whole days from 0 to 180, and nothing that only looks like them', () => {
    expect(termsOf({ terms: 'account', netDays: ' 14 ', creditStop: false }, 2)?.netDays).toBe(14);
    for (const netDays of ['', '-1', '181', '14.5', '1e2', 'soon']) expect(termsOf({ terms: 'account', netDays, creditStop: false }, 2)).toBeNull();
  });
});

describe('changing a machine', () => {
  it('sends back what was there, when nothing was changed', () => {
    const read = machineInputOf(machineFormOf(machine, 'inch-pound'), 3);
    expect('input' in read && read.input).toEqual({ version: 3, description: machine.description, nameplate: plate });
  });

  it('names a figure out of range and a missing name, each at its field', () => {
    const form = machineFormOf({ ...machine, description: '' }, 'si');
    const read = machineInputOf({ ...form, nameplate: { ...form.nameplate, powerFactor: { text: '1,2', system: 'si' } } }, 3);
    expect('problems' in read && read.problems.map((p) => p.path)).toEqual(['description', 'nameplate.powerFactor']);
  });

  it('shows two people only what they see differently, in words and units', () => {
    const yours = { description: machine.description, nameplate: { ...plate, ratedPowerW: 45_000, kind: 'slip-ring' as const } };
    expect(machineDifferences(machine, yours, 'si')).toEqual([
      { label: 'Kind', theirs: 'Induction, cage rotor', yours: 'Slip-ring' },
      { label: 'Rated power', theirs: '37\u202fkW', yours: '45\u202fkW' },
    ]);
  });
});

describe('changing a customer', () => {
  it('shows two people only what they see differently', () => {
    expect(customerDifferences({ ...emptyCustomer(), city: 'Senngrund' }, { ...emptyCustomer(), city: 'Oberau' })).toEqual([{ label: 'City', theirs: 'Senngrund', yours: 'Oberau' }]);
  });
});

describe('the core over its visits', () => {
  const result = { wattsPerKgReferred: 3.12, expandedUncertaintyWPerKg: 0.22, judgements: [], fluxDensityT: 1.321, fluxShareOfTarget: 1.321 / 1.32, increaseEstablished: false };
  const before = { id: '01', kind: 'core-test-before' as const, verdict: 'conforms', result };
  const after = { id: '03', kind: 'core-test-after' as const, verdict: 'inconclusive', result: { ...result, wattsPerKgReferred: 3.7, increaseEstablished: true, comparison: { increase: 0.186 } } };

  it('tells before, after, increase and the flux they are stated at', () => {
    const visit = coreVisitOf([before, after]);
    expect(visit).toMatchObject({ before: { wattsPerKg: 3.12 }, after: { wattsPerKg: 3.7 }, increase: 0.186, verdict: 'inconclusive' });
    expect(visit?.fluxDensityT).toBeCloseTo(1.32, 9);
  });

  it('gives no figure for a test that is not valid, and no visit without a test', () => {
    expect(coreVisitOf([before, { ...after, verdict: 'not-valid', result: { ...after.result, increaseEstablished: false } }])).toMatchObject({ after: null, increase: null, verdict: 'not-valid' });
    expect(coreVisitOf([])).toBeNull();
  });
});
