import { Injectable } from '@nestjs/common';
import type { CreateCustomer, CustomerPage, CustomerQuery, CustomerTerms, CustomerView, UpdateCustomer } from '@shared/customers';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { changedMeanwhile, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { changedFields } from '../jobs/changed-fields.js';
import { contains } from '../search/like-pattern.js';
import { Customer } from './customer.entity.js';
import { toCustomerView } from './customer-view.js';

/** The people the machines belong to. */
@Injectable()
export class CustomersService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
  ) {}

  async page({ page, size, q }: CustomerQuery): Promise<CustomerPage> {
    const where = q ? `WHERE c.name LIKE :q ESCAPE '\\' OR c.city LIKE :q ESCAPE '\\' OR c.contactName LIKE :q ESCAPE '\\' OR c.email LIKE :q ESCAPE '\\'` : '';
    const sought = q ? [{ q: contains(q) }] : [];
    const total = await this.db.one<{ total: number }>(`SELECT COUNT(*) AS total FROM customers c ${where}`, sought);
    const rows = await this.db.all<CustomerPage['rows'][number]>(
      `SELECT c.id, c.name, c.city, c.email,
              (SELECT COUNT(*) FROM jobs j WHERE j.customerId = c.id AND j.state IN ('open', 'on-hold')) AS openJobs,
              (SELECT COUNT(*) FROM machines m WHERE m.customerId = c.id) AS machines
       FROM customers c ${where} ORDER BY c.name COLLATE NOCASE, c.id LIMIT ${size} OFFSET ${(page - 1) * size}`,
      sought,
    );
    return { rows, total: total?.total ?? 0, page, size };
  }

  async one(id: string): Promise<CustomerView> {
    const row = await this.db.one<Parameters<typeof toCustomerView>[0]>('SELECT * FROM customers WHERE id = ?', [id]);
    if (!row) throw notFound('customer');
    return toCustomerView(row);
  }

  create(actor: Actor, details: CreateCustomer): Promise<CustomerView> {
    return this.unitOfWork.run(async (manager) => toCustomerView(await this.add(manager, actor, details)));
  }

  /** Also part of booking in. A new customer pays before collection until the office says otherwise. */
  async add(manager: EntityManager, actor: Actor, details: CreateCustomer): Promise<Customer> {
    const customer: Customer = { id: this.ids.next(), ...details, terms: 'prepayment', netDays: 0, creditStop: false, createdAt: this.clock.iso(), version: 1 };
    await manager.insert(Customer, customer);
    await this.history.record(manager, { actor, subject: { kind: 'customer', id: customer.id }, event: 'customer.created', words: `Customer ${customer.name} entered.`, data: { ...details } });
    return customer;
  }

  update(actor: Actor, id: string, { version, ...details }: UpdateCustomer): Promise<CustomerView> {
    return this.change(actor, id, version, details, 'customer.changed', (name) => `Details of ${name} changed.`);
  }

  setTerms(actor: Actor, id: string, { version, ...terms }: CustomerTerms): Promise<CustomerView> {
    return this.change(actor, id, version, terms, 'customer.terms-changed', (name) => `Terms of ${name}: ${termsWords(terms)}.`);
  }

  private change(actor: Actor, id: string, version: number, to: Partial<Customer>, event: string, words: (name: string) => string): Promise<CustomerView> {
    return this.unitOfWork.run(async (manager) => {
      const customer = await manager.findOneBy(Customer, { id });
      if (!customer) throw notFound('customer');
      if (customer.version !== version) throw changedMeanwhile('customer', toCustomerView(customer));
      const changed = changedFields(customer, to);
      if (!changed) return toCustomerView(customer);
      const next = { ...customer, ...to, version: customer.version + 1 };
      await manager.update(Customer, { id }, { ...to, version: next.version });
      await this.history.record(manager, { actor, subject: { kind: 'customer', id }, event, words: words(next.name), data: { ...changed } });
      return toCustomerView(next);
    });
  }
}

function termsWords(terms: Pick<CustomerTerms, 'terms' | 'netDays' | 'creditStop'>): string {
  const pays = terms.terms === 'prepayment' ? 'pays before collection' : `on account, ${terms.netDays} days net`;
  return terms.creditStop ? `${pays}, credit stop` : pays;
}
