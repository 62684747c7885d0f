import type { FileProblem, JobLoad, LoadReason, LoadRow, LoadVerdict, LoadView, LoggerFileView, PartLimitReason } from '@shared/burnouts';
import type { KeptRead } from './kept-read.js';
import type { Part } from './parts.service.js';

export interface FigureRow {
  id: string;
  number: number;
  ovenId: string;
  ovenName: string;
  day: string;
  limitC: number;
  limitReason: PartLimitReason;
  fileName: string | null;
  peakC: number | null;
  hottest: string | null;
  minutesAboveLimit: number | null;
  minutesAbove345C: number | null;
  verdict: LoadVerdict | null;
  reasons: string;
  by: string;
  createdAt: string;
  version: number;
}
export const FIGURES = `b.id, b.number, b.ovenId, b.ovenName, b.day, b.limitC, b.limitReason, b.fileName, b.peakC, b.hottest, b.minutesAboveLimit, b.minutesAbove345C, b.verdict, b.reasons, b.byName AS "by", b.createdAt, b.version`;

const figures = (row: FigureRow) => ({ ...row, reasons: JSON.parse(row.reasons) as LoadReason[] });

export type ListRow = FigureRow & { jobs: string };
/** The jobs of a load as one column, so that a page of loads is one statement. */
export const JOBS_COLUMN = `(SELECT json_group_array(json_object('jobId', j.id, 'number', j.number, 'machine', m.description)) FROM burnout_load_jobs x JOIN jobs j ON j.id = x.jobId JOIN machines m ON m.id = j.machineId WHERE x.loadId = b.id) AS jobs`;
export const toLoadRow = (row: ListRow): LoadRow => ({ ...figures(row), jobs: JSON.parse(row.jobs) as LoadRow['jobs'] });

export type OfJobRow = FigureRow & { ownLimitC: number; ownReason: PartLimitReason; others: number };
export function toJobLoad({ ownLimitC, ownReason, others, ...row }: OfJobRow): JobLoad {
  return { ...figures(row), own: { limitC: ownLimitC, limitReason: ownReason, overK: row.peakC === null ? null : row.peakC - ownLimitC }, others };
}

export type HeadRow = FigureRow & { remark: string; offsetK: number; limitSource: string; limitStanding: string; partChannels: string | null; storedName: string | null; sizeBytes: number | null; sha256: string | null; readAt: string | null; read: string | null };
export const HEAD_SELECT = `SELECT ${FIGURES}, b.remark, b.offsetK, b.limitSource, b.limitStanding, b.partChannels, b.storedName, b.sizeBytes, b.sha256, b.readAt, b.read FROM burnout_loads b WHERE b.id = ?`;
export interface LoadJobRow {
  jobId: string;
  number: string;
  machine: string;
  customer: string;
  ringsOff: number;
  limitC: number;
  limitReason: PartLimitReason;
}
export const LOAD_JOBS_SELECT = `SELECT x.jobId, j.number, m.description || CASE WHEN m.serial = '' THEN '' ELSE ' (' || m.serial || ')' END AS machine, c.name AS customer, x.ringsOff, x.limitC, x.limitReason
  FROM burnout_load_jobs x JOIN jobs j ON j.id = x.jobId JOIN machines m ON m.id = j.machineId JOIN customers c ON c.id = j.customerId WHERE x.loadId = ? ORDER BY j.number`;

export function toLoadView(head: HeadRow, jobs: readonly LoadJobRow[], parts: readonly Part[]): LoadView {
  const { partChannels, storedName: _stored, sizeBytes, sha256, readAt, read, remark, offsetK, limitSource, limitStanding, ...row } = head;
  const limitNow = new Map(parts.map((p) => [p.jobId, p.limit]));
  return {
    ...figures(row),
    remark,
    offsetK,
    limitSource,
    limitStanding,
    jobs: jobs.map((job) => {
      const now = limitNow.get(job.jobId);
      return { ...job, ringsOff: job.ringsOff === 1, overK: row.peakC === null ? null : row.peakC - job.limitC, limitChanged: now?.limitC !== job.limitC || now.limitReason !== job.limitReason };
    }),
    file: read === null ? null : fileView({ name: row.fileName!, sizeBytes: sizeBytes!, sha256: sha256!, readAt: readAt! }, JSON.parse(read) as KeptRead, JSON.parse(partChannels ?? '[]') as string[]),
  };
}

function fileView(file: Pick<LoggerFileView, 'name' | 'sizeBytes' | 'sha256' | 'readAt'>, read: KeptRead, onPart: readonly string[]): LoggerFileView {
  const { channels, problems, ...rest } = read;
  return { ...file, ...rest, problems: problems as FileProblem[], channels: channels.map((c) => ({ ...c, onPart: onPart.includes(c.name) })) };
}
