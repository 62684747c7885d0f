import { type Block, type Cell, type Run, type TableRow, cell, gap, keep, words } from '../press/blocks.js';
import { dayOf, dayWords, momentWords } from './dates.js';
import { type LaidPaper, sheetFrame } from './frame-of-paper.js';
import { machineLine } from './machine-words.js';
import type { InvoiceModel, MoneyLineOnPaper, QuoteModel, ReceiptModel, SumsOnPaper } from './money-papers-model.js';
import { amountWords, plainAmount, quantityWords, rateWords } from './money-words.js';
import { type Field, TYPE, fields, letterHead, partyBlocks, shopLine } from './paper-head.js';
import type { JobPaperBase } from './paper-model.js';
import { COMMON, MONEY, PAYMENT_WORDS } from './words.js';

export function layoutQuote(model: QuoteModel): LaidPaper {
  const title = MONEY.quote;
  return laid(model, title, [
    ...opening(model, title, [
      [MONEY.quoteNumber, `${model.number}, ${MONEY.revision(model.revision)}`],
      [MONEY.quoteDate, dayOf(model.issuedAt, model.timeZone)],
      [MONEY.validUntil, [{ text: dayWords(model.validUntil), weight: 'bold' }]],
    ]),
    ...lineTable(model),
    ...totals(model, MONEY.total),
    ...note(model.note),
    keep(
      gap(10),
      words(MONEY.quoteMeans, TYPE.money),
      ...(model.answerUrl
        ? [gap(4), { kind: 'text' as const, sizePt: TYPE.money, runs: [{ text: `${MONEY.toAnswer} ` }, { text: model.answerUrl, ink: 'copper' as const, weight: 'bold' as const }] }]
        : [gap(4), words(MONEY.answerByPaper, TYPE.money)]),
      gap(30),
      signatureLines([MONEY.approvedBy]),
    ),
    ...taxNote(model),
  ]);
}

export function layoutInvoice(model: InvoiceModel): LaidPaper {
  const title = MONEY.invoice;
  const owed = model.grossMinor > 0;
  const bank = model.bank;
  const pay: Block[] = [
    { kind: 'text', sizePt: TYPE.money + 1, runs: [{ text: owed ? MONEY.pay(amountWords(model.grossMinor, model.currency), dayWords(model.dueOn)) : MONEY.nothingToPay, weight: 'bold', ink: owed ? 'copper' : 'text' }] },
    gap(3),
    ...fields(
      [
        [MONEY.terms, model.terms],
        [MONEY.reference, [{ text: model.paymentReference, weight: 'bold' }]],
        ...(bank
          ? ([
              [MONEY.account, bank.accountHolder],
              [MONEY.iban, bank.iban],
              [MONEY.bic, bank.bic],
              [MONEY.bank, bank.bankName],
            ] as Field[])
          : []),
        ...(model.payUrl ? [[MONEY.payOnline, [{ text: model.payUrl, ink: 'copper' }]] as Field] : []),
      ],
      96,
      TYPE.money,
    ),
  ];
  return laid(model, title, [
    ...opening(model, title, [
      [MONEY.invoice, [{ text: model.number, weight: 'bold' }]],
      [MONEY.invoiceDate, dayOf(model.issuedAt, model.timeZone)],
      [MONEY.suppliedOn, model.suppliedOn ? dayWords(model.suppliedOn) : dayOf(model.issuedAt, model.timeZone)],
      [MONEY.dueOn, [{ text: dayWords(model.dueOn), weight: 'bold' }]],
      [MONEY.quoteNumber, model.quoteNumber],
      [MONEY.approval, model.approval],
      [MONEY.purchaseOrder, model.purchaseOrder],
    ]),
    ...lineTable(model),
    ...totals(model, MONEY.totalDue),
    ...note(model.note),
    gap(14),
    { kind: 'frame', ink: owed ? 'copper' : 'line', paddingPt: 9, blocks: [keep(...pay)] },
    ...taxNote(model),
  ]);
}

