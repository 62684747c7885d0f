import type { CoreGeometry } from '@libs/core-loss';
import { stripDrawing, type StripDrawingInput } from '@libs/drawings';
import { render, screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { describe, expect, it, vi } from 'vitest';
import { BeforeAfterStrip } from './before-after-strip.js';
import { Drawing } from './drawing.js';
import { Ring } from './ring.js';
import { MiniSpine, sheetsOf, Spine } from './spine.js';
import { UnitsProvider } from './units.js';
import { VerdictTag, type ShownVerdict } from './verdict-tag.js';

const person = userEvent.setup();
/** 400 by 260 mm, 36 slots 35 mm deep: an invented core. */
const core: CoreGeometry = { kind: 'stator', outerDiameterM: 0.4, innerDiameterM: 0.26, slotDepthM: 0.035, slots: 36, stackLengthM: 0.3, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 };
const strip: StripDrawingInput = {
  before: { label: 'before', value: 2.03, uncertainty: 0.14, words: '2.03 ± 0.14' },
  after: [{ label: 'after', value: 2.41, uncertainty: 0.17, words: '2.41 ± 0.17' }],
  limit: { value: 2.436, words: 'limit +20 % (2.44)' },
  increase: null,
  unit: 'W/kg',
};

describe('the verdict', () => {
  const shapeOf = (verdict: ShownVerdict) => {
    const { container, unmount } = render(<VerdictTag verdict={verdict} />);
    const found = { words: container.textContent, shape: container.querySelector('svg')!.innerHTML, colour: container.firstElementChild!.className };
    unmount();
    return found;
  };
  it('is told by word, by shape and by colour, each of them different for each verdict', () => {
    const all = (['conforms', 'does-not-conform', 'inconclusive', 'not-valid', 'shown-not-judged'] as const).map(shapeOf);
    for (const part of ['words', 'shape', 'colour'] as const) expect(new Set(all.map((v) => v[part])).size).toBe(5);
    expect(all.map((v) => v.words)).toEqual(['conforms', 'does not conform', 'inconclusive', 'not valid', 'shown, not judged']);
  });
});

describe('a drawing on screen', () => {
  it('has a name and says what it shows to whoever cannot see it', () => {
    render(<Drawing drawing={stripDrawing(strip)} />);
    const picture = screen.getByRole('img', { name: /Core loss before and after.*before 2.03 ± 0.14 W\/kg/ });
    expect(picture).toBeDefined();
  });

  it('hatches in the ink of the zone, not in that of the text around it', () => {
    const { container } = render(<Drawing drawing={stripDrawing(strip)} />);
    expect(container.querySelector('pattern path')!.getAttribute('stroke')).toBe('var(--lb-fails)');
    const zone = container.querySelector('[fill^="url("]')!.getAttribute('fill')!;
    expect(container.querySelector(`[id="${zone.slice(5, -1)}"]`)).not.toBeNull();
  });

  it('never names a raw colour', () => {
    const { container } = render(<Ring geometry={core} turns={5} heat={new Map([[3, 6]])} />);
    for (const element of container.querySelectorAll('[fill],[stroke]')) {
      for (const name of ['fill', 'stroke']) expect(element.getAttribute(name) ?? 'none').toMatch(/^(none|var\(--lb-[a-z]+\)|color-mix\(in srgb, var\(--lb-[a-z]+\) \d+%, var\(--lb-[a-z]+\)\))$/);
    }
  });

  it('offers its figures as a table', () => {
    const { container } = render(<BeforeAfterStrip {...strip} />);
    const table = container.querySelector('.lb-strip-wide table')!;
    expect([...table.querySelectorAll('td')].map((td) => td.textContent)).toEqual(['before', '2.030', '0.140', 'after', '2.410', '0.170']);
  });
});

describe('the ring', () => {
  const heat = new Map([
    [10, 11.8],
    [11, 5],
  ]);
  const status = () => screen.getByRole('status').textContent;

  it('gives a slot’s figures by tap, in the person’s units', async () => {
    const onSlot = vi.fn();
    const { container } = render(
      <UnitsProvider value="inch-pound">
        <Ring geometry={core} turns={5} heat={heat} interactive onSlot={onSlot} />
      </UnitsProvider>,
    );
    expect(status()).toBe('Tap a slot for its figures.');
    await person.click(container.querySelector('[data-mark="slot-10"]')!);
    expect(status()).toBe('Slot 10: 21.2 °F over the mean');
    expect(onSlot).toHaveBeenCalledWith(10);
  });

  it('goes round the slots by arrow keys, from the last to the first', async () => {
    render(<Ring geometry={core} turns={5} heat={heat} interactive />);
    await person.tab();
    await person.keyboard('{ArrowRight}');
    expect(status()).toBe('Slot 1');
    await person.keyboard('{ArrowLeft}');
    expect(status()).toBe('Slot 36');
    await person.keyboard('{ArrowRight}'.repeat(11));
    expect(status()).toBe('Slot 11: 5.0 K over the mean');
  });

  it('says what is missing while the size is not typed', () => {
    render(<Ring geometry={null} turns={0} />);
    expect(screen.getByRole('img', { name: /Type the core’s size/ })).toBeDefined();
  });
});

describe('the spine', () => {
  const job = { route: 'rewind', step: 'core-test-after', state: 'open' } as const;

  it('is a list of links in the order of the route, each with its state and its gate in words', () => {
    render(
      <MemoryRouter>
        <Spine sheets={sheetsOf(job)} hrefOf={(id) => `/jobs/1/${id}`} current="core-test-after" label="Route" />
      </MemoryRouter>,
    );
    const links = within(screen.getByRole('navigation', { name: 'Route' })).getAllByRole('link');
    expect(links).toHaveLength(14);
    expect(links[0]!.textContent).toBe('Received, done');
    expect(links[6]!.textContent).toBe('Core test after, open now');
    expect(links[6]!.getAttribute('aria-current')).toBe('step');
    expect(links[7]!.textContent).toBe('Rewind, to come, gate shut');
    expect(links[7]!.getAttribute('href')).toBe('/jobs/1/rewind');
  });

  it('tells the same in words when it is small', () => {
    render(<MiniSpine job={job} />);
    expect(screen.getByRole('img', { name: /6 of 14 steps done; at Core test after/ })).toBeDefined();
  });

  it('shows a released job as done to the last sheet, and one that ended before as not open', () => {
    expect(sheetsOf({ ...job, step: 'released', state: 'released' }).every((s) => s.state === 'done')).toBe(true);
    expect(sheetsOf({ ...job, state: 'scrapped' }).some((s) => s.state === 'open')).toBe(false);
  });
});
