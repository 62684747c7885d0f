import type { Locator, Page } from 'playwright-core';

type Scope = Page | Locator;

const escaped = (text: string) => text.replace(/[.*+?^${}()|[\]\\/]/g, '\\$&');
/** A label as a person reads it; "(optional)" behind it does not count. */
const labelled = (scope: Scope, label: string) => scope.getByLabel(new RegExp(`^${escaped(label)}\\s*(\\(optional\\))?$`)).first();

/** Types into the fields with these labels. */
export async function fill(scope: Scope, values: Readonly<Record<string, string>>): Promise<void> {
  for (const [label, value] of Object.entries(values)) await labelled(scope, label).fill(value);
}

export async function choose(scope: Scope, values: Readonly<Record<string, string | RegExp>>): Promise<void> {
  for (const [label, option] of Object.entries(values)) {
    const select = labelled(scope, label);
    const options = await select.locator('option').allTextContents();
    const wanted = options.find((o) => (typeof option === 'string' ? o === option : option.test(o)));
    if (wanted === undefined) throw new Error(`“${label}” offers ${options.join(' | ')}, not ${option}`);
    await select.selectOption({ label: wanted });
  }
}

/** Presses one of the large buttons of a choice. */
export async function press(scope: Scope, group: string, option: string): Promise<void> {
  await scope.getByRole('radiogroup', { name: group }).getByRole('radio', { name: option, exact: true }).click();
}

export async function tick(scope: Scope, ...labels: readonly string[]): Promise<void> {
  for (const label of labels) {
    const box = scope.getByRole('checkbox', { name: label, exact: true });
    if (await box.first().isChecked()) continue;
    // a person taps the words; the box itself may lie behind its own drawing
    await scope.getByText(label, { exact: true }).first().click();
    await scope.getByRole('checkbox', { name: label, exact: true, checked: true }).first().waitFor({ state: 'attached' });
  }
}

export const button = (scope: Scope, name: string | RegExp) => scope.getByRole('button', typeof name === 'string' ? { name, exact: true } : { name });

/** One panel of a page, by its heading. */
export const panel = (page: Page, title: string) => page.locator('section').filter({ has: page.getByRole('heading', { name: title, exact: true }) }).first();
