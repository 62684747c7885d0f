import { describe, expect, it } from 'vitest';
import { readPath } from './svg-path.js';

describe('reading a path', () => {
  it('reads relative and absolute commands as one', () => {
    expect(readPath('M1 2l3 4h5v-6H1V2z')).toEqual(readPath('M1,2 L4 6 H9 V0 L1 0 L1 2 Z'));
  });

  it('takes further pairs after a move as lines', () => {
    expect(readPath('m1 1 2 0 0 2')).toEqual([
      { to: 'move', x: 1, y: 1 },
      { to: 'line', x: 3, y: 1 },
      { to: 'line', x: 3, y: 3 },
    ]);
  });

  it('draws a quarter circle within 0.03 % of the circle', () => {
    // A cubic with handles of 4/3 tan(π/8) strays at most 0.027 % from the circle (known bound of the four-curve circle).
    const [, curve] = readPath('M100 0A100 100 0 0 1 0 100');
    if (curve?.to !== 'curve') throw new Error('not a curve');
    for (let t = 0; t <= 1; t += 0.05) {
      const u = 1 - t;
      const along = (a: number, b: number, c: number, d: number) => u ** 3 * a + 3 * u * u * t * b + 3 * u * t * t * c + t ** 3 * d;
      const x = along(100, curve.x1, curve.x2, curve.x);
      const y = along(0, curve.y1, curve.y2, curve.y);
      expect(Math.abs(Math.hypot(x, y) - 100)).toBeLessThan(0.03);
    }
  });

  it('goes the long way round where the flag says so, with flags that stand without a space', () => {
    const long = readPath('M10 0A10 10 0 110 10');
    expect(long.filter((segment) => segment.to === 'curve')).toHaveLength(3);
    expect(long.at(-1)).toMatchObject({ x: 0, y: 10 });
  });

  it('widens an arc that is too small to reach its end', () => {
    // Source: SVG 1.1, appendix F.6.6: radii are scaled up until there is exactly one solution, a half circle.
    const arc = readPath('M0 0A1 1 0 0 1 10 0').filter((segment) => segment.to === 'curve');
    expect(Math.min(...arc.map((segment) => segment.y))).toBeCloseTo(-5, 6);
  });

  it('turns a quadratic curve into the cubic that is the same', () => {
    expect(readPath('M0 0Q3 6 6 0')[1]).toEqual({ to: 'curve', x1: 2, y1: 4, x2: 4, y2: 4, x: 6, y: 0 });
  });

  it('refuses a letter that is no command and numbers that are missing', () => {
    expect(() => readPath('M0 0X1 1')).toThrow('not a path command');
    expect(() => readPath('M0 0L1')).toThrow('2 numbers');
  });
});
