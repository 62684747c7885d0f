import { describe, expect, it } from 'vitest';
import { bookInOf, daysAfter, emptyBookIn, panelOf, problemsIn, type BookInForm } from './book-in-form.js';

const filled = (over: Partial<BookInForm> = {}): BookInForm => {
  const empty = emptyBookIn('si');
  return {
    ...empty,
    customer: { ...empty.customer, customerId: '01a16268-dairy', name: 'Senngrund Dairy' },
    machine: { ...empty.machine, machineId: '01a16268-sep11', words: '11 kW 4-pole separator motor' },
    complaint: 'Noisy, then tripped.',
    contamination: 'food',
    ...over,
  };
};
const problems = (form: BookInForm) => {
  const read = bookInOf(form);
  return 'problems' in read ? read.problems : [];
};

describe('booking in, as it is typed', () => {
  it('takes a known customer’s known machine with nothing but the complaint and the contamination', () => {
    const read = bookInOf(filled());
    expect('input' in read && read.input).toMatchObject({ customer: { kind: 'known', customerId: '01a16268-dairy' }, machine: { kind: 'known', machineId: '01a16268-sep11' }, route: 'rewind', promisedOn: null, warrantyOfJobId: null });
  });

  it('takes a new machine with a decimal comma in its power', () => {
    const form = filled();
    form.machine = { ...form.machine, kind: 'new', details: { description: '5.5 kW agitator motor', nameplate: { ...form.machine.details.nameplate, ratedPowerW: { text: '5,5', system: 'si' } } } };
    const read = bookInOf(form);
    expect('input' in read && read.input.machine).toMatchObject({ kind: 'new', details: { nameplate: { ratedPowerW: 5500, ratedVoltageV: null } } });
  });

  it('asks for the contamination instead of taking none for granted', () => {
    expect(problems(filled({ contamination: null }))).toEqual([{ path: 'contamination', message: 'Ask, and say what it is: “none” is an answer.' }]);
  });

  it('asks for customer and machine in its own words', () => {
    expect(problems(emptyBookIn('si')).map((p) => [p.path, p.message])).toEqual(
      expect.arrayContaining([
        ['customer.customerId', 'Choose the customer, or enter a new one.'],
        ['machine.machineId', 'Choose the machine, or enter a new one.'],
        ['complaint', 'What is wrong with it, in the customer’s words?'],
      ]),
    );
  });

  it('names what is wrong with a new customer at the customer’s own fields', () => {
    const form = filled();
    form.customer = { ...form.customer, kind: 'new', details: { ...form.customer.details, name: 'New Mill', email: 'not an address' } };
    expect(problems(form)).toEqual([{ path: 'customer.details.email', message: 'Not an e-mail address.' }]);
  });

  it('lets the next panel open only when this one is whole', () => {
    const form = filled({ complaint: '' });
    expect(problemsIn('customer', form)).toEqual([]);
    expect(problemsIn('wrong', form).map((p) => p.path)).toEqual(['complaint']);
  });

  it('knows in which panel a field stands', () => {
    expect(['customer.details.email', 'machine.details.nameplate.poles', 'contaminationWords', 'warrantyOfJobId'].map(panelOf)).toEqual(['customer', 'machine', 'wrong', 'promise']);
  });

  it('promises a warranty only for a machine that was here before', () => {
    const form = filled({ warrantyOfJobId: '01a1e327-first' });
    expect((bookInOf(form) as { input: { warrantyOfJobId: string } }).input.warrantyOfJobId).toBe('01a1e327-first');
    form.machine = { ...form.machine, kind: 'new', details: { ...form.machine.details, description: 'Another motor' } };
    expect((bookInOf(form) as { input: { warrantyOfJobId: string | null } }).input.warrantyOfJobId).toBeNull();
  });

  it('counts the days of a promise over the end of a year', () => {
    expect(daysAfter('2026-12-24', 14)).toBe('2027-01-07');
    expect(daysAfter('2028-02-22', 7)).toBe('2028-02-29');
  });
});
