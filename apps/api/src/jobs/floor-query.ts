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

export const NOT_ENDED = ['open', 'on-hold'] as const satisfies readonly JobState[];

/** What a list is sorted by; a job without a promise stands behind those with one, whichever way round. */
const SORT_KEY: Record<FloorQuery['sort'], string> = {
  number: 'j.number',
  promisedOn: 'j.promisedOn',
  receivedAt: 'j.receivedAt',
  step: `CASE j.step ${STEPS.map((step, at) => `WHEN '${step}' THEN ${at}`).join(' ')} END`,
  customer: '(SELECT lower(c.name) FROM customers c WHERE c.id = j.customerId)',
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
function pageOfIds(query: FloorQuery, today: string, reach: { limit: number; offset: number; after?: FloorPosition }): Statement {
  const direction = query.order === 'asc' ? 'ASC' : 'DESC';
  const beyond = query.order === 'asc' ? '>' : '<';
  const more = filter(query, today);
  const parameters: unknown[] = [];
  const branch = (state: JobState, tier: number, key: string, where: string): string => {
    parameters.push(state, ...more.parameters);
    let position = '';
    if (reach.after?.tier === tier) {
      position = ` AND (${key}, j.id) ${beyond} (?, ?)`;
      parameters.push(reach.after.key, reach.after.id);
    }
    const order = key === "''" ? '' : `${key} ${direction}, `;
    return `SELECT * FROM (SELECT ${tier} AS tier, ${key} AS "key", j.id AS id FROM jobs j WHERE j.state = ?${where}${more.sql}${position} ORDER BY ${order}j.id ${direction} LIMIT ${reach.limit + reach.offset})`;
  };
  const key = SORT_KEY[query.sort];
  const branches = statesOf(query).flatMap((state) => {
    if (query.sort !== 'promisedOn') return [branch(state, 0, key, '')];
    const promised = (reach.after?.tier ?? 0) === 0 ? [branch(state, 0, key, ' AND j.promisedOn IS NOT NULL')] : [];
    return [...promised, ...(query.late ? [] : [branch(state, 1, "''", ' AND j.promisedOn IS NULL')])];
  });
  return { sql: `SELECT tier, "key", id FROM (${branches.join(' UNION ALL ')}) ORDER BY tier, "key" ${direction}, id ${direction} LIMIT ${reach.limit} OFFSET ${reach.offset}`, parameters };
}

/** One page of the floor with what its rows show; null when there can be none. */
export function pageStatement(query: FloorQuery, today: string, reach: { limit: number; offset: number; after?: FloorPosition }): Statement | null {
  if (statesOf(query).length === 0) return null;
  const ids = pageOfIds(query, today, reach);
  const direction = query.order === 'asc' ? 'ASC' : 'DESC';
  return {
    sql: `WITH page AS MATERIALIZED (${ids.sql})
      SELECT page.tier, page."key", j.id, j.number, c.name AS customerName, m.description AS machine, j.route, j.step, j.state, j.holdReason, j.waitingFor, j.promisedOn, j.receivedAt,
             (j.promisedOn IS NOT NULL AND j.promisedOn < ? AND j.state IN ('open', 'on-hold')) AS late,
             (SELECT r.verdict FROM job_records r WHERE r.jobId = j.id AND r.kind IN ('core-test-before', 'core-test-after') ORDER BY r.kind, r.ordinal DESC LIMIT 1) AS coreVerdict
      FROM page CROSS JOIN jobs j ON j.id = page.id CROSS JOIN customers c ON c.id = j.customerId CROSS JOIN machines m ON m.id = j.machineId
      ORDER BY page.tier, page."key" ${direction}, page.id ${direction}`,
    parameters: [...ids.parameters, today],
  };
}
