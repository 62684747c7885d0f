import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { createMemoryRouter, RouterProvider, useLocation } from 'react-router-dom';
import { describe, expect, it } from 'vitest';
import { DataTable, type Column } from './data-table.js';

interface Row {
  id: string;
  number: string;
  customer: string;
}
const rows: Row[] = [{ id: '1', number: '26-0412', customer: 'Northgate Water' }];
const columns: Column<Row>[] = [
  { key: 'number', title: 'Job', sort: 'number', cell: (r) => r.number },
  { key: 'customer', title: 'Customer', cell: (r) => r.customer },
];
function Address() {
  const { search } = useLocation();
  return <output>{search}</output>;
}
function open(start = '/?step=rewind', total = 120, page = 1) {
  const element = (
    <>
      <DataTable caption="Jobs" columns={columns} rows={rows} rowKey={(r) => r.id} total={total} page={page} size={50} sortedBy={{ sort: 'number', order: 'asc' }} />
      <Address />
    </>
  );
  render(<RouterProvider router={createMemoryRouter([{ path: '/', element }], { initialEntries: [start] })} />);
}
const query = () => {
  const address = document.querySelector('output')!.textContent;
  return Object.fromEntries(new URLSearchParams(address));
};
const person = userEvent.setup();

describe('a list that the server sorts and pages', () => {
  it('writes the order into the address and keeps the filter that stands there', async () => {
    open();
    await person.click(screen.getByRole('button', { name: 'Sort by Job' }));
    expect(query()).toEqual({ step: 'rewind', sort: 'number', order: 'desc', page: '1' });
    await person.click(screen.getByRole('button', { name: 'Sort by Job' }));
    expect(query()['order']).toBe('asc');
  });

  it('tells the order it has to whoever hears the page', () => {
    open();
    expect(screen.getByRole('columnheader', { name: /Job/ }).getAttribute('aria-sort')).toBe('ascending');
    expect(screen.getByRole('columnheader', { name: 'Customer' }).getAttribute('aria-sort')).toBeNull();
  });

  it('turns its pages through the address, and no further than there are any', async () => {
    open('/?page=2', 120, 2);
    expect(screen.getByText('51 to 100 of 120')).toBeDefined();
    await person.click(screen.getByRole('button', { name: 'Next' }));
    expect(query()['page']).toBe('3');
  });

  it('has no pages where everything fits on one', () => {
    open('/', 50);
    expect(screen.queryByRole('navigation', { name: 'Pages of the list' })).toBeNull();
  });

  it('gives each cell the name of its column for the cards of a phone', () => {
    open();
    expect(screen.getByRole('cell', { name: 'Northgate Water' }).getAttribute('data-title')).toBe('Customer');
  });
});
