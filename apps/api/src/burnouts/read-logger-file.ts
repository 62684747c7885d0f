import { createReadStream } from 'node:fs';
import { open } from 'node:fs/promises';
import { createLoggerReader, type LoggerReaderOptions, type LoggerSummary } from '@libs/logger-files';

/** Reads a kept file from end to end in pieces; no more of it is held than one piece. */
export async function readLoggerFile(path: string, options: LoggerReaderOptions): Promise<LoggerSummary> {
  const reader = createLoggerReader(options);
  const decoder = new TextDecoder(await encodingOf(path));
  for await (const bytes of createReadStream(path) as AsyncIterable<Buffer>) reader.write(decoder.decode(bytes, { stream: true }));
  reader.write(decoder.decode());
  return reader.end();
}

/** Spreadsheets save "Unicode text" in sixteen bits, told by its first two bytes; everything else is read as UTF-8, and a degree sign it spoils is known to the reader. */
async function encodingOf(path: string): Promise<'utf-8' | 'utf-16le' | 'utf-16be'> {
  const handle = await open(path);
  try {
    const { buffer, bytesRead } = await handle.read(Buffer.alloc(2), 0, 2, 0);
    if (bytesRead < 2) return 'utf-8';
    if (buffer[0] === 0xff && buffer[1] === 0xfe) return 'utf-16le';
    return buffer[0] === 0xfe && buffer[1] === 0xff ? 'utf-16be' : 'utf-8';
  } finally {
    await handle.close();
  }
}
