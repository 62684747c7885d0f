import type { GateCondition } from '@shared/errors';
import { ROUTES, ROUTE_STEPS, type Gate } from '@shared/route';
import { describe, expect, it } from 'vitest';
import { conditionsBefore, gateConditions, gateIsOpen, gatesOf, stepBehind } from './gates.js';
import type { JobFacts } from './job-facts.js';
import { factsAt, record, signed } from './job-facts.fixture.js';

const quote = (state: JobFacts['quotes'][number]['state']) => ({ id: 'q1', state, revision: 1 });
const before = record('core-test-before', '10', { verdict: 'conforms' });
const strip = record('strip', '20', { verdict: 'conforms', readings: { method: 'oven-burnout', commutatorOrSlipRingsOn: false, wiresCountedAtCut: 24, sampleCoilKept: true, explanation: '' } });
const after = record('core-test-after', '30', { verdict: 'conforms', result: { against: { recordId: '10', revision: 1 } } });
const finalTest = record('final-test', '50', { verdict: 'conforms' });
const decision = (on: typeof before, about: 'core-test-before' | 'core-test-after', choice: string) => signed('decision', on, { id: `d-${choice}`, detail: { about, choice } });

/** The conditions of a gate by name: met or not. */
const at = (gate: Gate, facts: JobFacts): Record<string, boolean> => Object.fromEntries(gateConditions(gate, facts).map((c) => [c.code, c.met]));
const find = (conditions: readonly GateCondition[], code: string): GateCondition => conditions.find((c) => c.code === code)!;

