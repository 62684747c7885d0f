import { describe, expect, it } from 'vitest';
import { BadForm, decodeForm } from './form-body.js';

describe('a form body', () => {
  it('becomes lists and objects as the SDK wrote them', () => {
    expect(decodeForm('line_items[0][price_data][currency]=usd&line_items[0][quantity]=2&line_items[1][quantity]=1&expand[]=a&expand[]=b&name=M%C3%BCller+%26+Co')).toMatchObject({
      line_items: [{ price_data: { currency: 'usd' }, quantity: '2' }, { quantity: '1' }],
      expand: ['a', 'b'],
      name: 'Müller & Co',
    });
  });

  it('treats dangerous names as names', () => {
    const form = decodeForm('metadata[__proto__]=x&metadata[constructor]=y');
    expect(Object.keys(form['metadata'] ?? {})).toEqual(['__proto__', 'constructor']);
    expect(Object.hasOwn(Object.prototype, 'x')).toBe(false);
  });

  it('refuses what contradicts itself or goes too deep', () => {
    for (const text of ['a=1&a[b]=2', 'a[b]=2&a=1', 'a[b=1', '[a]=1', `a${'[x]'.repeat(9)}=1`]) expect(() => decodeForm(text)).toThrow(BadForm);
  });
});
