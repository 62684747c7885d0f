import type { FloorQuery } from '@shared/jobs';
import { JOB_STATES, STEPS, type JobState } from '@shared/route';
import { contains } from '../search/like-pattern.js';

/** SQL with its parameters, in the order of their question marks. */
export interface Statement {
  readonly sql: string;
  readonly parameters: readonly unknown[];
}

/** Where a page of the floor ended: the next one goes on behind it. */
export interface FloorPosition {
  readonly tier: number;
  readonly key: string | number;
  readonly id: string;
}

interface Reach {
  readonly limit: number;
  readonly offset: number;
  readonly after?: FloorPosition;
}

export const NOT_ENDED = ['open', 'on-hold'] as const satisfies readonly JobState[];

/** What a list is sorted by, where one column says it all. */
const SORT_KEY: Record<Exclude<FloorQuery['sort'], 'step' | 'promisedOn'>, string> = {
  number: 'j.number',
  receivedAt: 'j.receivedAt',
  customer: '(SELECT lower(c.name) FROM customers c WHERE c.id = j.customerId)',
};

/** A stretch of the list that is in order by itself; the tiers stand one after the other. */
interface Tier {
  readonly tier: number;
  /** null where the identifier alone orders it */
  readonly key: string | null;
  readonly where: string;
}

/** A job without a promise stands behind those with one, whichever way round; steps stand as the route goes. */
function tiersOf(query: FloorQuery): readonly Tier[] {
  switch (query.sort) {
    case 'promisedOn':
      return [{ tier: 0, key: 'j.promisedOn', where: ' AND j.promisedOn IS NOT NULL' }, ...(query.late ? [] : [{ tier: 1, key: null, where: ' AND j.promisedOn IS NULL' }])];
    case 'step':
      return STEPS.flatMap((step, tier) => (query.step && query.step !== step ? [] : [{ tier, key: null, where: ` AND j.step = '${step}'` }]));
    default:
      return [{ tier: 0, key: SORT_KEY[query.sort], where: '' }];
  }
}

const directionsOf = ({ sort, order }: FloorQuery): { direction: 'ASC' | 'DESC'; tiers: 'ASC' | 'DESC' } => {
  const direction = order === 'asc' ? 'ASC' : 'DESC';
  return { direction, tiers: sort === 'step' ? direction : 'ASC' };
};

function statesOf({ state, late }: FloorQuery): readonly JobState[] {
  const asked: readonly JobState[] = state === 'all' ? JOB_STATES : state === 'not-ended' ? NOT_ENDED : [state];
  return late ? asked.filter((s) => (NOT_ENDED as readonly JobState[]).includes(s)) : asked;
}

/** Everything but the state: step, lateness, and what was typed, sought in number, customer and machine. */
function filter(query: FloorQuery, today: string): Statement {
  const conditions: Statement[] = [];
  if (query.step) conditions.push({ sql: 'j.step = ?', parameters: [query.step] });
  if (query.late) conditions.push({ sql: 'j.promisedOn < ?', parameters: [today] });
  if (query.q) {
    const pattern = contains(query.q);
    conditions.push({
      sql: `(j.number LIKE ? ESCAPE '\\' OR j.customerReference LIKE ? ESCAPE '\\' OR j.customerId IN (SELECT id FROM customers WHERE name LIKE ? ESCAPE '\\') OR j.machineId IN (SELECT id FROM machines WHERE description LIKE ? ESCAPE '\\' OR serial LIKE ? ESCAPE '\\'))`,
      parameters: [pattern, pattern, pattern, pattern, pattern],
    });
  }
  return { sql: conditions.map((c) => ` AND ${c.sql}`).join(''), parameters: conditions.flatMap((c) => c.parameters) };
}

/** How many there are; null when there can be none. */
export function countStatement(query: FloorQuery, today: string): Statement | null {
  const states = statesOf(query);
  if (states.length === 0) return null;
  const { sql, parameters } = filter(query, today);
  return { sql: `SELECT COUNT(*) AS total FROM jobs j WHERE j.state IN (${states.map(() => '?').join(', ')})${sql}`, parameters: [...states, ...parameters] };
}

/**
 * The identifiers of one page, in order. Each state is walked along its own index and gives no more than the page needs;
 * then those few are merged. Sorting all jobs first would cost forty times as much with a hundred thousand of them.
 */
function pageOfIds(query: FloorQuery, today: string, { limit, offset, after }: Reach): Statement {
  const { direction, tiers } = directionsOf(query);
  const more = filter(query, today);
  const parameters: unknown[] = [];
  const isBehind = (tier: number) => !after || (tiers === 'ASC' ? tier >= after.tier : tier <= after.tier);
  const piece = (state: JobState, { tier, key, where }: Tier): string => {
    parameters.push(state, ...more.parameters);
    const beyond = after?.tier === tier ? position(key, direction, after, parameters) : '';
    return `SELECT * FROM (SELECT ${tier} AS tier, ${key ?? "''"} AS "key", j.id AS id FROM jobs j WHERE j.state = ?${where}${more.sql}${beyond} ORDER BY ${key ? `${key} ${direction}, ` : ''}j.id ${direction} LIMIT ${limit + offset})`;
  };
  const pieces = statesOf(query).flatMap((state) => tiersOf(query).filter(({ tier }) => isBehind(tier)).map((tier) => piece(state, tier)));
  return { sql: `SELECT tier, "key", id FROM (${pieces.join(' UNION ALL ')}) ORDER BY tier ${tiers}, "key" ${direction}, id ${direction} LIMIT ${limit} OFFSET ${offset}`, parameters };
}

function position(key: string | null, direction: 'ASC' | 'DESC', after: FloorPosition, parameters: unknown[]): string {
  const beyond = direction === 'ASC' ? '>' : '<';
  parameters.push(...(key ? [after.key] : []), after.id);
  return key ? ` AND (${key}, j.id) ${beyond} (?, ?)` : ` AND j.id ${beyond} ?`;
}

/** One page of the floor with what its rows show; null when there can be none. */
export function pageStatement(query: FloorQuery, today: string, reach: Reach): Statement | null {
  if (statesOf(query).length === 0) return null;
  const ids = pageOfIds(query, today, reach);
  const { direction, tiers } = directionsOf(query);
  return {
    sql: `WITH page AS MATERIALIZED (${ids.sql})
      SELECT page.tier, page."key", j.id, j.number, c.name AS customerName, m.description AS machine, j.route, j.step, j.state, j.holdReason, j.waitingFor, j.promisedOn, j.receivedAt,
             (j.promisedOn IS NOT NULL AND j.promisedOn < ? AND j.state IN ('open', 'on-hold')) AS late,
             (SELECT r.verdict FROM job_records r WHERE r.jobId = j.id AND r.kind IN ('core-test-before', 'core-test-after') ORDER BY r.kind, r.ordinal DESC LIMIT 1) AS coreVerdict
      FROM page CROSS JOIN jobs j ON j.id = page.id CROSS JOIN customers c ON c.id = j.customerId CROSS JOIN machines m ON m.id = j.machineId
      ORDER BY page.tier ${tiers}, page."key" ${direction}, page.id ${direction}`,
    parameters: [...ids.parameters, today],
  };
}
