import { burn, LOADS, sensorFoundLow } from './ovens.js';
import { incomingTest } from './machine-tests.js';
import { reconditionLines, rewindLines } from './quotes.js';
import { ringTest } from './ring-tests.js';
import { SampleJob, type Stage } from './stage.js';
import { handOver, instruments, invoice, issueCertificate, makeQuote, Telling, waive, type Scene } from './telling.js';
import { winding } from './windings.js';

const castIron = { corePlate: 'unknown', frameMaterial: 'cast-iron' } as const;

/** Each load in the evening of its day, after its jobs were stripped. */
function loads(stage: Stage, stories: readonly Telling[]): Scene[] {
  const jobIds = (load: (typeof LOADS)[number]) => load.jobs.map((machine) => stories.find((s) => s.machine === machine)!.jobId);
  return LOADS.flatMap((load): Scene[] => {
    let kept: Awaited<ReturnType<typeof burn>> | undefined;
    const scenes: Scene[] = [{ day: load.day, hour: 20, play: async () => void (kept = await burn(stage, load, jobIds(load))) }];
    if (load.oven === 'O2' && load.jobs.includes(12)) scenes.push({ day: load.day + 2, hour: 16, play: () => sensorFoundLow(stage, kept!, load, jobIds(load)) });
    return scenes;
  });
}

