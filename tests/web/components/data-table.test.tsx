// @vitest-environment happy-dom
import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { type DataColumn, DataTable } from '../../../web/components/ui/data-table';
import '../render-page';

interface Row {
  mix: string;
  due: number | undefined;
}

const columns: DataColumn<Row>[] = [
  { id: 'mix', header: 'Mix', cell: (row) => row.mix, sortBy: (row) => row.mix, rowHeader: true },
  { id: 'due', header: 'Due', cell: (row) => row.due ?? '', sortBy: (row) => row.due, number: true },
  { id: 'act', header: 'Act', cell: () => 'open' },
];
const rows: Row[] = [
  { mix: 'BW-190', due: 12 },
  { mix: 'BW-095', due: undefined },
  { mix: 'BW-125', due: 3 },
];
const order = () => screen.getAllByRole('rowheader').map((cell) => cell.textContent);

describe('a table that sorts', () => {
  it('keeps the order it was given until a head is pressed', () => {
    render(<DataTable caption="Mixes" columns={columns} rows={rows} rowKey={(row) => row.mix} />);
    expect(order()).toEqual(['BW-190', 'BW-095', 'BW-125']);
    fireEvent.click(screen.getByText('Mix'));
    expect(order()).toEqual(['BW-095', 'BW-125', 'BW-190']);
    expect(screen.getByRole('columnheader', { name: 'Mix' }).getAttribute('aria-sort')).toBe('ascending');
  });

  it('stands absent values last, up and down', () => {
    render(<DataTable caption="Mixes" columns={columns} rows={rows} rowKey={(row) => row.mix} />);
    fireEvent.click(screen.getByText('Due'));
    expect(order()).toEqual(['BW-125', 'BW-190', 'BW-095']);
    fireEvent.click(screen.getByText('Due'));
    expect(order()).toEqual(['BW-190', 'BW-125', 'BW-095']);
  });

  it('keeps what is open under a row with it', () => {
    render(
      <DataTable
        caption="Mixes"
        columns={columns}
        rows={rows}
        rowKey={(row) => row.mix}
        rowAfter={(row) => (row.mix === 'BW-095' ? <p>opened</p> : null)}
      />,
    );
    const rowBeforeOpened = () =>
      screen.getByText('opened').closest('tr')?.previousElementSibling?.textContent;
    expect(rowBeforeOpened()).toContain('BW-095');
    fireEvent.click(screen.getByText('Mix'));
    expect(rowBeforeOpened()).toContain('BW-095');
  });

  it('offers no sorting where none is meant', () => {
    render(<DataTable caption="Mixes" columns={columns} rows={rows} rowKey={(row) => row.mix} />);
    expect(screen.queryByRole('button', { name: 'Act' })).toBeNull();
    expect(screen.getByRole('table', { name: 'Mixes' })).toBeTruthy();
  });
});
