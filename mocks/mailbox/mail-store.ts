import { fits, type Mail, type MailFilter } from './mail.js';

const KEPT = 500;

/** The mails in the order they came; the oldest go when there are too many. */
export class MailStore {
  private waiting = new Set<() => void>();

  constructor(
    private mails: Mail[],
    private readonly changed: (mails: Mail[]) => void,
  ) {}

  add(mail: Mail): void {
    this.mails = [...this.mails, mail].slice(-KEPT);
    this.changed(this.mails);
    for (const look of [...this.waiting]) look();
  }

  find(id: string): Mail | undefined {
    return this.mails.find((mail) => mail.id === id);
  }

  newestFirst(filter: MailFilter = {}): Mail[] {
    return this.mails.filter((mail) => fits(mail, filter)).reverse();
  }

  /** The newest mails that fit, waiting for the first one if there is none yet; an empty list when time is up. */
  async waitFor(filter: MailFilter, withinMs: number): Promise<Mail[]> {
    const now = this.newestFirst(filter);
    if (now.length > 0 || withinMs <= 0) return now;
    return new Promise((resolve) => {
      const done = () => {
        clearTimeout(timer);
        this.waiting.delete(look);
        resolve(this.newestFirst(filter));
      };
      const look = () => {
        if (this.newestFirst(filter).length > 0) done();
      };
      const timer = setTimeout(done, withinMs);
      this.waiting.add(look);
    });
  }

  remove(id: string): boolean {
    const before = this.mails.length;
    this.mails = this.mails.filter((mail) => mail.id !== id);
    this.changed(this.mails);
    return this.mails.length < before;
  }

  clear(): void {
    this.mails = [];
    this.changed(this.mails);
  }
}
