import { type Block, type Run, type TextBlock, cell, gap, words } from '../press/blocks.js';
import { shopMark } from '../press/shop-mark.js';
import type { PartyOnPaper, ShopOnPaper } from './paper-model.js';
import { COMMON } from './words.js';

/** Sizes of the one type family: size and weight make rank, nothing else. */
export const TYPE = { title: 19, heading: 9.5, body: 8, money: 8.6, table: 7.4, small: 6.6, label: 6.6 } as const;

const present = (parts: readonly string[]) => parts.filter((part) => part.trim() !== '');

export const shopLine = (shop: ShopOnPaper) => present([shop.name, shop.addressLines.filter((line) => line.trim() !== '').join(', '), shop.registration]).join(' · ');

/** Mark and name of the shop on the left, whatever the paper wants on the right. */
export function letterHead(shop: ShopOnPaper, right: readonly Block[]): Block[] {
  const mark = shopMark(31);
  const contact = present([shop.phone && `${COMMON.telephone}\u00a0${shop.phone}`, shop.email, shop.website]).join(' · ');
  const lines = present([shop.addressLines.filter((line) => line.trim() !== '').join(', '), contact, shop.taxNumber && `${COMMON.taxNumber}\u00a0${shop.taxNumber}`]);
  return [
    {
      kind: 'columns',
      gapPt: 10,
      columns: [
        { widthPt: mark.widthPt, blocks: [{ kind: 'marks', ...mark }] },
        { share: 1, blocks: [words(shop.name, 12.5, 'text', 'bold'), gap(1), ...lines.map((line) => words(line, TYPE.small, 'muted'))] },
        ...(right.length > 0 ? [{ widthPt: 222, blocks: right }] : []),
      ],
    },
  ];
}

/** A quiet heading over its matter, kept with it. */
export function heading(text: string): Block[] {
  const block: TextBlock = { kind: 'text', runs: [{ text, weight: 'bold' }], sizePt: TYPE.heading, keepWithNext: true };
  return [gap(11), block, { kind: 'gap', heightPt: 2.5 }];
}

export function label(text: string): TextBlock {
  return { kind: 'text', runs: [{ text, ink: 'muted' }], sizePt: TYPE.label, keepWithNext: true };
}

export type Field = readonly [label: string, value: string | readonly Run[]];

/** Labels in their own column, values beside them; a field with nothing in it is left out. */
export function fields(list: readonly Field[], labelPt: number, sizePt: number = TYPE.table): Block[] {
  const rows = list.filter(([, value]) => (typeof value === 'string' ? value.trim() !== '' : value.length > 0));
  if (rows.length === 0) return [];
  return [
    {
      kind: 'table',
      columns: [{ widthPt: labelPt }, { share: 1 }],
      head: null,
      sizePt,
      paddingPt: 0.7,
      gutterPt: 6,
      rows: rows.map(([name, value]) => ({ bare: true, cells: [cell(name, { ink: 'muted' }), typeof value === 'string' ? cell(value) : { runs: value }] })),
    },
  ];
}

export function partyBlocks(party: PartyOnPaper): Block[] {
  return [
    words(party.name, TYPE.body + 0.5, 'text', 'bold'),
    ...present([party.contactName, ...party.addressLines]).map((line) => words(line, TYPE.body)),
    ...(party.taxNumber ? [words(`${COMMON.taxNumber} ${party.taxNumber}`, TYPE.small, 'muted')] : []),
  ];
}