describe('strip may start', () => {
  const ready = factsAt('rewind', 'awaiting-approval', { quotes: [quote('approved')], records: [record('winding-as-found', '05'), before] });

  it('opens with an approved quote, the winding copied and the core tested', () => {
    expect(at('strip-may-start', ready)).toEqual({ QUOTE_APPROVED: true, WINDING_AS_FOUND: true, CORE_BEFORE: true });
    expect(gateIsOpen(gateConditions('strip-may-start', ready))).toBe(true);
  });

  it.each([
    ['draft', 'Make a quote'],
    ['sent', 'waits for the customer'],
    ['declined', 'declined'],
    ['superseded', 'Make a quote'],
  ] as const)('stays shut while the quote is %s, and says what to do', (state, words) => {
    const shut = find(gateConditions('strip-may-start', { ...ready, quotes: [quote(state as never)] }), 'QUOTE_APPROVED');
    expect(shut.met).toBe(false);
    expect(shut.words).toContain(words);
  });

  it('an approved quote counts beside a declined one', () => {
    expect(at('strip-may-start', { ...ready, quotes: [quote('declined'), quote('approved')] })).toMatchObject({ QUOTE_APPROVED: true });
  });

  it('stays shut until the winding as found is recorded', () => {
    expect(at('strip-may-start', { ...ready, records: [before] })).toMatchObject({ WINDING_AS_FOUND: false });
  });

  it('stays shut without a core test before, and with one that is not valid', () => {
    expect(at('strip-may-start', { ...ready, records: [record('winding-as-found', '05')] })).toMatchObject({ CORE_BEFORE: false });
    const notValid = { ...ready, records: [record('winding-as-found', '05'), { ...before, verdict: 'not-valid' }] };
    expect(find(gateConditions('strip-may-start', notValid), 'CORE_BEFORE').words).toContain('not valid');
  });

  it('a later test that is not valid does not undo the valid one', () => {
    const spoiled = record('core-test-before', '11', { ordinal: 2, verdict: 'not-valid' });
    expect(at('strip-may-start', { ...ready, records: [...ready.records, spoiled] })).toMatchObject({ CORE_BEFORE: true });
  });

  it('a waiver counts once a manager has countersigned it', () => {
    const asked = { ...ready, records: [record('winding-as-found', '05')], signOffs: [signed('waiver', null, { id: 'w' })] };
    expect(find(gateConditions('strip-may-start', asked), 'CORE_BEFORE')).toMatchObject({ met: false, words: expect.stringContaining('countersignature') });
    const counter = { ...asked, signOffs: [...asked.signOffs, signed('waiver-countersignature', null, { refersTo: 'w' })] };
    expect(find(gateConditions('strip-may-start', counter), 'CORE_BEFORE')).toMatchObject({ met: true, words: expect.stringContaining('not be established') });
    const ofAnother = { ...asked, signOffs: [...asked.signOffs, signed('waiver-countersignature', null, { refersTo: 'another' })] };
    expect(at('strip-may-start', ofAnother)).toMatchObject({ CORE_BEFORE: false });
  });

  describe('with a core that does not conform before', () => {
    const bad = { ...before, verdict: 'does-not-conform' };
    const damaged = { ...ready, records: [record('winding-as-found', '05'), bad] };

    it('the customer decides first', () => {
      expect(at('strip-may-start', damaged)).toMatchObject({ CORE_BEFORE: true, CORE_BEFORE_DECISION: false });
    });

    it.each([
      ['go-on', true],
      ['repair-and-retest', true],
      ['accept-with-concession', true],
      ['replace', false],
      ['return-unrepaired', false],
    ])('the answer “%s” lets the strip start: %s', (choice, open) => {
      expect(at('strip-may-start', { ...damaged, signOffs: [decision(bad, 'core-test-before', choice)] })).toMatchObject({ CORE_BEFORE_DECISION: open });
    });

    it('the last answer counts', () => {
      const signOffs = [decision(bad, 'core-test-before', 'go-on'), decision(bad, 'core-test-before', 'replace')];
      expect(at('strip-may-start', { ...damaged, signOffs })).toMatchObject({ CORE_BEFORE_DECISION: false });
    });

    it('an answer given before the test was corrected does not count', () => {
      const corrected = { ...damaged, records: [{ ...bad, revision: 2, contentHash: 'another' }], signOffs: [decision(bad, 'core-test-before', 'go-on')] };
      expect(at('strip-may-start', corrected)).toMatchObject({ CORE_BEFORE_DECISION: false });
    });
  });

  it.each([
    ['ask', false, false],
    ['ask', true, true],
    ['accept', false, true],
    ['refuse', true, false],
  ] as const)('an inconclusive test before under the rule “%s”, released %s, lets the strip start: %s', (decisionRule, released, open) => {
    const inconclusive = { ...before, verdict: 'inconclusive' };
    const facts = { ...ready, limits: { ...ready.limits, core: { ...ready.limits.core, decisionRule } }, records: [record('winding-as-found', '05'), inconclusive], signOffs: released ? [signed('inconclusive-release', inconclusive)] : [] };
    expect(at('strip-may-start', facts)).toMatchObject({ CORE_BEFORE: true, CORE_BEFORE_RELEASE: open });
  });

  it('a core repaired before the strip is tested anew', () => {
    const repaired = { ...ready, records: [...ready.records, record('core-repair', '12')] };
    expect(find(gateConditions('strip-may-start', repaired), 'CORE_BEFORE')).toMatchObject({ met: false, words: expect.stringContaining('repaired') });
    const again = { ...repaired, records: [...repaired.records, record('core-test-before', '13', { ordinal: 2, verdict: 'conforms' })] };
    expect(at('strip-may-start', again)).toMatchObject({ CORE_BEFORE: true });
  });
});

