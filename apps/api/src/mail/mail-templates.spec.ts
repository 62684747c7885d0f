import { describe, expect, it } from 'vitest';
import { approvalMail } from './approval-mail.js';
import { invoiceMail } from './invoice-mail.js';
import { mailLayout } from './layout.js';
import { quoteMail } from './quote-mail.js';
import { receiptMail } from './receipt-mail.js';

const QUOTE = { shopName: 'Kestrel & Sons Rewinds', shopPhone: '+49 7000 1', contactName: 'H. Brandt', quoteNumber: 'Q2026-0004', revision: 1, jobNumber: 'J2026-0011', machine: '75 kW 6-pole pump motor', gross: '1,190.00 EUR', validUntil: '2026-03-31', note: '', portalUrl: 'https://shop.example/portal/quotes/1' };

describe('the look of the shop’s mail', () => {
  it('never lets a name or a note become markup', () => {
    const { html, text } = mailLayout({ shopName: '<b>Shop</b>', heading: '"><img src=x onerror=alert(1)>', paragraphs: ["<script>alert('x')</script> & more"], link: { label: '<i>go</i>', url: 'https://shop.example/a?b="c' } });
    expect(html).not.toMatch(/<(script|img|b|i)[ >]/);
    expect(html).toContain('&lt;script&gt;alert(&#39;x&#39;)&lt;/script&gt; &amp; more');
    expect(html).toContain('href="https://shop.example/a?b=&quot;c"');
    expect(text).toContain("<script>alert('x')</script> & more");
  });

  it('links to addresses of the web and to nothing else', () => {
    const { html, text } = mailLayout({ shopName: 'Shop', heading: 'Hello', paragraphs: [], link: { label: 'go', url: 'javascript:alert(1)' } });
    expect(html).not.toContain('href');
    expect(text).not.toContain('javascript');
  });

  it('keeps the lines of a paragraph in both forms', () => {
    const { html, text } = mailLayout({ shopName: 'Shop', heading: 'Hello', paragraphs: ['Total: 1\nDue: 2'] });
    expect(html).toContain('Total: 1<br>Due: 2');
    expect(text).toContain('Total: 1\nDue: 2');
  });
});

describe('the words of the shop’s mail', () => {
  it('a quote says what it is for, what it costs, until when, and where to answer', () => {
    const mail = quoteMail(QUOTE);
    expect(mail.subject).toBe('Kestrel & Sons Rewinds: quote Q2026-0004 for job J2026-0011');
    for (const words of ['75 kW 6-pole pump motor', '1,190.00 EUR', '31 March 2026', 'https://shop.example/portal/quotes/1']) expect(mail.text).toContain(words);
  });

  it('a quote to a customer without a portal asks for an answer by mail or phone, and links nowhere', () => {
    const mail = quoteMail({ ...QUOTE, portalUrl: null });
    expect(mail.text).toContain('Answer this mail or call us (+49 7000 1)');
    expect(mail.html).not.toContain('href');
  });

  it('a revised quote says that it takes the place of the earlier one', () => {
    expect(quoteMail({ ...QUOTE, revision: 2 }).text).toContain('revision 2; it takes the place of the earlier one');
  });

  it('an approval is read back with its name, its way and its limit', () => {
    const mail = approvalMail({ ...QUOTE, how: 'phone', approvedBy: 'H. Brandt', approvedAt: '10 March 2026, 10:55', purchaseOrder: '', notToExceed: '1,300.00 EUR', portalUrl: null });
    expect(mail.text).toContain('Approved by: H. Brandt, by phone, 10 March 2026, 10:55');
    expect(mail.text).toContain('Not to exceed: 1,300.00 EUR');
    expect(mail.text).not.toContain('Purchase order');
  });

  it('an invoice of a prepayment customer says what collection waits for', () => {
    const mail = invoiceMail({ ...QUOTE, invoiceNumber: 'R2026-0002', nothingToPay: false, dueOn: '2026-04-09', prepayment: true, bankLine: 'Town Bank, DE00 0000', portalUrl: 'https://shop.example/portal/invoices/1' });
    for (const words of ['To pay: 1,190.00 EUR', 'Due: 9 April 2026', 'can be collected once the invoice is paid', 'Our account: Town Bank, DE00 0000']) expect(mail.text).toContain(words);
  });

  it('an invoice of nothing asks for nothing', () => {
    const mail = invoiceMail({ ...QUOTE, gross: '0.00 EUR', invoiceNumber: 'R2026-0003', nothingToPay: true, dueOn: '2026-04-09', prepayment: true, bankLine: 'Town Bank', portalUrl: null });
    expect(mail.text).toContain('Nothing is to be paid.');
    expect(mail.text).not.toContain('Due');
    expect(mail.text).not.toContain('collected');
  });

  it('a receipt says what is left: nothing, something, or too much paid', () => {
    const receipt = (standing: 'paid' | 'part-paid' | 'overpaid') =>
      receiptMail({ shopName: 'Shop', contactName: '', receiptNumber: 'P2026-0001', invoiceNumber: 'R2026-0002', jobNumber: 'J2026-0011', amount: '500.00 EUR', kind: 'card', balance: '690.00 EUR', standing, portalUrl: null }).text;
    expect(receipt('paid')).toContain('paid in full');
    expect(receipt('part-paid')).toContain('Still to pay: 690.00 EUR.');
    expect(receipt('overpaid')).toContain('690.00 EUR more than the invoice asks for');
  });
});
