import { describe, expect, it } from 'vitest';
import { acknowledgementMail, type AcknowledgementMail } from './acknowledgement-mail.js';
import { tagCaution } from './tag-caution.js';
import { changedFields } from './changed-fields.js';

const MAIL: AcknowledgementMail = { shopName: 'Kestrel & Sons Rewinds', shopPhone: '+49 7000 1', contactName: 'H. Brandt', jobNumber: 'J2026-0011', machine: '75 kW 6-pole pump motor', serial: 'MP-75', complaint: '<img src=x onerror=alert(1)>', accessories: '', customerReference: '', promisedOn: null, portalUrl: null };

describe('the mail that a machine has come in', () => {
  it('says number, machine and complaint, in text and in HTML', () => {
    const mail = acknowledgementMail(MAIL);
    expect(mail.subject).toBe('Kestrel & Sons Rewinds: job J2026-0011 received');
    for (const words of ['J2026-0011', '75 kW 6-pole pump motor, serial MP-75', 'we tell you when']) {
      expect(mail.text).toContain(words);
      expect(mail.html).toContain(words);
    }
  });

  it('what the customer wrote is shown as text, never run', () => {
    expect(acknowledgementMail(MAIL).html).not.toContain('<img');
    expect(acknowledgementMail(MAIL).html).toContain('&lt;img src=x');
  });

  it('leads into the portal only where somebody can sign in', () => {
    expect(acknowledgementMail(MAIL).text).not.toContain('http');
    expect(acknowledgementMail({ ...MAIL, portalUrl: 'https://shop.example/portal/jobs/1' }).html).toContain('href="https://shop.example/portal/jobs/1"');
  });

  it('leaves out what was not said, and says what was', () => {
    expect(acknowledgementMail(MAIL).text).not.toMatch(/Came with it|Your reference/);
    const told = acknowledgementMail({ ...MAIL, accessories: 'Coupling half', customerReference: 'PO 1', promisedOn: '2026-03-20' }).text;
    for (const words of ['Came with it: Coupling half', 'Your reference: PO 1', 'Promised for: 20 March 2026']) expect(told).toContain(words);
  });
});

describe('the caution on a tag', () => {
  it('says what is dangerous to touch, and nothing where nothing is', () => {
    expect(tagCaution('none', '', false)).toBe('');
    expect(tagCaution('oil-or-grease', 'gearbox oil', false)).toBe('');
    expect(tagCaution('asbestos-suspected', '', false)).toBe('Asbestos suspected');
    expect(tagCaution('chemicals', 'caustic', true)).toBe('Chemicals: caustic · For explosive atmospheres: not to be redesigned');
  });
});

describe('what a change changed', () => {
  it('names the fields that differ, from and to', () => {
    expect(changedFields({ a: 1, b: 'x', c: null as string | null }, { a: 1, b: 'y', c: 'z' })).toEqual({ from: { b: 'x', c: null }, to: { b: 'y', c: 'z' } });
    expect(changedFields({ a: 1 }, { a: 1 })).toBeNull();
  });
});