describe('burnout may start', () => {
  const oven = factsAt('rewind', 'strip-and-burnout', { records: [record('dismantling', '04', { readings: { commutatorOrSlipRings: false } }), strip] });

  it('opens with limit known, rings off, wires counted and a sample kept', () => {
    expect(at('burnout-may-start', oven)).toEqual({ LIMIT_KNOWN: true, RINGS_OFF: true, WIRES_COUNTED: true, SAMPLE_KEPT: true });
  });

  it('stays shut while core plate and frame are not known', () => {
    expect(at('burnout-may-start', { ...oven, records: [strip] })).toMatchObject({ LIMIT_KNOWN: false });
  });

  it('stays shut with slip rings on, by the strip record or, before there is one, by the dismantling', () => {
    expect(at('burnout-may-start', { ...oven, records: [{ ...strip, readings: { ...strip.readings, commutatorOrSlipRingsOn: true } }] })).toMatchObject({ RINGS_OFF: false });
    expect(at('burnout-may-start', { ...oven, records: [record('dismantling', '04', { readings: { commutatorOrSlipRings: true } })] })).toMatchObject({ RINGS_OFF: false });
  });

  it('asks for the wires to be counted and a sample to be kept before there is a strip record', () => {
    expect(at('burnout-may-start', { ...oven, records: [] })).toMatchObject({ WIRES_COUNTED: false, SAMPLE_KEPT: false });
  });

  it('asks for nothing where no oven was used', () => {
    expect(at('burnout-may-start', { ...oven, records: [record('strip', '20', { readings: { method: 'cold-pull' } })] })).toEqual({ NO_OVEN: true });
  });
});

describe('rewind may start', () => {
  const good = factsAt('rewind', 'core-test-after', { records: [before, strip, after] });

  it('opens with a strip within its limit and a core that conforms', () => {
    expect(at('rewind-may-start', good)).toEqual({ STRIP: true, CORE_AFTER: true });
  });

  it('a strip over its limit is explained first', () => {
    const over = { ...strip, verdict: 'does-not-conform' };
    expect(at('rewind-may-start', { ...good, records: [before, over, after] })).toMatchObject({ STRIP: false });
    const explained = { ...over, readings: { ...over.readings, explanation: 'Controller stuck for four minutes' } };
    expect(at('rewind-may-start', { ...good, records: [before, explained, after] })).toMatchObject({ STRIP: true });
    const blank = { ...over, readings: { ...over.readings, explanation: '   ' } };
    expect(at('rewind-may-start', { ...good, records: [before, blank, after] })).toMatchObject({ STRIP: false });
  });

  it('stays shut without a strip record', () => {
    expect(at('rewind-may-start', { ...good, records: [before, after] })).toMatchObject({ STRIP: false });
  });

  it('stays shut without a test after, and with one that is not valid', () => {
    expect(at('rewind-may-start', { ...good, records: [before, strip] })).toMatchObject({ CORE_AFTER: false });
    expect(at('rewind-may-start', { ...good, records: [before, strip, { ...after, verdict: 'not-valid' }] })).toMatchObject({ CORE_AFTER: false });
  });

  it('a repair after the test asks for the test once more', () => {
    const repaired = { ...good, records: [...good.records, record('core-repair', '31')] };
    expect(find(gateConditions('rewind-may-start', repaired), 'CORE_AFTER')).toMatchObject({ met: false, words: expect.stringContaining('repaired') });
    const retested = { ...repaired, records: [...repaired.records, { ...after, id: '32', ordinal: 2 }] };
    expect(at('rewind-may-start', retested)).toMatchObject({ CORE_AFTER: true });
  });

  it('a before test corrected after the comparison asks for the after test to be judged anew', () => {
    const facts = { ...good, records: [{ ...before, revision: 2 }, strip, after] };
    expect(find(gateConditions('rewind-may-start', facts), 'CORE_AFTER')).toMatchObject({ met: false, words: expect.stringContaining('corrected since') });
  });

  it('a “before” test made after the strip changes nothing: the core went into the oven as it was tested before', () => {
    const late = record('core-test-before', '25', { ordinal: 2, verdict: 'conforms' });
    expect(at('rewind-may-start', { ...good, records: [...good.records, late] })).toMatchObject({ CORE_AFTER: true });
    const heldAgainstLate = { ...after, result: { against: { recordId: '25', revision: 1 } } };
    expect(at('rewind-may-start', { ...good, records: [before, strip, late, heldAgainstLate] })).toMatchObject({ CORE_AFTER: false });
  });

  describe('with a core that does not conform after', () => {
    const bad = { ...after, verdict: 'does-not-conform' };
    const damaged = { ...good, records: [before, strip, bad] };
    const accepts = decision(bad, 'core-test-after', 'accept-with-concession');

    it('it takes the customer’s answer and the manager’s concession', () => {
      expect(at('rewind-may-start', damaged)).toMatchObject({ CORE_AFTER: false, CUSTOMER_ANSWER: false });
      expect(at('rewind-may-start', { ...damaged, signOffs: [accepts] })).toMatchObject({ CORE_AFTER: false, CUSTOMER_ANSWER: true });
      expect(at('rewind-may-start', { ...damaged, signOffs: [accepts, signed('concession', bad)] })).toMatchObject({ CORE_AFTER: true, CUSTOMER_ANSWER: true });
    });

    it('a customer who changes their mind shuts it again', () => {
      const signOffs = [accepts, signed('concession', bad), decision(bad, 'core-test-after', 'repair-and-retest')];
      expect(at('rewind-may-start', { ...damaged, signOffs })).toMatchObject({ CUSTOMER_ANSWER: false });
    });

    it('answer and concession do not count for a corrected record', () => {
      const corrected = { ...bad, revision: 2, contentHash: 'another' };
      expect(at('rewind-may-start', { ...damaged, records: [before, strip, corrected], signOffs: [accepts, signed('concession', bad)] })).toMatchObject({ CORE_AFTER: false, CUSTOMER_ANSWER: false });
    });
  });

  it.each([
    ['ask', false, false],
    ['ask', true, true],
    ['accept', false, true],
    ['refuse', false, false],
    ['refuse', true, false],
  ] as const)('an inconclusive test after under the rule “%s”, released %s, lets the rewind start: %s', (decisionRule, released, open) => {
    const inconclusive = { ...after, verdict: 'inconclusive' };
    const facts = { ...good, limits: { ...good.limits, core: { ...good.limits.core, decisionRule } }, records: [before, strip, inconclusive], signOffs: released ? [signed('inconclusive-release', inconclusive)] : [] };
    expect(at('rewind-may-start', facts)).toMatchObject({ CORE_AFTER: open });
  });
});

