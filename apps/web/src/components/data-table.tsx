import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';

export type Column<T> = {
  key: string;
  /** A word; give `isHeaderHidden` for a column of pictures or buttons. */
  header: string;
  isHeaderHidden?: boolean;
  cell: (row: T) => ReactNode;
  /** Numbers stand at the right. */
  align?: 'start' | 'end';
  width?: string;
  /** On a phone the row becomes a card: 'title' leads it, 'picture' stands in its corner, 'hidden' is left out, 'fact' shows name and value. */
  onPhone?: 'title' | 'picture' | 'fact' | 'hidden';
  /** Between phone and desk the column goes, and these words stand as a second line in another one. */
  fold?: { into: string; words: (row: T) => ReactNode };
};

export type DataTableProps<T> = {
  /** Accessible name. */
  label: string;
  columns: readonly Column<T>[];
  rows: readonly T[];
  rowKey: (row: T) => string;
  /** 36 px rows for tables of numbers, 48 for rows with a picture or a link. */
  density?: 'dense' | 'target';
  /** Rows that the reader should look at, on straw. */
  isHighlighted?: (row: T) => boolean;
};

const CELL_DISPLAY = { base: 'flex', sm: 'table-cell' } as const;
const FOLDED_CELL_DISPLAY = { base: 'flex', sm: 'none', lg: 'table-cell' } as const;

/** A dense table with a sticky head. Below 600 px every row is a card; the roles keep it a table for screen readers. */
export function DataTable<T>({ label, columns, rows, rowKey, density = 'target', isHighlighted }: DataTableProps<T>) {
  const rowHeight = density === 'dense' ? 'row' : 'touch';
  return (
    <chakra.div
      bg={{ base: 'transparent', sm: 'bg.panel' }}
      border={{ base: 'none', sm: 'hairline' }}
      borderColor={{ sm: 'border' }}
      borderRadius="md"
      overflowX={{ base: 'visible', sm: 'auto', lg: 'visible' }}
    >
      <chakra.table
        role="table"
        aria-label={label}
        display={{ base: 'block', sm: 'table' }}
        width="full"
        borderCollapse="separate"
        borderSpacing="0"
        fontSize="sm"
        lineHeight="sm"
      >
        <chakra.thead role="rowgroup" display={{ base: 'none', sm: 'table-header-group' }} position="sticky" top="0" zIndex="sticky">
          <chakra.tr role="row">
            {columns.map(({ key, header, isHeaderHidden, align, width, fold }) => (
              <chakra.th
                key={key}
                role="columnheader"
                scope="col"
                display={fold === undefined ? undefined : { sm: 'none', lg: 'table-cell' }}
                textAlign={align ?? 'start'}
                width={width}
                fontWeight="semibold"
                color="fg.muted"
                bg="bg.panel"
                px="2.5"
                py="2"
                borderBottom="hairline"
                borderColor="border.emphasized"
                whiteSpace="nowrap"
                _first={{ pl: '4', borderTopLeftRadius: 'md' }}
                _last={{ pr: '4', borderTopRightRadius: 'md' }}
              >
                {isHeaderHidden === true ? <chakra.span srOnly>{header}</chakra.span> : header}
              </chakra.th>
            ))}
          </chakra.tr>
        </chakra.thead>
        <chakra.tbody role="rowgroup" display={{ base: 'grid', sm: 'table-row-group' }} gap="3">
          {rows.map((row) => (
            <chakra.tr
              key={rowKey(row)}
              role="row"
              display={{ base: 'block', sm: 'table-row' }}
              position="relative"
              bg={isHighlighted?.(row) === true ? 'straw.subtle' : { base: 'bg.panel', sm: 'transparent' }}
              border={{ base: 'hairline', sm: 'none' }}
              borderRadius={{ base: 'md', sm: 'none' }}
              p={{ base: '3', sm: '0' }}
            >
              {columns.map((column) => (
                <Cell
                  key={column.key}
                  column={column}
                  row={row}
                  height={rowHeight}
                  folded={columns.filter(({ fold }) => fold?.into === column.key)}
                />
              ))}
            </chakra.tr>
          ))}
        </chakra.tbody>
      </chakra.table>
    </chakra.div>
  );
}

const PICTURE_PLACE = { position: { base: 'absolute', sm: 'static' }, top: '3', right: '3' } as const;

type CellProps<T> = { column: Column<T>; row: T; height: string; folded: readonly Column<T>[] };

function Cell<T>({ column, row, height, folded }: CellProps<T>) {
  const { header, isHeaderHidden, cell, align, fold, onPhone = 'fact' } = column;
  const isFact = onPhone === 'fact' && isHeaderHidden !== true;
  return (
    <chakra.td
      role="cell"
      display={cellDisplay(onPhone === 'hidden', fold !== undefined)}
      {...(onPhone === 'picture' ? PICTURE_PLACE : {})}
      alignItems="center"
      justifyContent={isFact ? 'space-between' : 'flex-start'}
      gap="4"
      minHeight={{ base: onPhone === 'title' ? 'touch' : '8', sm: '0' }}
      height={{ base: 'auto', sm: height }}
      px={{ base: '0', sm: '2.5' }}
      textAlign={{ base: 'start', sm: align ?? 'start' }}
      verticalAlign="middle"
      borderBottom={{ base: 'none', sm: 'hairline' }}
      fontSize={onPhone === 'title' ? { base: 'md', sm: 'sm' } : undefined}
      fontWeight={onPhone === 'title' ? 'semibold' : undefined}
      css={{
        '&:first-of-type': { paddingLeft: { sm: '4' } },
        '&:last-of-type': { paddingRight: { sm: '4' } },
        'tr:last-of-type > &': { borderBottom: 'none' },
      }}
    >
      {isFact && (
        <chakra.span display={{ base: 'inline', sm: 'none' }} color="fg.muted" aria-hidden="true">
          {header}
        </chakra.span>
      )}
      <chakra.div minW="0">
        {cell(row)}
        {folded.map(({ key, fold: second }) => (
          <chakra.div key={key} display={{ base: 'none', sm: 'block', lg: 'none' }} fontWeight="normal" color="fg.muted">
            {second?.words(row)}
          </chakra.div>
        ))}
      </chakra.div>
    </chakra.td>
  );
}

function cellDisplay(isHiddenOnPhone: boolean, isFolded: boolean) {
  const shown = isFolded ? FOLDED_CELL_DISPLAY : CELL_DISPLAY;
  return isHiddenOnPhone ? { ...shown, base: 'none' } : shown;
}
