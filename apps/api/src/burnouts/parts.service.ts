import { Injectable } from '@nestjs/common';
import { partLimit } from '@shared/burnout-limit';
import type { PartLimitReason } from '@shared/burnouts';
import type { BurnoutLimits } from '@shared/limits';
import type { ReadingsOf } from '@shared/records';
import { hasReached, type JobState, type Route, type Step } from '@shared/route';
import type { QuerySource } from '../database/query-source.js';
import type { PartLimit } from './load-limit.js';

interface Row {
  jobId: string;
  number: string;
  customer: string;
  machine: string;
  route: Route;
  step: Step;
  state: JobState;
  burnout: string;
  dismantling: string | null;
  loads: string;
}

/** A job as the oven sees it: what it stands, and whether it may go in. */
export interface Part extends Omit<Row, 'burnout' | 'dismantling' | 'loads'> {
  /** null: not dismantled yet, so that no limit is known */
  readonly limit: PartLimit | null;
  readonly rings: boolean;
  /** numbers of the loads it stood in already */
  readonly loads: readonly number[];
}

const SELECT = `SELECT j.id AS jobId, j.number, c.name AS customer, m.description || CASE WHEN m.serial = '' THEN '' ELSE ' (' || m.serial || ')' END AS machine, j.route, j.step, j.state,
    json_extract(l."set", '$.burnout') AS burnout, v.readings AS dismantling,
    (SELECT json_group_array(b.number) FROM burnout_load_jobs x JOIN burnout_loads b ON b.id = x.loadId WHERE x.jobId = j.id) AS loads
  FROM jobs j JOIN customers c ON c.id = j.customerId JOIN machines m ON m.id = j.machineId JOIN limits_versions l ON l.version = j.limitsVersion
  LEFT JOIN job_records d ON d.jobId = j.id AND d.kind = 'dismantling' LEFT JOIN record_revisions v ON v.recordId = d.id AND v.revision = d.revision`;

/** The limit of each part by its dismantling and the limits it was received under. */
@Injectable()
export class PartsService {
  async ofJobs(source: QuerySource, jobIds: readonly string[]): Promise<Part[]> {
    const rows = await source.query<Row[]>(`${SELECT} WHERE j.id IN (${jobIds.map(() => '?').join(', ')})`, [...jobIds]);
    return rows.map(toPart);
  }

  /** Jobs that stand at the strip, or have just left it and may be written down late. */
  async beforeTheOven(source: QuerySource): Promise<Part[]> {
    const rows = await source.query<Row[]>(`${SELECT} WHERE j.state IN ('open', 'on-hold') AND j.route = 'rewind' AND j.step IN ('strip-and-burnout', 'core-test-after') ORDER BY j.step DESC, j.number`);
    return rows.map(toPart);
  }
}

function toPart({ burnout, dismantling, loads, ...row }: Row): Part {
  const found = dismantling === null ? null : (JSON.parse(dismantling) as ReadingsOf<'dismantling'>);
  return { ...row, limit: found && limitOf(found, JSON.parse(burnout) as BurnoutLimits), rings: found?.commutatorOrSlipRings ?? false, loads: JSON.parse(loads) as number[] };
}

function limitOf(dismantling: ReadingsOf<'dismantling'>, limits: BurnoutLimits): PartLimit {
  const { limitC } = partLimit(dismantling, limits);
  const limitReason: PartLimitReason = dismantling.frameMaterial === 'aluminium' && limitC === limits.aluminiumFrameC ? 'aluminium' : dismantling.corePlate;
  return { limitC, limitReason, limitSource: limits.source, limitStanding: limits.standing };
}

/** Why a job cannot stand in a load, in words; null when it can. */
export function loadingProblem(part: Part, ringsOff: boolean): { code: string; words: string } | null {
  if (part.state !== 'open' && part.state !== 'on-hold') return { code: 'ended', words: `${part.number} has ended.` };
  if (!hasReached(part.route, part.step, 'strip-and-burnout')) return { code: 'not-there-yet', words: `${part.number} has not come to the strip yet; its gate stands before it.` };
  if (part.limit === null) return { code: 'limit-unknown', words: `${part.number}: record the dismantling first. Core plate and frame set the limit of the load.` };
  if (part.rings && !ringsOff) return { code: 'rings-on', words: `${part.number} has a commutator or slip rings. Take them off and say so, or strip another way.` };
  return null;
}
