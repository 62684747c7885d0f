import { zodResolver } from '@hookform/resolvers/zod';
import { parseMoney } from '@libs/money';
import type { UnitSystem } from '@libs/quantities';
import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useEffect } from 'react';
import { useForm, type FieldValues, type UseFormReturn } from 'react-hook-form';
import { beforeEach, describe, expect, it } from 'vitest';
import { z } from 'zod';
import { readTyped, typedFrom, untyped, type Typed } from '../lib/typed.js';
import { CheckField, ChoiceField, SelectField, TextAreaField, TextField } from './fields.js';
import { MoneyField } from './money-field.js';
import { QuantityField } from './quantity-field.js';
import { UnitsProvider } from './units.js';

interface Core extends FieldValues {
  bore: Typed;
}
let form: UseFormReturn<Core>;
const look = (seen: UseFormReturn<Core>) => {
  form = seen;
};
const person = userEvent.setup();

function Bore({ system = 'si' as UnitSystem, start = untyped() }: { system?: UnitSystem; start?: Typed }) {
  const own = useForm<Core>({ defaultValues: { bore: start } });
  useEffect(() => look(own), [own]);
  return (
    <UnitsProvider value={system}>
      <QuantityField control={own.control} name="bore" label="Bore" kind="length" usual={[0.03, 2]} help="Measure at three places." />
    </UnitsProvider>
  );
}
const bore = () => screen.getByRole<HTMLInputElement>('textbox', { name: 'Bore' });
const said = () => (bore().getAttribute('aria-describedby') ?? '').split(' ').map((id) => document.getElementById(id)?.textContent ?? '').join(' ');
const metres = () => {
  const reading = readTyped(form.getValues().bore, 'length');
  return reading.state === 'read' ? reading.si : reading.state;
};

describe('the field for a measured figure', () => {
  it('takes a decimal comma and a decimal point alike', async () => {
    render(<Bore />);
    await person.type(bore(), '260,5');
    expect(metres()).toBe(0.2605);
    await person.clear(bore());
    await person.type(bore(), '260.5');
    expect(metres()).toBe(0.2605);
  });

  it('takes a pasted unit and says how it read it', async () => {
    render(<Bore />);
    await person.click(bore());
    await person.paste('10.25 in');
    expect(metres()).toBe(0.26035);
    expect(said()).toContain('read as 260.4 mm');
  });

  it('takes parts of an inch', async () => {
    render(<Bore system="inch-pound" />);
    await person.type(bore(), '10 1/4');
    expect(metres()).toBe(0.26035);
  });

  it('says its unit to whoever hears the page', () => {
    const { rerender } = render(<Bore />);
    expect(said()).toContain('mm');
    rerender(<Bore system="inch-pound" />);
    expect(said()).toContain('in');
  });

  it('keeps letters as typed and says what to do once the field is left', async () => {
    render(<Bore />);
    await person.type(bore(), 'about 260');
    expect(bore().getAttribute('aria-invalid')).toBe('false');
    await person.tab();
    expect(bore().value).toBe('about 260');
    expect(bore().getAttribute('aria-invalid')).toBe('true');
    expect(said()).toContain('is not a number');
    expect(metres()).toBe('wrong');
  });

  it('refuses a number that can be read in two ways', async () => {
    render(<Bore />);
    await person.type(bore(), '1,750');
    await person.tab();
    expect(said()).toContain('Write the one you mean');
  });

  it('changes units and back without touching what was typed or stored', async () => {
    const { rerender } = render(<Bore />);
    await person.type(bore(), '260,5 mm');
    rerender(<Bore system="inch-pound" />);
    expect(bore().value).not.toBe('260,5 mm');
    expect(metres()).toBe(0.2605);
    rerender(<Bore />);
    expect(bore().value).toBe('260,5 mm');
  });

  it('shows a figure in the other units as far as it fits, and keeps the very same figure', () => {
    for (const [si, shown] of [[0.2605, '10.2559'], [0.26035, '10.25'], [0.1, '3.93701'], [1 / 3, '13.1234']] as const) {
      const { unmount } = render(<Bore system="inch-pound" start={typedFrom(si, 'length', 'si')} />);
      expect(bore().value).toBe(shown);
      expect(metres()).toBe(si);
      unmount();
    }
  });

  it('asks whether an unusual figure is right, and stops asking when somebody says so', async () => {
    render(<Bore />);
    await person.type(bore(), '2600');
    expect(said()).toContain('2600.0 mm: is this right? Usual is 30.0 mm to 2000.0 mm.');
    expect(bore().getAttribute('aria-invalid')).toBe('false');
    await person.click(screen.getByRole('button', { name: 'It is right' }));
    expect(said()).not.toContain('is this right');
    expect(metres()).toBe(2.6);
    await person.type(bore(), '0');
    expect(said()).toContain('26000.0 mm: is this right?');
  });

  it('ties a refusal of the server to the field', async () => {
    render(<Bore />);
    form.setError('bore', { type: 'server', message: 'The bore is larger than the core.' }, { shouldFocus: true });
    expect((await screen.findByRole('alert')).textContent).toBe('The bore is larger than the core.');
    expect(said()).toContain('The bore is larger than the core.');
    expect(bore().getAttribute('aria-invalid')).toBe('true');
    expect(document.activeElement).toBe(bore());
  });
});

