/** A path as the page takes it: absolute, and with cubic curves only. */
export type Segment =
  | { readonly to: 'move' | 'line'; readonly x: number; readonly y: number }
  | { readonly to: 'curve'; readonly x1: number; readonly y1: number; readonly x2: number; readonly y2: number; readonly x: number; readonly y: number }
  | { readonly to: 'close' };

const ARGUMENTS: Record<string, number> = { M: 2, L: 2, H: 1, V: 1, C: 6, S: 4, Q: 4, T: 2, A: 7, Z: 0 };

/**
 * Reads the SVG 1.1 path grammar (section 8.3) as far as our drawings use it: all commands, absolute and relative.
 * @throws when a letter is not a path command or numbers are missing; a broken drawing must not be printed half.
 */
export function readPath(d: string): Segment[] {
  const segments: Segment[] = [];
  let x = 0;
  let y = 0;
  let startX = 0;
  let startY = 0;
  let controlX = 0;
  let controlY = 0;
  let before = '';
  for (const [command, numbers] of commandsOf(d)) {
    const relative = command !== command.toUpperCase();
    const name = command.toUpperCase();
    const dx = relative ? x : 0;
    const dy = relative ? y : 0;
    const n = (index: number) => numbers[index] ?? 0;
    switch (name) {
      case 'M':
        x = n(0) + dx;
        y = n(1) + dy;
        startX = x;
        startY = y;
        segments.push({ to: 'move', x, y });
        break;
      case 'L':
      case 'H':
      case 'V':
        x = name === 'V' ? x : n(0) + dx;
        y = name === 'H' ? y : n(name === 'V' ? 0 : 1) + dy;
        segments.push({ to: 'line', x, y });
        break;
      case 'C':
      case 'S': {
        const smooth = name === 'S';
        const reflect = smooth && /[CS]/.test(before);
        const x1 = smooth ? (reflect ? 2 * x - controlX : x) : n(0) + dx;
        const y1 = smooth ? (reflect ? 2 * y - controlY : y) : n(1) + dy;
        const shift = smooth ? 0 : 2;
        controlX = n(shift) + dx;
        controlY = n(shift + 1) + dy;
        x = n(shift + 2) + dx;
        y = n(shift + 3) + dy;
        segments.push({ to: 'curve', x1, y1, x2: controlX, y2: controlY, x, y });
        break;
      }
      case 'Q':
      case 'T': {
        const smooth = name === 'T';
        const reflect = smooth && /[QT]/.test(before);
        controlX = smooth ? (reflect ? 2 * x - controlX : x) : n(0) + dx;
        controlY = smooth ? (reflect ? 2 * y - controlY : y) : n(1) + dy;
        const toX = n(smooth ? 0 : 2) + dx;
        const toY = n(smooth ? 1 : 3) + dy;
        segments.push({
          to: 'curve',
          x1: x + (2 / 3) * (controlX - x),
          y1: y + (2 / 3) * (controlY - y),
          x2: toX + (2 / 3) * (controlX - toX),
          y2: toY + (2 / 3) * (controlY - toY),
          x: toX,
          y: toY,
        });
        x = toX;
        y = toY;
        break;
      }
      case 'A': {
        const toX = n(5) + dx;
        const toY = n(6) + dy;
        segments.push(...arc(x, y, n(0), n(1), n(2), n(3) !== 0, n(4) !== 0, toX, toY));
        x = toX;
        y = toY;
        break;
      }
      default:
        segments.push({ to: 'close' });
        x = startX;
        y = startY;
    }
    before = name;
  }
  return segments;
}