export function layoutReceipt(model: ReceiptModel): LaidPaper {
  const title = MONEY.receipt;
  const amount = (minor: number) => amountWords(minor, model.currency);
  const paid = model.balanceMinor <= 0;
  return laid(model, title, [
    ...opening(model, title, [
      [MONEY.receipt, [{ text: model.number, weight: 'bold' }]],
      [COMMON.issued, dayOf(model.issuedAt, model.timeZone)],
      [MONEY.forInvoice, model.invoiceNumber],
    ]),
    gap(18),
    { kind: 'text', sizePt: 22, runs: [{ text: amount(model.payment.amountMinor), weight: 'bold' }] },
    gap(4),
    ...fields(
      [
        [MONEY.receivedFrom, model.customer.name],
        [MONEY.receivedOn, momentWords(model.payment.receivedAt, model.timeZone)],
        [MONEY.how, PAYMENT_WORDS[model.payment.kind]],
        [MONEY.paymentNote, model.payment.reference],
        [MONEY.recordedBy, model.payment.recordedBy],
      ],
      110,
      TYPE.money,
    ),
    gap(14),
    {
      kind: 'table',
      columns: [{ share: 1 }, { widthPt: 130, align: 'right' }],
      head: null,
      sizePt: TYPE.money,
      paddingPt: 3,
      rows: [
        { cells: [cell(MONEY.invoiceTotal), cell(amount(model.invoiceGrossMinor))] },
        { cells: [cell(MONEY.paidSoFar), cell(amount(model.paidMinor))] },
        { heavy: true, cells: [cell(model.balanceMinor < 0 ? MONEY.overpaid : MONEY.balance, { weight: 'bold' }), cell(amount(Math.abs(model.balanceMinor)), { weight: 'bold' })] },
      ],
    },
    gap(10),
    ...(paid ? [{ kind: 'text' as const, sizePt: TYPE.money + 1, runs: [{ text: MONEY.paidInFull, weight: 'bold' as const }] }] : []),
  ]);
}

/** Head, address and facts: the same for every paper that goes to a customer. */
export function opening(model: JobPaperBase, title: string, facts: readonly Field[]): Block[] {
  return [
    ...letterHead(model.shop, []),
    gap(20),
    {
      kind: 'columns',
      gapPt: 24,
      columns: [
        { share: 1, blocks: partyBlocks(model.customer) },
        {
          widthPt: 232,
          blocks: [
            { kind: 'text', sizePt: TYPE.title, runs: [{ text: title, weight: 'bold' }], leading: 1.1 },
            gap(5),
            ...fields([...facts, [COMMON.job, model.job.number], [COMMON.yourReference, model.job.customerReference]], 82, TYPE.money),
          ],
        },
      ],
    },
    gap(14),
    ...fields([[COMMON.machine, machineLine(model.machine, model.units)]], 56, TYPE.money),
    gap(8),
  ];
}

function laid(model: JobPaperBase, title: string, blocks: Block[]): LaidPaper {
  return {
    frame: sheetFrame(model.paperSize),
    blocks,
    runningHead: `${title} ${model.number} · ${model.shop.name}`,
    foot: shopLine(model.shop),
    title: `${title} ${model.number}`,
    subject: `${title} ${model.number}, ${COMMON.job} ${model.job.number}`,
    furniture: true,
  };
}

