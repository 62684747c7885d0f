import { DEFAULT_CORE_LIMITS } from '@libs/core-loss';
import { DEFAULT_MACHINE_TEST_LIMITS } from '@libs/machine-tests';
import { DEFAULT_BURNOUT_LIMITS, type LimitsVersionView, type PublishLimits } from '@shared/limits';
import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { inShop, refusal, server } from '../../../../test/in-shop.js';
import { Comparison } from './comparison.js';
import { LimitsEditor } from './limits-editor.js';
import { VersionList } from './version-list.js';
import { VersionView } from './version-view.js';
import { limitDifferences } from '@shared/limit-differences';

const person = userEvent.setup();
const SET = { core: DEFAULT_CORE_LIMITS, machine: DEFAULT_MACHINE_TEST_LIMITS, burnout: DEFAULT_BURNOUT_LIMITS } as unknown as LimitsVersionView['set'];
const FIRST: LimitsVersionView = { version: 1, publishedAt: '2026-03-02T09:00:00.000Z', publishedBy: 'Loopbay', note: 'As shipped.', set: SET };
const withCore = (more: object): LimitsVersionView['set'] => ({ ...SET, core: { ...DEFAULT_CORE_LIMITS, ...more } });
const SECOND: LimitsVersionView = { version: 2, publishedAt: '2026-03-09T10:00:00.000Z', publishedBy: 'Mo Manager', note: 'Warm days.', set: withCore({ fallAsk: 0.08, hotSpotLimitK: 9 }) };

const onPublished = vi.fn();
const open = (versions: readonly LimitsVersionView[] = [FIRST]) => inShop(<LimitsEditor versions={versions} onPublished={onPublished} onCancel={() => undefined} />);
/** By its label, as a person finds it; looked up once, since the page is long. */
function field(label: string): HTMLInputElement {
  const found = [...document.querySelectorAll('label')].find((l) => l.textContent?.trim() === label);
  const control = found && document.getElementById(found.htmlFor);
  if (!control) throw new Error(`There is no field “${label}”.`);
  return control as HTMLInputElement;
}
const button = (name: string) => [...document.querySelectorAll('button')].find((b) => b.textContent === name)!;
/** In one go: the page is long, and jsdom slow at typing letter by letter. */
const type = (label: string, text: string) => fireEvent.change(field(label), { target: { value: text } });
const review = () => void fireEvent.click(button('Look through and publish'));
/** Only the open dialog is searched by its roles. */
const dialog = async () => (await waitFor(() => document.querySelector<HTMLElement>('.bp6-dialog') ?? Promise.reject(new Error('no dialog yet'))))!;
const publish = async () => person.click(within(await dialog()).getByRole('button', { name: 'Publish' }));
const HOT_SPOT = 'Hot spot over the core mean, at most';
const flat = (text: string | null | undefined) => (text ?? '').replace(/[\u00a0\u202f]/g, ' ');

/** A tighter hot spot, its source, and why. */
function tighter(): void {
  type(HOT_SPOT, '8');
  type('Where it comes from: Hot spot', 'Shop practice: 8 K since March');
  type('Why the limits change, and who decided it', 'Decided by the engineer.');
}

beforeEach(() => {
  localStorage.clear();
  onPublished.mockReset();
});
afterEach(() => vi.unstubAllGlobals());

describe('a new version of the limits', () => {
  it('begins with the one in force, and says of each figure what it is now', () => {
    open();
    expect(field(HOT_SPOT).value).toBe('10');
    expect(field('Increase over the before test, at most').value).toBe('20');
    expect(screen.getByText('Nothing changed yet')).toBeDefined();
    expect(screen.getByText('The gate asks for a repeat, or for a manager’s release.')).toBeDefined();
  });

  it('is published after everything that changes was shown once more', async () => {
    const asked = server(() => [201, { ...SECOND, set: SET }]);
    open();
    tighter();
    expect(screen.getByText('1 changed')).toBeDefined();
    review();
    const rows = within(await dialog()).getAllByRole('row').map((row) => flat(row.textContent));
    expect(rows).toContain('Hot spot over the core mean, at most10.0 K8.0 K');
    expect(rows.some((row) => row.includes('Shop practice: 8 K since March (common practice)'))).toBe(true);
    expect(asked).toHaveLength(0);
    await publish();
    await waitFor(() => expect(onPublished).toHaveBeenCalled());
    const sent = asked[0]!.body as PublishLimits;
    expect(sent).toMatchObject({ baseVersion: 1, note: 'Decided by the engineer.', confirmedSources: [] });
    expect(limitDifferences(SET, sent.set).filter((d) => d.valueChanged).map((d) => [d.path, d.to.value])).toEqual([['core.hotSpotLimitK', 8]]);
    expect(asked[0]!.idempotencyKey).toMatch(/^[0-9a-f]{32}$/);
    expect(localStorage.length).toBe(0);
  });

  it('with a changed figure asks where it comes from, and takes that the old source still stands', async () => {
    const asked = server(() => [201, SECOND]);
    open();
    type(HOT_SPOT, '8');
    type('Why the limits change, and who decided it', 'Decided by the engineer.');
    review();
    expect(document.querySelector('.bp6-dialog')).toBeNull();
    await waitFor(() => expect(field('Where it comes from: Hot spot').getAttribute('aria-invalid')).toBe('true'));
    await person.click(screen.getByLabelText('The source below still stands for the new figure'));
    review();
    await publish();
    await waitFor(() => expect(asked[0]?.body).toMatchObject({ confirmedSources: ['core.sources.hot-spot'] }));
  });

  it('without a note, with a warning over its limit or a word for a figure, says so at the field and sends nothing', async () => {
    const asked = server(() => [201, SECOND]);
    open();
    type('Hot spot that is worth a word', '12');
    await person.click(screen.getByLabelText('The source below still stands for the new figure'));
    type('Polarization index, at least', 'two');
    review();
    expect(await screen.findByText('Must be below: hot spot over the core mean, at most.')).toBeDefined();
    expect(field('Polarization index, at least').getAttribute('aria-invalid')).toBe('true');
    expect(screen.getByText('Say why the limits change, and who decided it.')).toBeDefined();
    expect(asked).toHaveLength(0);
  });

  it('that changes nothing is not published', async () => {
    open();
    type('Why the limits change, and who decided it', 'Just so.');
    review();
    expect(await screen.findByText('Nothing differs from the version in force.')).toBeDefined();
  });

  it('explains what an inconclusive result does under each rule', async () => {
    open();
    await person.click(screen.getByText('Hold it back'));
    expect(screen.getByText('The gate holds it back until a repeat conforms.')).toBeDefined();
    expect(screen.getByText('1 changed')).toBeDefined();
  });

  it('comes back after a reload as it was typed', async () => {
    open();
    tighter();
    document.body.innerHTML = '';
    open();
    expect(await screen.findByText(/Your draft of .* is back/)).toBeDefined();
    expect(field(HOT_SPOT).value).toBe('8');
  });

  it('lands what the server found at its field, out of the dialog', async () => {
    server(() => refusal(400, 'INPUT_NOT_VALID', 'See the fields.', { fields: [{ path: 'set.core.hotSpotLimitK', code: 'custom', message: 'Between 1.0 K and 100.0 K.' }] }));
    open();
    tighter();
    review();
    await publish();
    expect(await screen.findAllByText('Between 1.0 K and 100.0 K.')).not.toHaveLength(0);
    await waitFor(() => expect(field(HOT_SPOT).getAttribute('aria-invalid')).toBe('true'));
  });
});

