import { screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { inShop, refusal, server, somebody } from '../../../../test/in-shop.js';
import { beforeItsFile, overheated, waiting } from '../sample-load.fixture.js';
import { CorrectLoad } from './correct-load.js';
import { FileDrop } from './file-drop.js';
import { FileRead } from './file-read.js';
import { JobLoads } from './job-loads.js';
import { LoadCurve } from './load-curve.js';
import { LoadList } from './load-list.js';
import { LoadVerdict } from './load-verdict.js';
import { NewLoad } from './new-load.js';

const person = userEvent.setup({ applyAccept: false });
const OVENS = [{ id: 'O1', name: 'O1', remark: '' }, { id: 'O2', name: 'O2', remark: 'big' }];
const csv = (name = 'night.csv', size = 12) => Object.defineProperty(new File(['Time;Core'], name, { type: 'text/csv' }), 'size', { value: size });
const choose = (file: File) => person.upload(screen.getByLabelText('Choose the file', { selector: 'input' }), file);

beforeEach(() => localStorage.clear());
afterEach(() => vi.unstubAllGlobals());

describe('a new load', () => {
  const open = (onKept = vi.fn()) => {
    inShop(<NewLoad waiting={waiting} ovens={OVENS} today="2026-11-09" onKept={onKept} />);
    return onKept;
  };
  it('shows the lowest limit as soon as the jobs are ticked', async () => {
    open();
    expect(screen.getByText('Choose the jobs: the lowest limit among them counts.')).toBeDefined();
    await person.click(screen.getByRole('checkbox', { name: /J2026-0004/ }));
    expect(screen.getByRole('heading', { name: /Limit of this load: 370/ })).toBeDefined();
    await person.click(screen.getByRole('checkbox', { name: /J2026-0010/ }));
    expect(screen.getByRole('heading', { name: /Limit of this load: 300/ })).toBeDefined();
    expect(screen.getByText('Set by J2026-0010: aluminium frame.')).toBeDefined();
  });

  it('asks for what is missing, at its place, and then sends it once', async () => {
    const asked = server(() => [201, beforeItsFile]);
    const onKept = open();
    await person.click(screen.getByRole('button', { name: 'Put into the oven' }));
    expect(await screen.findByText('Choose the oven.')).toBeDefined();
    expect(screen.getByText('Choose the jobs that stand in the oven.')).toBeDefined();
    expect(screen.getByText(/Count the wires at the cut/)).toBeDefined();
    expect(asked).toEqual([]);
    await person.selectOptions(screen.getByLabelText('Oven'), 'O2');
    await person.click(screen.getByRole('checkbox', { name: /J2026-0011/ }));
    await person.click(screen.getByRole('checkbox', { name: /J2026-0011: commutator or slip rings are off/ }));
    await person.click(screen.getByRole('checkbox', { name: /Wires are counted/ }));
    await person.click(screen.getByRole('button', { name: 'Put into the oven' }));
    await waitFor(() => expect(onKept).toHaveBeenCalledWith(beforeItsFile));
    const sent = asked.filter((a) => a.method === 'POST');
    expect(sent).toHaveLength(1);
    expect(sent[0]!.body).toEqual({ ovenId: 'O2', day: '2026-11-09', jobs: [{ jobId: 'job-0000011', ringsOff: true }], remark: '', countedAndSampled: true });
    expect(sent[0]!.idempotencyKey).toMatch(/^[0-9a-f]{32}$/);
  });

  it('the server’s refusal stands at the job it is about, and every tick stays', async () => {
    server(() => refusal(422, 'READINGS_NOT_VALID', 'The load cannot stand like this.', { fields: [{ path: 'jobs.0.jobId', code: 'ended', message: 'J2026-0004 has ended.' }] }));
    open();
    await person.selectOptions(screen.getByLabelText('Oven'), 'O2');
    await person.click(screen.getByRole('checkbox', { name: /J2026-0004/ }));
    await person.click(screen.getByRole('checkbox', { name: /Wires are counted/ }));
    await person.click(screen.getByRole('button', { name: 'Put into the oven' }));
    expect(await screen.findByText('J2026-0004 has ended.')).toBeDefined();
    expect(screen.getByRole<HTMLInputElement>('checkbox', { name: /J2026-0004/ }).checked).toBe(true);
  });

  it('says what to do when nobody stands before the oven', () => {
    inShop(<NewLoad waiting={[]} ovens={OVENS} today="2026-11-09" onKept={vi.fn()} />);
    expect(screen.getByText('No job stands before the oven')).toBeDefined();
  });
});

describe('the logger’s file', () => {
  it('is sent with the load’s version', async () => {
    const asked = server(() => [201, overheated]);
    const onTaken = vi.fn();
    inShop(<FileDrop load={beforeItsFile} onTaken={onTaken} />);
    await choose(csv());
    await waitFor(() => expect(onTaken).toHaveBeenCalled());
    expect(asked[0]).toMatchObject({ method: 'POST', path: `/burnouts/${beforeItsFile.id}/file?version=1` });
    expect(((asked[0]!.body as FormData).get('file') as File).name).toBe('night.csv');
  });

  it('one that leaves its unit of time open asks for it, and is read with the answer', async () => {
    let tries = 0;
    const words = 'The time is counted in numbers, but nothing says in what. Say whether they are seconds, minutes or hours.';
    const asked = server(() => (tries++ === 0 ? refusal(422, 'FILE_NOT_ACCEPTED', words, { fields: [{ path: 'elapsedUnit', code: 'elapsed-unit-unknown', message: words }] }) : [201, overheated]));
    inShop(<FileDrop load={beforeItsFile} />);
    await choose(csv());
    const box = await screen.findByRole('alert');
    expect(within(box).getAllByText(words)).toHaveLength(1);
    await person.click(within(box).getByRole('button', { name: 'minutes' }));
    await waitFor(() => expect(asked).toHaveLength(2));
    expect(asked[1]!.path).toBe(`/burnouts/${beforeItsFile.id}/file?version=1&elapsedUnit=min`);
    expect(asked[1]!.idempotencyKey).not.toBe(asked[0]!.idempotencyKey);
  });

  it('one that is none says why, with its lines, and that nothing was changed', async () => {
    server(() => refusal(422, 'FILE_NOT_ACCEPTED', 'The dates cannot be told.', { fields: [{ path: 'dateOrder', code: 'date-order-contradicted', message: 'The dates cannot be told.' }, { path: 'file', code: 'row-not-read', message: 'Line 7 has no time that can be read.' }] }));
    inShop(<FileDrop load={beforeItsFile} />);
    await choose(csv('letter.txt'));
    expect(await screen.findByText('letter.txt could not be read')).toBeDefined();
    expect(screen.getByText('Line 7 has no time that can be read.')).toBeDefined();
    expect(screen.getByText('Nothing was changed. The load waits for its file.')).toBeDefined();
    expect(screen.getByRole('button', { name: 'the month first' })).toBeDefined();
  });

  it('one that is too large is not even sent', async () => {
    const asked = server(() => [201, overheated]);
    inShop(<FileDrop load={beforeItsFile} />);
    await choose(csv('year.csv', 70_000_000));
    expect(await screen.findByText(/This file has 70.0.MB/)).toBeDefined();
    expect(asked).toEqual([]);
  });

  it('a lost connection keeps the page as it is and says so', async () => {
    server(() => undefined);
    inShop(<FileDrop load={beforeItsFile} />);
    await choose(csv());
    expect(await screen.findByText(/does not answer/)).toBeDefined();
  });
});

describe('a load that was burnt', () => {
  it('over its limit marks every job, also the one within its own', () => {
    inShop(<LoadVerdict load={overheated} />);
    expect(screen.getByText('does not conform')).toBeDefined();
    const jobs = screen.getAllByRole('listitem');
    expect(jobs).toHaveLength(2);
    for (const job of jobs) expect(job.textContent).toContain('in a load that went over');
    expect(jobs[1]!.textContent).toContain('within its own limit of 450 °C, inorganic core plate');
    expect(jobs[1]!.textContent).toContain('were changed since');
    expect(within(jobs[0]!).getByRole('link', { name: 'J2026-0004' }).getAttribute('href')).toBe('/jobs/job-0000004');
  });

  it('before its file says that nobody can tell yet', () => {
    inShop(<LoadVerdict load={beforeItsFile} />);
    expect(screen.getByText('The logger’s file is still to come')).toBeDefined();
    expect(screen.queryByText('does not conform')).toBeNull();
  });

  it('draws the parts with their limit, not the hotter air of the oven', () => {
    inShop(<LoadCurve load={overheated} />);
    const [picture] = screen.getAllByRole('img', { name: /Load 3 · O2/ });
    expect(picture!.querySelector('desc')?.textContent).toContain('Core: peak 446 °C; limit 370 °C, core plate unknown');
    expect(picture!.textContent).not.toContain('470');
  });

  it('shows what the file has wrong by its line, and the thermocouple without a reading', () => {
    inShop(<FileRead loadId={overheated.id} file={overheated.file!} />);
    expect(screen.getByText('Line 242, Core: "open" is no temperature.')).toBeDefined();
    expect(screen.getByText('no reading; was it plugged in?')).toBeDefined();
    expect(screen.getByRole('link', { name: 'The file as it came' }).getAttribute('href')).toBe(`/api/burnouts/${overheated.id}/file`);
  });

  it('stands in the list with a link, or waits for its file', () => {
    inShop(<LoadList page={{ rows: [overheated, { ...beforeItsFile, id: '01a1c1e5-load-0004', number: 4 }].map(({ remark: _r, offsetK: _o, limitSource: _s, limitStanding: _t, file: _f, ...row }) => ({ ...row, jobs: row.jobs.map(({ jobId, number, machine }) => ({ jobId, number, machine })) })), total: 2, page: 1, size: 25 }} />);
    expect(screen.getByRole('link', { name: 'Load 3' }).getAttribute('href')).toBe(`/bay/burnouts/${overheated.id}`);
    expect(screen.getByText('file still to come')).toBeDefined();
  });

  it('is on the sheet of its job, and the sheet is silent where there is none', async () => {
    const { remark: _r, offsetK: _o, limitSource: _s, limitStanding: _t, file: _f, jobs: _j, ...figures } = overheated;
    server(({ path }) => [200, path === '/jobs/job-0000005/burnouts' ? [{ ...figures, own: { limitC: 450, limitReason: 'inorganic', overK: -4 }, others: 1 }] : []]);
    inShop(<JobLoads jobId="job-0000005" />);
    expect(await screen.findByText('within its own limit of 450 °C, inorganic core plate')).toBeDefined();
    expect(screen.getByText(/with one other job/)).toBeDefined();
  });
});

describe('correcting a load', () => {
  const open = (onClose = vi.fn()) => {
    inShop(<CorrectLoad load={overheated} ovens={OVENS} waiting={waiting} onClose={onClose} />, { me: somebody(['technician']) });
    return onClose;
  };
  it('asks why, and sends what is put right', async () => {
    const asked = server(() => [200, { ...overheated, version: 3 }]);
    const onClose = open();
    await person.click(screen.getByRole('button', { name: 'Save and judge anew' }));
    expect(await screen.findByText('Why is it corrected?', { selector: '[role=alert]' })).toBeDefined();
    await person.type(screen.getByLabelText('Why is it corrected?'), 'Sensor reads 11 K low.');
    await person.clear(screen.getByLabelText(/Added to every reading/));
    await person.type(screen.getByLabelText(/Added to every reading/), '11');
    await person.click(screen.getByRole('checkbox', { name: 'T.3' }));
    await person.click(screen.getByRole('checkbox', { name: /^J2026-0011 ·/ }));
    await person.click(screen.getByRole('checkbox', { name: /^J2026-0011: commutator/ }));
    await person.click(screen.getByRole('button', { name: 'Save and judge anew' }));
    await waitFor(() => expect(onClose).toHaveBeenCalled());
    expect(asked.find((a) => a.method === 'PUT')?.body).toMatchObject({ version: 2, reason: 'Sensor reads 11 K low.', offsetK: 11, partChannels: ['Core'], jobs: [{ jobId: 'job-0000004', ringsOff: false }, { jobId: 'job-0000005', ringsOff: false }, { jobId: 'job-0000011', ringsOff: true }] });
  });

  it('shows both where somebody else was faster, and sends mine when told', async () => {
    const current = { ...overheated, version: 5, ovenId: 'O1' };
    let tries = 0;
    const asked = server(({ method }) => (method === 'PUT' && tries++ === 0 ? refusal(409, 'CHANGED_MEANWHILE', 'Somebody else changed this load meanwhile.', { current }) : [200, current]));
    const onClose = open();
    await person.type(screen.getByLabelText('Why is it corrected?'), 'Wrong day.');
    await person.click(screen.getByRole('button', { name: 'Save and judge anew' }));
    const row = await screen.findByRole('row', { name: /^Oven/ });
    expect(row.textContent).toBe('OvenO1O2');
    await person.click(screen.getByRole('button', { name: 'Keep mine and save' }));
    await waitFor(() => expect(onClose).toHaveBeenCalled());
    expect(asked.filter((a) => a.method === 'PUT').map((a) => (a.body as { version: number }).version)).toEqual([2, 5]);
  });
});