describe('treatment may start', () => {
  it('opens with a before-varnish test that conforms, and with nothing less', () => {
    const facts = factsAt('rewind', 'before-varnish-test');
    expect(at('treatment-may-start', facts)).toEqual({ BEFORE_VARNISH: false });
    for (const [verdict, open] of [['conforms', true], ['does-not-conform', false], ['inconclusive', false], ['not-valid', false]] as const) {
      expect(at('treatment-may-start', { ...facts, records: [record('before-varnish-test', '40', { verdict })] })).toEqual({ BEFORE_VARNISH: open });
    }
  });

  it('the last test counts', () => {
    const records = [record('before-varnish-test', '40', { verdict: 'conforms' }), record('before-varnish-test', '41', { ordinal: 2, verdict: 'does-not-conform' })];
    expect(at('treatment-may-start', factsAt('rewind', 'before-varnish-test', { records }))).toEqual({ BEFORE_VARNISH: false });
  });
});

describe('ready', () => {
  const tested = signed('tested', finalTest, { byUserId: 'technician', byName: 'Technician' });
  const released = signed('released-by-second', finalTest);
  const good = factsAt('rewind', 'final-test', { records: [before, strip, after, finalTest], signOffs: [tested, released] });

  it('opens with a final test that conforms, signed by one and released by another', () => {
    expect(at('ready', good)).toEqual({ CORE_AFTER: true, FINAL_TEST: true, INSTRUMENTS: true, TESTED: true, SECOND_PERSON: true });
  });

  it('stays shut without a final test, or with one that does not conform', () => {
    expect(at('ready', { ...good, records: [before, strip, after] })).toMatchObject({ FINAL_TEST: false });
    expect(at('ready', { ...good, records: [before, strip, after, { ...finalTest, verdict: 'does-not-conform' }] })).toMatchObject({ FINAL_TEST: false });
  });

  it('stays shut with an instrument out of calibration, and names it', () => {
    const facts = { ...good, records: [before, strip, after, { ...finalTest, overdueInstruments: ['MG-2', 'MG-2', 'HP-1'] }] };
    expect(find(gateConditions('ready', facts), 'INSTRUMENTS')).toMatchObject({ met: false, words: 'Out of calibration on the day: MG-2, HP-1.' });
  });

  it('stays shut unsigned, and without a second person', () => {
    expect(at('ready', { ...good, signOffs: [] })).toMatchObject({ TESTED: false, SECOND_PERSON: false });
    expect(at('ready', { ...good, signOffs: [released] })).toMatchObject({ TESTED: false, SECOND_PERSON: false });
    expect(at('ready', { ...good, signOffs: [tested] })).toMatchObject({ TESTED: true, SECOND_PERSON: false });
  });

  it('the one who signed does not release, unless the shop has one person only', () => {
    const alone = { ...good, signOffs: [tested, { ...released, byUserId: 'technician' }] };
    expect(at('ready', alone)).toMatchObject({ SECOND_PERSON: false });
    expect(at('ready', { ...alone, onePersonMayRelease: true })).toMatchObject({ SECOND_PERSON: true });
  });

  it('signatures do not count for a corrected test', () => {
    const corrected = { ...finalTest, revision: 2, contentHash: 'another' };
    expect(at('ready', { ...good, records: [before, strip, after, corrected] })).toMatchObject({ TESTED: false, SECOND_PERSON: false });
  });

  it('a core record corrected to its worse after the rewind shuts it', () => {
    const worse = { ...after, revision: 2, verdict: 'does-not-conform', contentHash: 'another' };
    expect(at('ready', { ...good, records: [before, strip, worse, finalTest] })).toMatchObject({ CORE_AFTER: false });
  });

  it('a job that is only a core test is ready with a valid core test, whatever it says, and a waiver is no test', () => {
    const core = factsAt('core-test-only', 'core-test-before');
    expect(at('ready', core)).toEqual({ CORE_BEFORE: false });
    for (const [verdict, open] of [['conforms', true], ['does-not-conform', true], ['inconclusive', true], ['not-valid', false]] as const) {
      expect(at('ready', { ...core, records: [{ ...before, verdict }] })).toEqual({ CORE_BEFORE: open });
    }
    const waived = [signed('waiver', null, { id: 'w' }), signed('waiver-countersignature', null, { refersTo: 'w' })];
    expect(at('ready', { ...core, signOffs: waived })).toEqual({ CORE_BEFORE: false });
  });

  it('a recondition asks for no core test', () => {
    expect(at('ready', { ...good, route: 'recondition', records: [finalTest] })).toEqual({ FINAL_TEST: true, INSTRUMENTS: true, TESTED: true, SECOND_PERSON: true });
  });
});