describe('somebody published meanwhile', () => {
  it('both are shown, and mine goes on top of theirs', async () => {
    const bodies: PublishLimits[] = [];
    server(({ body }) => {
      bodies.push(body as PublishLimits);
      return bodies.length === 1 ? refusal(409, 'CHANGED_MEANWHILE', 'Somebody else changed this set of limits meanwhile.', { current: SECOND }) : [201, { ...SECOND, version: 3 }];
    });
    open();
    tighter();
    review();
    await publish();
    expect(await screen.findByText('Version 2 was published meanwhile by Mo Manager: Warm days.')).toBeDefined();
    const conflict = screen.getByRole('alert');
    expect(flat(within(conflict).getByRole('row', { name: /^Hot spot over the core mean, at most 9/ }).textContent)).toContain('9.0 K8.0 K');
    await person.click(within(conflict).getByRole('button', { name: 'Keep mine and save' }));
    await publish();
    await waitFor(() => expect(onPublished).toHaveBeenCalled());
    expect(bodies[1]).toMatchObject({ baseVersion: 2, set: { core: { hotSpotLimitK: 8, fallAsk: 0.08 } } });
  });

  it('theirs is taken with one tap', async () => {
    server(() => refusal(409, 'CHANGED_MEANWHILE', 'Somebody else changed this set of limits meanwhile.', { current: SECOND }));
    open();
    tighter();
    review();
    await publish();
    await person.click(await screen.findByText('Take theirs'));
    expect(field(HOT_SPOT).value).toBe('9');
    expect(screen.getByText('Nothing changed yet')).toBeDefined();
    expect(localStorage.length).toBe(0);
  });

  it('a draft from before it says so when it comes back', async () => {
    open();
    tighter();
    document.body.innerHTML = '';
    open([SECOND, FIRST]);
    expect(await screen.findByText('Version 2 was published meanwhile by Mo Manager: Warm days.')).toBeDefined();
    expect(field(HOT_SPOT).value).toBe('8');
  });
});

describe('reading the limits', () => {
  it('the list says who published what and why, and which is in force by a word', () => {
    inShop(<VersionList versions={[SECOND, FIRST]} />);
    const [, first, second] = screen.getAllByRole('row');
    expect(first!.textContent).toContain('in force');
    expect(first!.textContent).toContain('Mo Manager');
    expect(second!.textContent).toContain('earlier');
    expect(within(first!).getByRole('link').getAttribute('href')).toBe('/shop/limits/2');
  });

  it('a version shows each limit with source and standing, and what it changed', () => {
    inShop(<VersionView version={SECOND} before={FIRST} />);
    const row = screen.getByRole('row', { name: /^Hot spot over the core mean/ });
    expect(flat(row.textContent)).toContain('changed, was 10.0 K9.0 K');
    expect(row.textContent).toContain('common practice');
    expect(flat(screen.getByRole('row', { name: /^An inconclusive result/ }).textContent)).toContain('Ask a person');
    expect(screen.getAllByRole('row', { name: /Vibration/ }).length).toBeGreaterThan(10);
  });

  it('two versions stand side by side, and what differs is marked by a word', async () => {
    server(() => [200, { from: 1, to: 2, differences: limitDifferences(FIRST.set, SECOND.set) }]);
    inShop(<Comparison from={FIRST} to={SECOND} />);
    const row = await screen.findByRole('row', { name: /^Hot spot over the core mean/ });
    expect(flat(row.textContent)).toBe('Hot spot over the core mean, at most10.0 K9.0 Kchanged');
    expect(screen.queryByRole('row', { name: /^Polarization index, at least/ })).toBeNull();
    await person.click(screen.getByRole('checkbox', { name: 'Show only what differs' }));
    expect(screen.getByRole('row', { name: /^Polarization index, at least/ }).textContent).toMatch(/same$/);
  });
});