function lineTable(model: SumsOnPaper): Block[] {
  const head = (text: string, align: 'left' | 'right' = 'left'): Cell => cell(text, { ink: 'muted', align });
  const column = (title: string, told: (line: MoneyLineOnPaper) => string) => ({ widthPt: figureColumn([title, ...model.lines.map(told)]), align: 'right' as const });
  const plain = (minor: number) => plainAmount(minor, model.currency);
  return [
    {
      kind: 'table',
      sizePt: TYPE.money,
      paddingPt: 3,
      gutterPt: 9,
      columns: [
        { widthPt: 17, align: 'right' },
        { share: 1 },
        column(MONEY.quantity, (line) => `${quantityWords(line.quantityThousandths)} ${line.unit}`),
        column(MONEY.unitPrice, (line) => plain(line.unitPriceMinor)),
        column(MONEY.net, (line) => plain(line.netMinor)),
        column(MONEY.rate, (line) => rateWords(line.taxRateBasisPoints)),
        column(MONEY.tax, (line) => plain(line.taxMinor)),
      ],
      head: [head(MONEY.line, 'right'), head(MONEY.description), head(MONEY.quantity, 'right'), head(MONEY.unitPrice, 'right'), head(MONEY.net, 'right'), head(MONEY.rate, 'right'), head(MONEY.tax, 'right')],
      rows: model.lines.map((line, index): TableRow => ({
        cells: [
          cell(String(index + 1), { ink: 'muted' }),
          cell(line.description),
          { runs: quantityRuns(line.quantityThousandths, line.unit) },
          cell(plain(line.unitPriceMinor)),
          cell(plain(line.netMinor)),
          cell(rateWords(line.taxRateBasisPoints), { ink: 'muted' }),
          cell(plain(line.taxMinor), { ink: 'muted' }),
        ],
      })),
    },
  ];
}

/** As wide as its longest figure, so that no amount is ever broken: a figure is 0.57 of its size wide, in this face and in its wider sister 0.64. */
function figureColumn(texts: readonly string[]): number {
  const longest = texts.reduce((most, text) => Math.max(most, text.length), 4);
  return Math.min(longest, 22) * TYPE.money * 0.64;
}

function quantityRuns(thousandths: number, unit: string): Run[] {
  const figure = quantityWords(thousandths);
  return unit.trim() === '' ? [{ text: figure }] : [{ text: figure }, { text: `\u00a0${unit}`, ink: 'muted' }];
}

function totals(model: SumsOnPaper, label: string): Block[] {
  const row = (name: string, minor: number): TableRow => ({ bare: true, cells: [cell(name, { ink: 'muted' }), cell(plainAmount(minor, model.currency))] });
  return [
    keep({
      kind: 'columns',
      gapPt: 0,
      columns: [
        { share: 1, blocks: [] },
        {
          widthPt: 268,
          blocks: [
            {
              kind: 'table',
              sizePt: TYPE.money,
              paddingPt: 2.4,
              columns: [{ share: 1 }, { widthPt: 104, align: 'right' }],
              head: null,
              rows: [
                { ...row(MONEY.netTotal, model.netMinor), bare: false, heavy: true },
                ...model.taxSummary.map((tax) => row(MONEY.taxOn(rateWords(tax.taxRateBasisPoints), plainAmount(tax.netMinor, model.currency)), tax.taxMinor)),
                { heavy: true, cells: [cell(label, { weight: 'bold' }), cell(amountWords(model.grossMinor, model.currency), { weight: 'bold' })] },
              ],
            },
          ],
        },
      ],
    }),
  ];
}

function note(text: string): Block[] {
  return text.trim() === '' ? [] : [gap(10), words(text, TYPE.money)];
}

function taxNote(model: SumsOnPaper): Block[] {
  return [gap(10), words(MONEY.allIn(model.currency), TYPE.small, 'muted')];
}

/** Lines to be signed with a pen, side by side. */
export function signatureLines(labels: readonly string[]): Block {
  return {
    kind: 'columns',
    gapPt: 24,
    columns: [...labels, ...(labels.length === 1 ? [''] : [])].map((label) => ({ share: 1, blocks: label === '' ? [] : [{ kind: 'rule', ink: 'line', thicknessPt: 0.7 } as const, gap(2), words(label, TYPE.label, 'muted')] })),
  };
}

