import { describe, expect, it } from 'vitest';
import { faultsOf, outOfFrame, textsOf } from './drawn-extent.fixture.js';
import { spineDrawing, spinePlaces, type SpineSheet } from './spine-drawing.js';

const sheet = (id: string, label: string, state: SpineSheet['state'], gate: SpineSheet['gate'] = 'none'): SpineSheet => ({ id, label, state, gate });
const route: SpineSheet[] = [
  sheet('received', 'Received', 'done'),
  sheet('strip-and-burnout', 'Strip and burnout', 'done', 'open'),
  sheet('core-test-after', 'Core test after', 'open'),
  sheet('rewind', 'Rewind', 'to-come', 'shut'),
  sheet('before-varnish-test', 'Before-varnish test', 'to-come'),
  sheet('treatment', 'Treatment', 'skipped'),
];
const full = (sheets = route) => spineDrawing({ sheets, variant: 'full' });
const mini = (sheets = route) => spineDrawing({ sheets, variant: 'mini' });
const rects = (drawing: ReturnType<typeof full>) => drawing.shapes.flatMap((s) => (s.kind === 'rect' ? [s] : []));

describe('spineDrawing', () => {
  it('stacks one sheet for each step, the open one drawn out and copper', () => {
    const sheets = rects(full());
    const open = sheets.find((s) => s.mark === 'core-test-after')!;
    expect(open.fill).toBe('copper');
    for (const other of sheets.filter((s) => s !== open)) {
      expect(open.width).toBeGreaterThan(other.width);
      expect(open.height).toBeGreaterThan(other.height);
    }
  });

  it('fills sheets that are done, outlines those to come and dashes those that are skipped', () => {
    const byMark = new Map(rects(full()).map((s) => [s.mark, s]));
    expect(byMark.get('received')).toMatchObject({ fill: 'text' });
    expect(byMark.get('rewind')).toMatchObject({ stroke: 'line' });
    expect(byMark.get('rewind')?.fill).toBeUndefined();
    expect(full().shapes.find((s) => s.kind === 'path' && s.mark === 'treatment')).toMatchObject({ dash: [3, 4] });
  });

  it('bolts a gate that is shut and leaves an open one clear, so that form tells them apart', () => {
    const notches = (gate: SpineSheet['gate']) => full([sheet('a', 'A', 'open'), sheet('b', 'B', 'to-come', gate)]).shapes.filter((s) => s.kind === 'path');
    expect(notches('open')).toHaveLength(1);
    expect(notches('shut')).toHaveLength(2);
    expect(notches('none')).toHaveLength(0);
  });

  it('keeps the longest step inside the frame, even when it is open', () => {
    expect(outOfFrame(full(route.map((s) => ({ ...s, state: 'open' as const }))))).toEqual([]);
    expect(faultsOf(full().shapes)).toEqual([]);
  });

  it('tells a screen where each sheet lies', () => {
    const places = spinePlaces(route);
    expect(places.map((p) => p.id)).toEqual(route.map((s) => s.id));
    for (const rect of rects(full())) expect(places.find((p) => p.id === rect.mark)).toMatchObject({ y: rect.y, height: rect.height });
  });

  it('leaves room for the line around the first and the last sheet', () => {
    const outlined = full(route.map((s) => ({ ...s, state: 'to-come' as const })));
    for (const rect of rects(outlined)) {
      expect(rect.y).toBeGreaterThanOrEqual(rect.strokeWidth! / 2);
      expect(rect.y + rect.height + rect.strokeWidth! / 2).toBeLessThanOrEqual(outlined.height);
    }
  });

  it('draws the small one without words and with the same sheets', () => {
    expect(textsOf(mini())).toHaveLength(0);
    expect(mini().shapes).toHaveLength(route.length);
    expect(mini().height).toBe(18);
    expect(faultsOf(mini().shapes)).toEqual([]);
  });

  it('says in words how far the job has come', () => {
    expect(mini().description).toBe('2 of 5 steps done; at Core test after; 1 skipped.');
    expect(spineDrawing({ sheets: [sheet('a', 'A', 'done')], variant: 'mini' }).description).toBe('1 of 1 steps done.');
  });

  it('draws an empty route as nothing', () => {
    expect(full([]).shapes).toEqual([]);
    expect(full([]).height).toBe(0);
    expect(mini([]).width).toBe(1);
  });
});