describe('released', () => {
  const good = factsAt('rewind', 'ready', { certificateInForce: true, signOffs: [signed('delivery', null)] });

  it('opens with the certificate issued and the delivery note signed', () => {
    expect(at('released', good)).toEqual({ CERTIFICATE: true, DELIVERY_NOTE: true });
    expect(at('released', { ...good, certificateInForce: false, signOffs: [] })).toEqual({ CERTIFICATE: false, DELIVERY_NOTE: false });
  });

  it.each([
    ['no invoice yet', [], false],
    ['an open invoice', [{ number: 'R1', balanceMinor: 1 }], false],
    ['one paid and one open', [{ number: 'R1', balanceMinor: 0 }, { number: 'R2', balanceMinor: 5 }], false],
    ['everything paid', [{ number: 'R1', balanceMinor: 0 }], true],
    ['more than everything paid', [{ number: 'R1', balanceMinor: -100 }], true],
  ])('a customer who pays before collection, with %s', (_case, invoices, open) => {
    expect(at('released', { ...good, customer: { terms: 'prepayment', creditStop: false }, invoices })).toMatchObject({ PAID: open });
  });

  it('a customer on account is not asked for money', () => {
    expect(at('released', { ...good, invoices: [{ number: 'R1', balanceMinor: 5 }] })).not.toHaveProperty('PAID');
  });

  it('a customer on credit stop waits for the manager', () => {
    const stopped = { ...good, customer: { terms: 'account' as const, creditStop: true } };
    expect(at('released', stopped)).toMatchObject({ CREDIT_STOP: false });
    expect(at('released', { ...stopped, signOffs: [...good.signOffs, signed('credit-lift', null)] })).toMatchObject({ CREDIT_STOP: true });
  });
});