/** What happened in the shop in the five weeks before the seed date, as scenes in the order of their days. */
export function script(stage: Stage): Scene[] {
  const tell = (machine: number) => new Telling(stage, machine);
  const first = tell(10);
  const stories = [
    tell(1)
      .comesIn(-32, { complaint: 'Trips on earth fault after the flooding of the crusher pit.', contamination: 'other', promisedIn: -10, reference: 'SQ-4711' })
      .opened(-31, { ...castIron, inspection: 'Winding wet and earthed; core sound to the eye.' })
      .ring(-30, 'core-test-before', '1 before')
      .quoted(-30, 62, 70.2, '6319/6319')
      .approved(-29, 'Harro Steinmar', 'purchase-order', 'SQ-PO-881')
      .stripped(-27, { method: 'oven-burnout', ovenId: 'O1', partPeakC: 356, minutesAbove345C: 95 })
      .ring(-25, 'core-test-after', '1 after')
      .rewound(-17, 'ready')
      .on(-16, issueCertificate)
      .on(-16, (job) => handOver(job, 'Harro Steinmar'), 15)
      .on(-14, async (job) => {
        const { id, version, grossMinor } = await invoice(stage, job);
        stage.day(-2, 11);
        await stage.cast.office.post(`/invoices/${id}/payments`, { version, kind: 'bank-transfer', amountMinor: grossMinor, receivedOn: stage.date(-2), reference: 'SQ-4711' });
      }),
    tell(2)
      .comesIn(-26, { complaint: 'Smoked and tripped under load.', accessories: 'terminal box, coupling half', promisedIn: 2 })
      .opened(-25, { ...castIron, inspection: 'Winding burnt in two phases.' })
      .ring(-24, 'core-test-before', '2 before')
      .quoted(-24, 48, 37.9, '6317/6317')
      .approved(-23, 'Gesa Fennholt')
      .stripped(-22, { method: 'oven-burnout', ovenId: 'O2', partPeakC: 446, minutesAbove345C: 210, explanation: 'Control thermocouple had slipped out of contact; the part itself was never measured lower.' })
      .ring(-20, 'core-test-after', '2 after')
      .on(-6, async (job) => {
        await job.act('manager', '/hold', { version: (await job.sheet()).version, reason: 'Core does not conform; customer asked: restack, new motor, or return unrepaired.', waitingFor: 'customer' });
      }),
    tell(3)
      .comesIn(-30, { complaint: 'Bearing failed, rotor rubbed.', promisedIn: 4 })
      .opened(-29, { ...castIron, inspection: 'Rub in the bore, slots 11 to 15, 40 mm from the non-drive end.' })
      .ring(-28, 'core-test-before', '3 before')
      .on(-28, async (job) => {
        const record = (await job.sheet()) && (await stage.cast.counter.get<{ id: string; kind: string }[]>(`/jobs/${job.id}/records`)).find((r) => r.kind === 'core-test-before')!;
        await job.act('counter', '/decisions', { recordId: record.id, about: 'core-test-before', choice: 'go-on', answeredBy: 'Dr. Tilo Marx', channel: 'phone', words: 'Repair the rub in the core, then rewind.' });
      }, 12)
      .quoted(-28, 52, 28.4, '6314/6314')
      .approved(-27, 'Dr. Tilo Marx')
      .stripped(-27, { method: 'oven-burnout', ovenId: 'O1', partPeakC: 351, minutesAbove345C: 80 })
      .ring(-25, 'core-test-after', '3 after strip')
      .on(-24, (job) => job.record('core-repair', { methods: ['grind', 'etch'], slotFrom: 11, slotTo: 15, words: 'Rub ground out in the bore and etched until the sheets showed apart.' }))
      .ring(-23, 'core-test-after', '3 after repair')
      .rewound(-6, 'assembly')
      .on(-3, async (job) => job.act('technician', '/hold', { version: (await job.sheet()).version, reason: 'Bearing 6314/C3 non-drive end ordered; end shield with the machine shop for sleeving.', waitingFor: 'part' })),
    tell(4)
      .comesIn(-20, { complaint: 'Commutator sparks, armature to earth.', promisedIn: 9 })
      .opened(-19, { corePlate: 'unknown', frameMaterial: 'cast-iron', commutatorOrSlipRings: true, inspection: 'Two coils to earth, commutator sound.' })
      .ring(-18, 'core-test-before', '4 before')
      .quoted(-18, 70, 42, 'NU318/6318')
      .approved(-17, 'Birte Ohlsen', 'purchase-order', 'TR-2290')
      .stripped(-16, { method: 'warm-pull', ovenId: null, partPeakC: 160, minutesAbove345C: 0, ringsOn: true, explanation: 'Commutator stays on: no oven. Banding off, coils pulled with local heat.' })
      .ring(-14, 'core-test-after', '4 after')
      .rewound(-2, 'treatment'),
    tell(5)
      .comesIn(-8, { route: 'coil-rewind', complaint: 'Hums and drops plates.', promisedIn: 1 })
      .on(-7, async (job) => {
        await job.moveTo('incoming-test');
        await job.record('incoming-test', incomingTest(5, stage.meters, 0.8));
        await job.moveTo('awaiting-approval');
        await makeQuote(stage, job, rewindLines(14, 5, 'none').filter((l) => !/Bearings|core test/.test(l.description)));
      })
      .approved(-6, 'Enno Rost')
      .on(-5, async (job) => {
        await job.moveTo('rewind');
        await job.moveTo('treatment');
        await job.record('treatment', { process: 'dip-and-bake', material: 'polyester resin, class F', batch: 'PR-2612', bakeTemperatureC: 150, bakeMinutes: 360, cycles: 2 });
        await job.moveTo('final-test');
      }),
    tell(6)
      .comesIn(-37, { complaint: 'Turn fault in one coil group.', promisedIn: 20, reference: 'LH-2026-07' })
      .opened(-36, { corePlate: 'inorganic', frameMaterial: 'steel', inspection: 'One coil group burnt; maker’s letter says inorganic core plate.' }, 60)
      .ring(-35, 'core-test-before', '6 before')
      .quoted(-35, 240, 367.4, 'sleeve, relined')
      .approved(-34, 'Nele Brandt', 'purchase-order', 'LH-PO-5520')
      .stripped(-33, { method: 'oven-burnout', ovenId: 'O1', partPeakC: 371, minutesAbove345C: 240 })
      .ring(-21, 'core-test-after', '6 after')
      .rewound(-20, 'rewind'),
    tell(7)
      .comesIn(-12, { complaint: 'Came in stripped by another shop, their data lost.', promisedIn: 6 })
      .on(-11, async (job) => {
        await job.moveTo('incoming-test');
        await job.record('incoming-test', { ...incomingTest(7, stage.meters, 20), windingResistance: null });
        await job.moveTo('dismantled');
        await job.record('dismantling', { rotorOut: true, corePlate: 'unknown', frameMaterial: 'cast-iron', commutatorOrSlipRings: false, inspection: 'Stator came in stripped; no winding to copy.', fits: '' });
        await job.record('winding-as-found', winding(7, 'Taken from the sister machine; flux densities checked.'));
        await job.moveTo('core-test-before');
        await waive(stage, job, 'came-in-stripped', 'Stripped by another shop before it came to us.');
      })
      .quoted(-10, 44, 34.5, '6316/6316')
      .approved(-10, 'Søren Łukasik', 'phone', '', 15)
      .on(-10, async (job) => {
        await job.moveTo('strip-and-burnout');
        await job.record('strip', { method: 'cold-pull', ovenId: null, commutatorOrSlipRingsOn: false, wiresCountedAtCut: null, sampleCoilKept: false, partPeakC: null, minutesAbove345C: null, sensorPosition: '', explanation: 'Done by another shop; no record of oven or temperature.' });
        await job.moveTo('core-test-after');
      }, 16)
      .ring(-9, 'core-test-after', '7 after')
      .rewound(-8, 'rewind'),
    tell(8)
      .comesIn(-9, { complaint: 'Oven fan will not start.', promisedIn: -2 })
      .on(-8, async (job) => {
        await job.moveTo('incoming-test');
        await job.record('incoming-test', incomingTest(8, stage.meters));
        await job.act('counter', '/end', { version: (await job.sheet()).version, end: 'replaced', consentBy: 'Ute Holm', consentHow: 'phone', words: 'New motor sold instead; the old one scrapped with her consent.' });
      }),
    tell(9)
      .comesIn(-18, { complaint: 'Drew high current, one phase burnt.', promisedIn: 0 })
      .opened(-17, { ...castIron, inspection: 'One phase burnt at the end turns.' })
      .ring(-16, 'core-test-before', '9 before')
      .quoted(-16, 46, 24.9, '6316/6313')
      .approved(-15, 'Timo Pakkarinen')
      .stripped(-12, { method: 'oven-burnout', ovenId: 'O1', partPeakC: 349, minutesAbove345C: 70 })
      .on(-12, (job) => job.record('core-test-after', ringTest('9 after warm', instruments(stage))), 17)
      .ring(-11, 'core-test-after', '9 after')
      .rewound(-3, 'ready')
      .on(-2, issueCertificate),
    first
      .comesIn(-15, { complaint: 'Separator motor stalls, smells burnt.', contamination: 'food', promisedIn: -4 })
      .opened(-14, { corePlate: 'unknown', frameMaterial: 'aluminium', inspection: 'Winding burnt, aluminium frame sound.' })
      .ring(-13, 'core-test-before', '10 before')
      .quoted(-13, 16, 8.3, '6309/6309')
      .approved(-12, 'Anneke Voss')
      .stripped(-12, { method: 'warm-pull', ovenId: null, partPeakC: 278, minutesAbove345C: 0 })
      .ring(-10, 'core-test-after', '10 after')
      .rewound(-7, 'ready')
      .on(-6, issueCertificate)
      .on(-6, (job) => handOver(job, 'Anneke Voss'), 15)
      .on(-5, (job) => invoice(stage, job)),
    tell(11)
      .comesIn(-21, { complaint: 'Hoist motor, rotor bars to earth. Crane stands still.', promisedIn: 2 })
      .on(-20, async (job) => {
        await job.moveTo('incoming-test');
        await job.record('incoming-test', incomingTest(11, stage.meters));
        await job.moveTo('dismantled');
        await job.record('dismantling', { rotorOut: true, corePlate: 'unknown', frameMaterial: 'cast-iron', commutatorOrSlipRings: true, inspection: 'Rotor winding to earth in the slots.', fits: '' });
        await job.record('winding-as-found', winding(11));
        await job.moveTo('core-test-before');
      })
      .ring(-19, 'core-test-before', '11 before')
      .quoted(-19, 96, 54, 'NU319/6319')
      .approved(-18, 'Dörte Kai')
      .stripped(-17, { method: 'oven-burnout', ovenId: 'O1', partPeakC: 344, minutesAbove345C: 0, explanation: 'Slip rings taken off before the oven.' })
      .ring(-15, 'core-test-after', '11 after')
      .rewound(-14, 'rewind'),
    tell(12)
      .comesIn(-14, { complaint: 'Extruder motor trips after an hour.', promisedIn: 3 })
      .opened(-13, { ...castIron, inspection: 'Turn fault in phase V.' })
      .ring(-12, 'core-test-before', '12 before')
      .quoted(-12, 30, 17.6, '6313/6312')
      .approved(-11, 'Jan Corvel')
      .stripped(-10, { method: 'oven-burnout', ovenId: 'O2', partPeakC: 368, minutesAbove345C: 150 })
      .ring(-8, 'core-test-after', '12 after'),
    tell(13)
      .comesIn(-3, { route: 'recondition', complaint: 'Whey pump motor is loud.', contamination: 'food', promisedIn: 5 })
      .on(-2, async (job) => {
        await job.moveTo('incoming-test');
        await job.record('incoming-test', incomingTest(13, stage.meters, 240));
        await job.moveTo('dismantled');
        await job.record('dismantling', { rotorOut: true, corePlate: 'unknown', frameMaterial: 'aluminium', commutatorOrSlipRings: false, inspection: 'Bearings worn, winding sound.', fits: 'Bearing seat drive end 40.012 mm, in order.' });
        await job.moveTo('awaiting-approval');
        await makeQuote(stage, job, reconditionLines(6, '6208/6208'));
      }),
    tell(14)
      .comesIn(-2, { complaint: 'Hums and does not start after a lightning strike.', promisedIn: 8 })
      .opened(-1, { ...castIron, inspection: 'One phase to earth in the slot, core sound to the eye.' }),
  ];
  const back = tell(10);
  back.scenes.push({
    day: -1,
    hour: 8,
    play: async () => {
      await SampleJob.book(stage, {
        customer: { kind: 'known', customerId: stage.customer('dairy') },
        machine: { kind: 'known', machineId: stage.machines[10] },
        route: 'recondition',
        complaint: 'Bearing noise three days after it came back.',
        accessories: '',
        contamination: 'food',
        contaminationWords: '',
        promisedOn: stage.date(2),
        customerReference: '',
        warrantyOfJobId: first.jobId,
      });
    },
  });
  return [...[...stories, back].flatMap((s) => s.scenes), ...loads(stage, stories)].sort((a, b) => a.day - b.day || (a.hour ?? 8) - (b.hour ?? 8));
}
