import { inflateSync } from 'node:zlib';

/**
 * Reads the words of a PDF back, page by page, from its bytes alone: the content streams and the ToUnicode maps
 * (PDF 1.7, 9.10.3), not the library that wrote them. Regular is embedded before bold.
 */
export function readTextBack(bytes: Uint8Array): string[] {
  const streams = [...streamsOf(bytes)];
  const maps = streams.filter((stream) => stream.includes('beginbfchar') || stream.includes('beginbfrange')).map(mapOf);
  const [regular, bold] = maps;
  return streams
    .filter((stream) => / Tj\b/.test(stream))
    .map((content) => {
      const words: string[] = [];
      let map = regular;
      for (const [, font, hex] of content.matchAll(/\/([RB])\S* [\d.]+ Tf|<([0-9A-Fa-f]+)> Tj/g)) {
        if (font) map = font === 'B' ? bold : regular;
        else if (hex) words.push((hex.match(/.{4}/g) ?? []).map((code) => map?.get(Number.parseInt(code, 16)) ?? '?').join(''));
      }
      return words.join('\n');
    });
}

function* streamsOf(bytes: Uint8Array): Generator<string> {
  const file = Buffer.from(bytes);
  for (let at = file.indexOf('stream\n'); at >= 0; at = file.indexOf('stream\n', at + 1)) {
    if (file.subarray(at - 3, at).toString('latin1') === 'end') continue;
    const from = at + 'stream\n'.length;
    const to = file.indexOf('endstream', from);
    try {
      yield inflateSync(file.subarray(from, to)).toString('latin1');
    } catch {
      yield file.subarray(from, to).toString('latin1');
    }
  }
}

function mapOf(stream: string): Map<number, string> {
  const map = new Map<number, string>();
  for (const [, code = '', hex = ''] of stream.matchAll(/<([0-9A-Fa-f]{4})>\s*<([0-9A-Fa-f]+)>/g)) {
    map.set(Number.parseInt(code, 16), String.fromCharCode(...(hex.match(/.{4}/g) ?? []).map((unit) => Number.parseInt(unit, 16))));
  }
  return map;
}
