import { parentPort } from 'node:worker_threads';
import { drawHere } from './draw-here.js';
import type { DrawAnswer, DrawRequest } from './draw-paper.js';

/** The thread that draws papers, so that no request waits for one. Started by the press beside it. */
const port = parentPort;
if (!port) throw new Error('The paper worker runs as a worker thread only.');

async function answer({ id, model }: DrawRequest): Promise<DrawAnswer> {
  try {
    return { id, bytes: await drawHere(model) };
  } catch (error) {
    const { message, stack = '' } = error instanceof Error ? error : new Error(String(error));
    return { id, message, stack };
  }
}

port.on('message', (request: DrawRequest) => {
  void answer(request).then((told) => port.postMessage(told));
});
