import type { EndJob, HoldJob, MoveJob, UpdateJob, JobSheet } from '@shared/jobs';
import { ROUTE_STEPS, stepIndex, type Route, type Step } from '@shared/route';

/** Steps a job can go back to: what lies behind it on its own route, the nearest first. */
export const stepsBehind = (route: Route, step: Step): readonly Step[] => ROUTE_STEPS[route].slice(0, Math.max(0, stepIndex(route, step))).reverse();

export type MoveBackForm = { to: Step | null; why: string };
export type HoldForm = { reason: string; waitingFor: HoldJob['waitingFor'] | null };
export type EndForm = { end: EndJob['end'] | null; consentBy: string; consentHow: EndJob['consentHow'] | null; words: string };

export const moveBackOf = (form: MoveBackForm, version: number) => ({ version, to: form.to, why: form.why }) as MoveJob;
export const holdOf = (form: HoldForm, version: number) => ({ version, ...form }) as HoldJob;
export const endOf = (form: EndForm, version: number) => ({ version, ...form }) as EndJob;

export type FactsForm = Omit<UpdateJob, 'version'>;
export const factsFormOf = ({ complaint, accessories, contamination, contaminationWords, promisedOn, customerReference }: FactsForm): FactsForm => ({ complaint, accessories, contamination, contaminationWords, promisedOn, customerReference });

export const isEnded = ({ state }: Pick<JobSheet, 'state'>): boolean => state !== 'open' && state !== 'on-hold';
