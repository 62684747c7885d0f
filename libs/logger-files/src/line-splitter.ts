/** No row of a logger is longer; a longer one is a file of another kind, and is not held. */
export const LONGEST_LINE = 20_000;

export interface LineSplitter {
  write(chunk: string): void;
  end(): void;
}

/**
 * Cuts a stream of text into lines, wherever the pieces of the stream happen to end. A line ends with LF, CR LF or CR; the
 * mark at the very start of a file that only names its encoding is dropped. Of a line past `LONGEST_LINE` only the start is
 * held, and it is handed on as cut.
 *
 * @returns a splitter; `onLine` hears each line with its number, counted from 1
 */
export function createLineSplitter(onLine: (text: string, line: number, cut: boolean) => void): LineSplitter {
  let rest = '';
  let cut = false;
  let line = 0;
  let skipLineFeed = false;
  let atStart = true;

  const keep = (piece: string) => {
    if (cut) return;
    rest = rest === '' ? piece : rest + piece;
    if (rest.length > LONGEST_LINE) {
      rest = rest.slice(0, LONGEST_LINE);
      cut = true;
    }
  };
  const emit = () => {
    line += 1;
    const [text, wasCut] = [rest, cut];
    rest = '';
    cut = false;
    onLine(text, line, wasCut);
  };
  return {
    write(chunk) {
      let from = 0;
      if (atStart && chunk.length > 0) {
        atStart = false;
        if (chunk.charCodeAt(0) === 0xfeff) from = 1;
      }
      if (skipLineFeed && from < chunk.length) {
        skipLineFeed = false;
        if (chunk[from] === '\n') from += 1;
      }
      let nextReturn = chunk.indexOf('\r', from);
      let nextFeed = chunk.indexOf('\n', from);
      while (nextReturn >= 0 || nextFeed >= 0) {
        const end = nextReturn < 0 ? nextFeed : nextFeed < 0 ? nextReturn : Math.min(nextReturn, nextFeed);
        keep(chunk.slice(from, end));
        emit();
        from = end + 1;
        if (end === nextReturn) {
          if (from === chunk.length) skipLineFeed = true;
          else if (chunk[from] === '\n') from += 1;
          nextReturn = chunk.indexOf('\r', from);
        }
        if (nextFeed >= 0 && nextFeed < from) nextFeed = chunk.indexOf('\n', from);
      }
      if (from < chunk.length) keep(chunk.slice(from));
    },
    end() {
      if (rest !== '' || cut) emit();
    },
  };
}
