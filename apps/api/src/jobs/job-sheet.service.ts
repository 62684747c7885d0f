import { Injectable } from '@nestjs/common';
import type { CustomerView } from '@shared/customers';
import type { AttachmentView, CreatedJob, GateView, HistoryEntryView, JobSheet } from '@shared/jobs';
import { nextStep } from '@shared/route';
import { toCustomerView } from '../customers/customer-view.js';
import { ReadDb } from '../database/read-db.js';
import { HistoryService } from '../history/history.service.js';
import { notFound } from '../http/app-error.js';
import { toMachineView, visitsOf } from '../machines/machine-view.js';
import { conditionsBefore, gateConditions, gateIsOpen, gatesOf, stepBehind } from './gates.js';
import type { JobFacts, SignOffFact } from './job-facts.js';
import { FACT_COLUMNS, JobFactsService, type JobFactRow } from './job-facts.service.js';
import { isEnded } from './job-state.js';

type Head = JobFactRow &
  Pick<JobSheet, 'id' | 'number' | 'holdReason' | 'waitingFor' | 'complaint' | 'accessories' | 'contamination' | 'contaminationWords' | 'customerReference' | 'promisedOn' | 'receivedAt' | 'limitsVersion' | 'version'> &
  Omit<CustomerView, 'id' | 'version' | 'terms' | 'creditStop'> & {
    customerId: string;
    customerVersion: number;
    machineId: string;
    machineCustomerId: string;
    description: string;
    nameplate: string;
    coreGeometry: string | null;
    machineVersion: number;
    warrantyOfJobId: string | null;
    warrantyOfNumber: string | null;
  };

const HEAD = `SELECT j.id, j.number, j.holdReason, j.waitingFor, j.complaint, j.accessories, j.contamination, j.contaminationWords, j.customerReference, j.promisedOn, j.receivedAt, j.limitsVersion, j.version,
    j.warrantyOfJobId, w.number AS warrantyOfNumber, ${FACT_COLUMNS},
    c.id AS customerId, c.name, c.contactName, c.email, c.phone, c.addressLine1, c.addressLine2, c.postcode, c.city, c.country, c.taxNumber, c.netDays, c.version AS customerVersion,
    m.id AS machineId, m.customerId AS machineCustomerId, m.description, m.nameplate, m.coreGeometry, m.version AS machineVersion
  FROM jobs j JOIN customers c ON c.id = j.customerId JOIN machines m ON m.id = j.machineId JOIN limits_versions l ON l.version = j.limitsVersion LEFT JOIN jobs w ON w.id = j.warrantyOfJobId
  WHERE j.id = ?`;

/** One job with all that belongs to it: eight statements, whatever its size. */
@Injectable()
export class JobSheetService {
  constructor(
    private readonly db: ReadDb,
    private readonly facts: JobFactsService,
    private readonly history: HistoryService,
  ) {}

  async sheet(id: string): Promise<JobSheet> {
    const head = await this.db.one<Head>(HEAD, [id]);
    if (!head) throw notFound('job');
    const facts = await this.facts.around(this.db, id, head);
    return {
      id: head.id,
      number: head.number,
      route: head.route,
      step: head.step,
      state: head.state,
      holdReason: head.holdReason,
      waitingFor: head.waitingFor,
      complaint: head.complaint,
      accessories: head.accessories,
      contamination: head.contamination,
      contaminationWords: head.contaminationWords,
      customerReference: head.customerReference,
      promisedOn: head.promisedOn,
      receivedAt: head.receivedAt,
      warrantyOf: head.warrantyOfJobId && head.warrantyOfNumber ? { jobId: head.warrantyOfJobId, jobNumber: head.warrantyOfNumber } : null,
      limitsVersion: head.limitsVersion,
      version: head.version,
      customer: toCustomerView({ ...head, id: head.customerId, version: head.customerVersion }),
      machine: toMachineView({ ...head, id: head.machineId, customerId: head.machineCustomerId, customerName: head.name, version: head.machineVersion }, await visitsOf(this.db, head.machineId)),
      gates: gatesOf(head.route).map((gate) => toGateView(gate, facts)),
      next: nextOf(facts),
      signOffs: facts.signOffs.map(toSignOff),
      attachments: await this.attachments(id),
      papers: await this.papers(id),
    };
  }

  async byNumber(number: string): Promise<CreatedJob> {
    const row = await this.db.one<CreatedJob>('SELECT id, number FROM jobs WHERE number = ?', [number.trim().toUpperCase()]);
    if (!row) throw notFound('job');
    return row;
  }

  async historyOf(id: string): Promise<HistoryEntryView[]> {
    if (!(await this.db.one('SELECT id FROM jobs WHERE id = ?', [id]))) throw notFound('job');
    return this.history.ofJob(id);
  }

  private attachments(id: string): Promise<AttachmentView[]> {
    return this.db.all<AttachmentView>('SELECT id, name, mime, sizeBytes, addedByName AS addedBy, addedAt, recordId FROM attachments WHERE jobId = ? ORDER BY id', [id]);
  }

  private papers(id: string): Promise<JobSheet['papers']> {
    return this.db.all<JobSheet['papers'][number]>(
      'SELECT p.id, p.kind, p.number, p.issuedAt, n.number AS supersededBy FROM papers p LEFT JOIN papers n ON n.id = p.supersededById WHERE p.jobId = ? ORDER BY p.id',
      [id],
    );
  }
}

function toGateView(gate: GateView['gate'], facts: JobFacts): GateView {
  const conditions = gateConditions(gate, facts);
  return { gate, open: gateIsOpen(conditions), before: stepBehind(gate), conditions };
}

function nextOf(facts: JobFacts): JobSheet['next'] {
  const step = isEnded(facts.state) ? null : nextStep(facts.route, facts.step);
  if (!step) return null;
  const conditions = conditionsBefore(step, facts);
  return { step, open: gateIsOpen(conditions), conditions };
}

const toSignOff = (s: SignOffFact): JobSheet['signOffs'][number] => ({
  id: s.id,
  kind: s.kind,
  recordId: s.recordId,
  by: s.byName,
  byRoles: s.byRoles,
  at: s.at,
  reason: s.reason,
  detail: s.detail,
  contentHash: s.contentHash,
  version: s.version,
});
