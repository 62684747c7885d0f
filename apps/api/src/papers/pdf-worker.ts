import { parentPort } from 'node:worker_threads';
import { drawPaper } from '@libs/documents';
import type { DrawAnswer, DrawRequest } from './draw-paper.js';
import { readPaperFonts } from './paper-fonts.js';

/** The thread that draws papers, so that no request waits for one. Started by the press beside it. */
const port = parentPort;
if (!port) throw new Error('The paper worker runs as a worker thread only.');

const fonts = readPaperFonts();

async function answer({ id, model }: DrawRequest): Promise<DrawAnswer> {
  try {
    return { id, bytes: await drawPaper(model, await fonts) };
  } catch (error) {
    const { message, stack = '' } = error instanceof Error ? error : new Error(String(error));
    return { id, message, stack };
  }
}

port.on('message', (request: DrawRequest) => {
  void answer(request).then((told) => port.postMessage(told));
});