interface Priced extends FieldValues {
  price: string;
}
function Price({ currency = 'EUR' }: { currency?: string }) {
  const { control } = useForm<Priced>({ defaultValues: { price: '' } });
  return <MoneyField control={control} name="price" label="Price" currency={currency} />;
}
const price = () => screen.getByRole<HTMLInputElement>('textbox', { name: 'Price' });

describe('the field for an amount', () => {
  it('keeps the text as typed, in a form that reads to the cent', async () => {
    render(<Price />);
    await person.type(price(), '1.234,5');
    expect(price().value).toBe('1.234,5');
    expect(parseMoney(price().value, 'EUR')).toEqual({ ok: true, amountMinor: 123450 });
  });

  it('says what is wrong with an amount once the field is left', async () => {
    render(<Price currency="JPY" />);
    await person.type(price(), '12.5');
    expect(screen.queryByRole('alert')).toBeNull();
    await person.tab();
    expect(screen.getByRole('alert').textContent).toBe('JPY has no decimals.');
  });
});

const words = z.object({
  name: z.string().min(1, 'Who is it?'),
  notes: z.string().min(1, 'What was seen?'),
  plate: z.enum(['organic', 'inorganic'], { error: 'Choose one.' }),
  state: z.enum(['bare', 'in-frame'], { error: 'Say which.' }),
  clear: z.boolean().refine((v) => v, 'The bore must be clear.'),
  on: z.string({ error: 'Which day?' }),
});
function Words() {
  const { control, handleSubmit } = useForm({ resolver: zodResolver(words), defaultValues: { name: '', notes: '', plate: null, state: null, clear: false, on: null } as never });
  return (
    <form noValidate onSubmit={handleSubmit(() => undefined)}>
      <TextField control={control} name="name" label="Name" help="As on the card." />
      <TextAreaField control={control} name="notes" label="Notes" />
      <SelectField control={control} name="plate" label="Core plate" ask="Choose" options={[{ value: 'organic', label: 'organic' }]} />
      <ChoiceField
        control={control}
        name="state"
        label="Core"
        options={[
          { value: 'bare', label: 'bare' },
          { value: 'in-frame', label: 'in the frame' },
        ]}
      />
      <CheckField control={control} name="clear" label="Bore clear" />
      <TextField control={control} name="on" label="Day" type="date" />
      <button type="submit">Send</button>
    </form>
  );
}

describe('fields of words and choices', () => {
  beforeEach(() => void render(<Words />));
  const send = () => person.click(screen.getByRole('button', { name: 'Send' }));
  const description = (element: HTMLElement) => (element.getAttribute('aria-describedby') ?? '').split(' ').map((id) => document.getElementById(id)?.textContent).join(' ');

  it('ties help to its field until there is an error to say', async () => {
    expect(description(screen.getByLabelText('Name'))).toBe('As on the card.');
    await send();
    expect(description(screen.getByLabelText('Name'))).toBe('Who is it?');
  });

  it('ties every error to its field, and puts the cursor into the first', async () => {
    await send();
    for (const [label, problem] of [['Name', 'Who is it?'], ['Notes', 'What was seen?'], ['Core plate', 'Choose one.'], ['Bore clear', 'The bore must be clear.'], ['Day', 'Which day?']] as const) {
      expect(description(screen.getByLabelText(label))).toBe(problem);
      expect(screen.getByLabelText(label).getAttribute('aria-invalid')).toBe('true');
    }
    expect(screen.getByRole('group', { name: 'Core' }).getAttribute('aria-describedby')).not.toBeNull();
    expect(screen.getByText('Say which.').getAttribute('role')).toBe('alert');
    expect(document.activeElement).toBe(screen.getByLabelText('Name'));
  });

  it('lets a choice be made by tap and moved by arrow keys, with one stop for the Tab key', async () => {
    const [bare, framed] = screen.getAllByRole('radio');
    expect([bare!.tabIndex, framed!.tabIndex]).toEqual([0, -1]);
    await person.click(bare!);
    expect(bare!.getAttribute('aria-checked')).toBe('true');
    await person.keyboard('{ArrowRight}');
    expect(framed!.getAttribute('aria-checked')).toBe('true');
    expect(document.activeElement).toBe(framed);
    expect([bare!.tabIndex, framed!.tabIndex]).toEqual([-1, 0]);
  });
});
