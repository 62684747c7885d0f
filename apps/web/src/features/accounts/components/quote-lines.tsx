import { Button, Menu, MenuItem, PopoverNext } from '@blueprintjs/core';
import { ArrowDown, ArrowUp, CaretDown, Cross, Plus } from '@blueprintjs/icons';
import { formatMoney } from '@libs/money';
import { useFieldArray, useWatch, type Control } from 'react-hook-form';
import { emptyLine, liveTotals, readFigure, type LineForm, type QuoteForm } from '../quote-form.js';
import { QUICK_LINES, t, type QuickLine } from '../quote-text.js';
import { LineInput, LineKind } from './line-input.js';
import './quote-editor.css';

/** The lines of a draft: typed, added, taken out, moved by buttons. */
export function QuoteLines({ control, currency }: { readonly control: Control<QuoteForm>; readonly currency: string }) {
  const { fields, append, remove, move } = useFieldArray({ control, name: 'lines' });
  const lines = useWatch({ control, name: 'lines' });
  const { netOfLine } = liveTotals(lines, currency);
  // the tax of a line is mostly that of the line before
  const rate = lines.at(-1)?.taxRateBasisPoints ?? '';
  const add = (line: Partial<LineForm>, field: 'description' | 'unitPriceMinor') => append({ ...emptyLine(rate), ...line }, { focusName: `lines.${fields.length}.${field}` });
  const addQuick = ({ kind, description, unit }: QuickLine) => add({ kind, description, unit }, 'unitPriceMinor');
  const label = (field: Parameters<typeof t>[0] & ('kind' | 'description' | 'quantity' | 'unit' | 'price' | 'rate'), i: number) => t('inLine', { field: t(field), n: i + 1 });
  const check = (name: Parameters<typeof readFigure>[0]) => (text: string) => {
    const read = readFigure(name, text, currency);
    return read.ok ? undefined : read.words;
  };
  return (
    <>
      <table className="lb-edit-lines">
        <caption className="visually-hidden">{t('caption')}</caption>
        <thead>
          <tr>
            <th scope="col">{t('kind')}</th>
            <th scope="col">{t('description')}</th>
            <th scope="col">{t('quantity')}</th>
            <th scope="col">{t('unit')}</th>
            <th scope="col">{`${t('price')} ${currency}`}</th>
            <th scope="col">{t('rate')}</th>
            <th scope="col" className="number">{t('amount')}</th>
            <th scope="col">
              <span className="visually-hidden">{t('lineButtons')}</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {fields.map((field, i) => {
            const net = netOfLine[i];
            return (
              <tr key={field.id}>
                <td><LineKind control={control} name={`lines.${i}.kind`} label={label('kind', i)} column={t('kind')} /></td>
                <td><LineInput control={control} name={`lines.${i}.description`} label={label('description', i)} column={t('description')} /></td>
                <td><LineInput control={control} name={`lines.${i}.quantityThousandths`} label={label('quantity', i)} column={t('quantity')} figure check={check('quantityThousandths')} /></td>
                <td><LineInput control={control} name={`lines.${i}.unit`} label={label('unit', i)} column={t('unit')} /></td>
                <td><LineInput control={control} name={`lines.${i}.unitPriceMinor`} label={label('price', i)} column={t('price')} figure check={check('unitPriceMinor')} /></td>
                <td><LineInput control={control} name={`lines.${i}.taxRateBasisPoints`} label={label('rate', i)} column={t('rate')} figure check={check('taxRateBasisPoints')} /></td>
                <td className="number num lb-line-net">{net === null || net === undefined ? '–' : formatMoney(net, currency)}</td>
                <td className="lb-line-buttons">
                  <Button variant="minimal" icon={<ArrowUp />} aria-label={t('up', { n: i + 1 })} disabled={i === 0} onClick={() => move(i, i - 1)} />
                  <Button variant="minimal" icon={<ArrowDown />} aria-label={t('down', { n: i + 1 })} disabled={i === fields.length - 1} onClick={() => move(i, i + 1)} />
                  <Button variant="minimal" icon={<Cross />} aria-label={t('remove', { n: i + 1 })} disabled={fields.length === 1} onClick={() => remove(i)} />
                </td>
              </tr>
            );
          })}
        </tbody>
      </table>
      <div className="row">
        <Button icon={<Plus />} text={t('add')} onClick={() => add({}, 'description')} />
        <PopoverNext
          placement="bottom-start"
          // the price of the new line is typed next
          shouldReturnFocusOnClose={false}
          content={
            <Menu aria-label={t('quick')}>
              {QUICK_LINES.map((line) => (
                <MenuItem key={line.name} text={line.name} onClick={() => addQuick(line)} />
              ))}
            </Menu>
          }
        >
          <Button text={t('quick')} endIcon={<CaretDown />} />
        </PopoverNext>
      </div>
    </>
  );
}
