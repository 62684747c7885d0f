import { existsSync } from 'node:fs';
import { Worker } from 'node:worker_threads';
import type { PaperModel } from '@libs/documents';

export interface DrawRequest {
  readonly id: number;
  readonly model: PaperModel;
}
export type DrawAnswer = { readonly id: number; readonly bytes: Uint8Array } | { readonly id: number; readonly message: string; readonly stack: string };

interface Order {
  readonly request: DrawRequest;
  readonly resolve: (bytes: Uint8Array) => void;
  readonly reject: (error: Error) => void;
}

export interface PressOptions {
  /** the worker's file; the compiled one beside this file unless told */
  readonly workerFile?: URL;
  /** a paper that takes longer than this is given up, and its worker with it */
  readonly timeLimitMs?: number;
}

/**
 * Draws papers one after the other, off the main thread where the compiled worker stands beside this file,
 * and here where it does not (tests, development from source). A worker that dies takes only the paper it
 * was drawing with it: that one fails, the next gets a new worker.
 */
export class PaperPress {
  private readonly workerFile: URL;
  private readonly timeLimitMs: number;
  private readonly waiting: Order[] = [];
  private drawing: Order | null = null;
  private worker: Worker | null = null;
  private lastId = 0;
  private closed = false;

  constructor(options: PressOptions = {}) {
    this.workerFile = options.workerFile ?? new URL('./pdf-worker.js', import.meta.url);
    this.timeLimitMs = options.timeLimitMs ?? 30_000;
  }

  /** True where papers are drawn off the main thread. */
  get offMainThread(): boolean {
    return existsSync(this.workerFile);
  }

  draw(model: PaperModel): Promise<Uint8Array> {
    if (this.closed) return Promise.reject(new Error('The paper press is closed.'));
    return new Promise((resolve, reject) => {
      this.lastId += 1;
      this.waiting.push({ request: { id: this.lastId, model }, resolve, reject });
      this.next();
    });
  }

  /** Ends the worker; papers still waiting fail. */
  async close(): Promise<void> {
    this.closed = true;
    const left = [...(this.drawing ? [this.drawing] : []), ...this.waiting.splice(0)];
    this.drawing = null;
    for (const order of left) order.reject(new Error('The paper press was closed before this paper was drawn.'));
    await this.dismiss();
  }

  private next(): void {
    if (this.drawing || this.closed) return;
    const order = this.waiting.shift();
    if (!order) return;
    this.drawing = order;
    void (this.offMainThread ? this.drawInWorker(order.request) : this.drawHere(order.request)).then(
      (bytes) => this.done(order, () => order.resolve(bytes)),
      (error: unknown) => this.done(order, () => order.reject(error instanceof Error ? error : new Error(String(error)))),
    );
  }

  private done(order: Order, settle: () => void): void {
    if (this.drawing === order) this.drawing = null;
    settle();
    this.next();
  }

  private async drawHere({ model }: DrawRequest): Promise<Uint8Array> {
    // Loaded only where it is needed: a server that has its worker keeps the fonts and their parser out of this thread.
    const here = await import('./draw-here.js');
    return here.drawHere(model);
  }

  private drawInWorker(request: DrawRequest): Promise<Uint8Array> {
    const worker = (this.worker ??= this.hire());
    worker.ref();
    return new Promise<Uint8Array>((resolve, reject) => {
      const late = setTimeout(() => {
        finish(() => reject(new Error(`A paper took longer than ${this.timeLimitMs / 1000} s and was given up.`)));
        void this.dismiss();
      }, this.timeLimitMs);
      const onMessage = (answer: DrawAnswer) => {
        if (answer.id !== request.id) return;
        finish(() => ('bytes' in answer ? resolve(answer.bytes) : reject(Object.assign(new Error(answer.message), { stack: answer.stack }))));
      };
      const onError = (error: Error) => finish(() => reject(error));
      const onExit = (code: number) => finish(() => reject(new Error(`The paper worker ended (${code}) while drawing.`)));
      const finish = (settle: () => void) => {
        clearTimeout(late);
        worker.off('message', onMessage).off('error', onError).off('exit', onExit);
        worker.unref();
        settle();
      };
      worker.on('message', onMessage).on('error', onError).on('exit', onExit);
      worker.postMessage(request);
    });
  }

  private hire(): Worker {
    const worker = new Worker(this.workerFile);
    const gone = () => {
      if (this.worker === worker) this.worker = null;
    };
    // The listener of the paper being drawn tells its caller; this one only sees to it that the next gets a new worker.
    worker.on('error', gone).on('exit', gone);
    return worker;
  }

  private async dismiss(): Promise<void> {
    const worker = this.worker;
    this.worker = null;
    await worker?.terminate();
  }
}
