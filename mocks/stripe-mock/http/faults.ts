/** What the control API has asked to go wrong with calls to the API. */
export interface Fault {
  /** `POST`, `GET` ... or `*`. */
  method: string;
  /** The beginning of a path, such as `/v1/refunds`; `/v1` takes every call. */
  path: string;
  kind: 'status' | 'hang' | 'reset';
  /** `after`: the work is done, only the answer goes wrong. */
  when: 'before' | 'after';
  /** For `status`. */
  status: number;
  code: string | null;
  /** How many more calls the fault takes. */
  left: number;
}

export class Faults {
  list: Fault[] = [];
  private hanging = new Set<() => void>();

  take(method: string, path: string): Fault | undefined {
    const fault = this.list.find((candidate) => candidate.left > 0 && (candidate.method === '*' || candidate.method === method) && path.startsWith(candidate.path));
    if (fault) fault.left -= 1;
    this.list = this.list.filter((candidate) => candidate.left > 0);
    return fault;
  }

  /** Waits until the caller has gone away or the control API lets go; says which. */
  hang(callerGone: (tell: () => void) => void): Promise<'let-go' | 'gone'> {
    return new Promise((resolve) => {
      const letGo = () => {
        this.hanging.delete(letGo);
        resolve('let-go');
      };
      this.hanging.add(letGo);
      callerGone(() => {
        this.hanging.delete(letGo);
        resolve('gone');
      });
    });
  }

  get hangingCalls(): number {
    return this.hanging.size;
  }

  letGo(): void {
    for (const go of [...this.hanging]) go();
  }
}