function commandsOf(d: string): [string, number[]][] {
  const commands: [string, number[]][] = [];
  for (const [, letter = '', rest = ''] of d.matchAll(/([a-zA-Z])([^a-zA-Z]*(?:[eE][-+]?\d[^a-zA-Z]*)*)/g)) {
    const wanted = ARGUMENTS[letter.toUpperCase()];
    if (wanted === undefined) throw new Error(`“${letter}” is not a path command.`);
    const numbers = (/[aA]/.test(letter) ? arcNumbers(rest) : rest.match(/[-+]?(?:\d*\.\d+|\d+\.?)(?:[eE][-+]?\d+)?/g) ?? []).map(Number);
    if (wanted === 0) {
      commands.push([letter, []]);
      continue;
    }
    if (numbers.length === 0 || numbers.length % wanted !== 0) throw new Error(`The path command “${letter}” needs ${wanted} numbers at a time, not ${numbers.length}.`);
    for (let from = 0; from < numbers.length; from += wanted) {
      // Pairs after a first move are lines.
      const name = from > 0 && letter === 'M' ? 'L' : from > 0 && letter === 'm' ? 'l' : letter;
      commands.push([name, numbers.slice(from, from + wanted)]);
    }
  }
  return commands;
}

/** The two flags of an arc may stand without a space: `A5 5 0 016 6`. */
function arcNumbers(rest: string): string[] {
  const numbers: string[] = [];
  let left = rest;
  for (let index = 0; ; index += 1) {
    const found = (index % 7 === 3 || index % 7 === 4 ? /^[\s,]*([01])/ : /^[\s,]*([-+]?(?:\d*\.\d+|\d+\.?)(?:[eE][-+]?\d+)?)/).exec(left);
    if (!found?.[1]) return numbers;
    numbers.push(found[1]);
    left = left.slice(found[0].length);
  }
}

/** An elliptical arc as cubic curves of at most a quarter turn. Source: SVG 1.1, appendix F.6 (end points to centre). */
function arc(x0: number, y0: number, rxIn: number, ryIn: number, turnDeg: number, large: boolean, sweep: boolean, x: number, y: number): Segment[] {
  let rx = Math.abs(rxIn);
  let ry = Math.abs(ryIn);
  if (x0 === x && y0 === y) return [];
  if (rx === 0 || ry === 0) return [{ to: 'line', x, y }];
  const phi = (turnDeg * Math.PI) / 180;
  const cos = Math.cos(phi);
  const sin = Math.sin(phi);
  const px = (cos * (x0 - x)) / 2 + (sin * (y0 - y)) / 2;
  const py = (-sin * (x0 - x)) / 2 + (cos * (y0 - y)) / 2;
  const tooSmall = (px * px) / (rx * rx) + (py * py) / (ry * ry);
  if (tooSmall > 1) {
    rx *= Math.sqrt(tooSmall);
    ry *= Math.sqrt(tooSmall);
  }
  const under = (rx * rx * ry * ry - rx * rx * py * py - ry * ry * px * px) / (rx * rx * py * py + ry * ry * px * px);
  const factor = (large === sweep ? -1 : 1) * Math.sqrt(Math.max(under, 0));
  const cxp = (factor * rx * py) / ry;
  const cyp = (-factor * ry * px) / rx;
  const cx = cos * cxp - sin * cyp + (x0 + x) / 2;
  const cy = sin * cxp + cos * cyp + (y0 + y) / 2;
  const from = Math.atan2((py - cyp) / ry, (px - cxp) / rx);
  let turn = Math.atan2((-py - cyp) / ry, (-px - cxp) / rx) - from;
  if (sweep && turn < 0) turn += 2 * Math.PI;
  if (!sweep && turn > 0) turn -= 2 * Math.PI;
  const parts = Math.max(Math.ceil(Math.abs(turn) / (Math.PI / 2) - 1e-9), 1);
  const step = turn / parts;
  const reach = (4 / 3) * Math.tan(step / 4);
  const at = (c: number, s: number) => ({ x: cx + cos * rx * c - sin * ry * s, y: cy + sin * rx * c + cos * ry * s });
  const segments: Segment[] = [];
  for (let part = 0; part < parts; part += 1) {
    const a = from + part * step;
    const b = a + step;
    const first = at(Math.cos(a) - reach * Math.sin(a), Math.sin(a) + reach * Math.cos(a));
    const second = at(Math.cos(b) + reach * Math.sin(b), Math.sin(b) - reach * Math.cos(b));
    const end = part === parts - 1 ? { x, y } : at(Math.cos(b), Math.sin(b));
    segments.push({ to: 'curve', x1: first.x, y1: first.y, x2: second.x, y2: second.y, x: end.x, y: end.y });
  }
  return segments;
}
