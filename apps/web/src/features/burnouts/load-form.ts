import type { CorrectLoad, CreateLoad, LoadView, PartLimitReason, WaitingJob } from '@shared/burnouts';
import type { UnitSystem } from '@libs/quantities';
import { FormReader, typedFrom, type FormProblem, type Typed } from '../../lib/typed.js';

/** Ticks by the job they belong to; a job that is gone meanwhile takes its tick with it. */
export interface LoadValues {
  ovenId: string | null;
  day: string | null;
  chosen: Record<string, boolean>;
  ringsOff: Record<string, boolean>;
  countedAndSampled: boolean;
  remark: string;
}

export const emptyLoad = (today: string): LoadValues => ({ ovenId: null, day: today, chosen: {}, ringsOff: {}, countedAndSampled: false, remark: '' });

export const chosenJobs = (values: Pick<LoadValues, 'chosen'>, waiting: readonly WaitingJob[]): WaitingJob[] => waiting.filter((w) => values.chosen[w.jobId] === true);

/** The form as the contract takes it; what is missing is left for the contract to say. */
export function readLoad(values: LoadValues, waiting: readonly WaitingJob[]): { [K in keyof CreateLoad]: unknown } {
  const jobs = chosenJobs(values, waiting).map(({ jobId }) => ({ jobId, ringsOff: values.ringsOff[jobId] === true }));
  return { ovenId: values.ovenId ?? '', day: values.day ?? '', jobs, remark: values.remark, countedAndSampled: values.countedAndSampled };
}

/** The server names jobs by their place in what was sent; on the form each has its own tick. */
export function atTheirTicks(problems: readonly FormProblem[], sent: readonly { readonly jobId: string }[], ticks: 'chosen' | 'jobs' = 'chosen'): FormProblem[] {
  return problems.map(({ path, message }) => {
    const [, place, field] = /^jobs\.(\d+)\.(\w+)$/.exec(path) ?? [];
    const job = place === undefined ? undefined : sent[Number(place)];
    return job ? { path: `${field === 'ringsOff' ? 'ringsOff' : ticks}.${job.jobId}`, message } : { path, message };
  });
}

export interface FormLimit {
  readonly limitC: number;
  readonly limitReason: PartLimitReason;
  readonly number: string;
}
/** The lowest limit of what is chosen; null while nothing is. */
export function formLimit(jobs: readonly WaitingJob[]): FormLimit | null {
  return jobs.reduce<FormLimit | null>((lowest, { own, number }) => (own && (!lowest || own.limitC < lowest.limitC) ? { ...own, number } : lowest), null);
}

export interface CorrectionValues {
  reason: string;
  ovenId: string | null;
  day: string | null;
  jobs: Record<string, boolean>;
  ringsOff: Record<string, boolean>;
  onPart: Record<string, boolean>;
  offsetK: Typed;
  remark: string;
}

export function correctionOf(load: LoadView, system: UnitSystem): CorrectionValues {
  return {
    reason: '',
    ovenId: load.ovenId,
    day: load.day,
    jobs: Object.fromEntries(load.jobs.map((j) => [j.jobId, true])),
    ringsOff: Object.fromEntries(load.jobs.map((j) => [j.jobId, j.ringsOff])),
    onPart: Object.fromEntries((load.file?.channels ?? []).map((c, i) => [channelKey(i), c.onPart])),
    offsetK: typedFrom(load.offsetK, 'temperature-difference', system),
    remark: load.remark,
  };
}

export interface JobOfLoad {
  readonly jobId: string;
  readonly number: string;
  readonly machine: string;
  /** asked whether they are off */
  readonly rings: boolean;
}
/** Whom a load may be corrected to hold: who is in it, and who could have been. */
export function jobsToCorrect(load: LoadView, waiting: readonly WaitingJob[]): JobOfLoad[] {
  const inside = load.jobs.map(({ jobId, number, machine, ringsOff }) => ({ jobId, number, machine, rings: ringsOff }));
  return [...inside, ...waiting.filter((w) => w.own !== null && !inside.some((j) => j.jobId === w.jobId)).map(({ jobId, number, machine, rings }) => ({ jobId, number, machine, rings }))];
}

/** Names of thermocouples may hold dots, which are paths to a form. */
export const channelKey = (index: number) => `t${index}`;

export function readCorrection(values: CorrectionValues, load: LoadView, candidates: readonly JobOfLoad[] = jobsToCorrect(load, [])): { candidate: { [K in keyof CorrectLoad]: unknown }; problems: FormProblem[] } {
  const reader = new FormReader();
  const offsetK = reader.may('offsetK', values.offsetK, 'temperature-difference') ?? 0;
  const partChannels = load.file?.channels.filter((_, i) => values.onPart[channelKey(i)] === true).map((c) => c.name) ?? null;
  const jobs = candidates.filter((j) => values.jobs[j.jobId] === true).map(({ jobId }) => ({ jobId, ringsOff: values.ringsOff[jobId] === true }));
  return { candidate: { version: load.version, reason: values.reason, ovenId: values.ovenId ?? '', day: values.day ?? '', jobs, remark: values.remark, partChannels, offsetK }, problems: reader.problems };
}
