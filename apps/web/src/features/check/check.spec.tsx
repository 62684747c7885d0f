import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { readCode } from './code-form.js';
import { CheckAnswer } from './components/check-answer.js';
import { CodeForm } from './components/code-form.js';

const known = { known: true, number: 'C2026-0001', issuedOn: '2026-11-15', shop: 'Kupferring Rewind Works', machine: '200 kW 4-pole crusher motor, SQ-20031', coreVerdict: 'conforms', supersededBy: null };
const unknown = { known: false, number: null, issuedOn: null, shop: null, machine: null, coreVerdict: null, supersededBy: null };

describe('the code of a certificate', () => {
  it('is read however it is typed, and out of the whole address', () => {
    expect(readCode('qrqq-5g9r-etma-zcmd')).toBe('QRQQ-5G9R-ETMA-ZCMD');
    expect(readCode(' QRQQ 5G9R ETMA ZCMD ')).toBe('QRQQ-5G9R-ETMA-ZCMD');
    expect(readCode('QRQQ5G9RETMAZCMD')).toBe('QRQQ-5G9R-ETMA-ZCMD');
    expect(readCode('https://shop.example/check/QRQQ-5G9R-ETMA-ZCMD/?from=paper')).toBe('QRQQ-5G9R-ETMA-ZCMD');
  });

  it('is not made up out of something else', () => {
    for (const text of ['', 'ab', 'certificate 7!', "'; DROP", 'x'.repeat(60)]) expect(readCode(text)).toBeNull();
  });

  it('is asked for when it is missing, and what was typed stays', async () => {
    const person = userEvent.setup();
    const onCode = vi.fn();
    render(<CodeForm onCode={onCode} />);
    await person.click(screen.getByRole('button', { name: 'Check it' }));
    expect(screen.getByRole('alert').textContent).toContain('Type the code');
    await person.type(screen.getByRole('textbox'), 'nonsense!');
    await person.click(screen.getByRole('button', { name: 'Check it' }));
    expect(screen.getByRole('alert').textContent).toContain('letters and digits only');
    expect(screen.getByRole<HTMLInputElement>('textbox').value).toBe('nonsense!');
    expect(onCode).not.toHaveBeenCalled();
    await person.clear(screen.getByRole('textbox'));
    await person.type(screen.getByRole('textbox'), 'qrqq5g9retmazcmd');
    await person.click(screen.getByRole('button', { name: 'Check it' }));
    expect(onCode).toHaveBeenCalledWith('QRQQ-5G9R-ETMA-ZCMD');
  });
});

describe('what the open page says of a certificate', () => {
  it('in force: what stands on it, to be compared', () => {
    render(<CheckAnswer code="QRQQ-5G9R-ETMA-ZCMD" answer={known} />);
    expect(screen.getByRole('status').textContent).toContain('in force');
    expect(screen.getByText('C2026-0001')).toBeDefined();
    expect(screen.getByText('15 Nov 2026')).toBeDefined();
    expect(screen.getByText('conforms')).toBeDefined();
  });

  it('out of force: which one has taken its place', () => {
    render(<CheckAnswer code="QRQQ-5G9R-ETMA-ZCMD" answer={{ ...known, supersededBy: 'C2026-0009' }} />);
    expect(screen.getByRole('status').textContent).toContain('out of force');
    expect(screen.getByRole('status').textContent).toContain('C2026-0009');
  });

  it('not known: says so and claims nothing else', () => {
    render(<CheckAnswer code="AAAA-BBBB-CCCC-DDDD" answer={unknown} />);
    expect(screen.getByRole('status').textContent).toContain('No certificate has this code');
    expect(screen.queryByText('Machine')).toBeNull();
  });
});