describe('gates and routes', () => {
  it('only a rewind goes through strip, burnout, rewind and treatment gates', () => {
    expect(gatesOf('rewind')).toHaveLength(6);
    for (const route of ['recondition', 'core-test-only', 'coil-rewind'] as const) expect(gatesOf(route)).toEqual(['ready', 'released']);
  });

  it('each gate stands in front of a step, but the burnout gate inside its own', () => {
    expect(stepBehind('strip-may-start')).toBe('strip-and-burnout');
    expect(stepBehind('ready')).toBe('ready');
    expect(stepBehind('burnout-may-start')).toBeNull();
  });

  it.each([
    ['rewind', 'incoming-test', 'INCOMING_TEST'],
    ['rewind', 'dismantled', 'DISMANTLING'],
    ['rewind', 'core-test-before', 'CORE_BEFORE'],
    ['recondition', 'awaiting-approval', 'QUOTE_APPROVED'],
    ['coil-rewind', 'awaiting-approval', 'QUOTE_APPROVED'],
    ['rewind', 'strip-and-burnout', 'STRIPPED'],
    ['rewind', 'rewind', 'AS_WOUND'],
    ['rewind', 'treatment', 'TREATMENT'],
    ['recondition', 'assembly', 'ASSEMBLY'],
  ] as const)('on the route %s, the step %s is left when its work is there: %s', (route, step, code) => {
    const next = ROUTE_STEPS[route][ROUTE_STEPS[route].indexOf(step) + 1]!;
    expect(find(conditionsBefore(next, factsAt(route, step)), code).met).toBe(false);
    const kinds = ['incoming-test', 'dismantling', 'strip', 'winding-as-wound', 'treatment', 'assembly'] as const;
    const done = factsAt(route, step, { quotes: [quote('approved')], records: [before, ...kinds.map((kind, n) => record(kind, `2${n}`))] });
    expect(find(conditionsBefore(next, done), code).met).toBe(true);
  });

  it('no condition is asked for twice, and none that the route cannot meet', () => {
    const reachable: Record<string, readonly string[]> = { 'before-varnish-test': ['BEFORE_VARNISH'], 'strip-and-burnout': ['STRIP', 'STRIPPED'], 'core-test-after': ['CORE_AFTER'] };
    for (const route of ROUTES) {
      const steps = ROUTE_STEPS[route];
      steps.slice(1).forEach((to, index) => {
        const codes = conditionsBefore(to, factsAt(route, steps[index]!)).map((c) => c.code);
        expect(new Set(codes).size).toBe(codes.length);
        for (const [step, asked] of Object.entries(reachable)) if (!steps.includes(step as never)) expect(codes.filter((c) => asked.includes(c))).toEqual([]);
      });
    }
  });

  it('every condition says where it is put right', () => {
    for (const gate of gatesOf('rewind')) for (const c of gateConditions(gate, factsAt('rewind', 'received'))) expect([c.words.length > 0, c.place]).toEqual([true, expect.any(String)]);
  });
});
