import { Box, chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import type { PlateLayout } from './plate-types';

/** A factor and its levels as they are read, for example { title: 'Power, %', levels: ['20', '30'] }. */
export type PlateFactor = { title: string; levels: readonly string[] };

export type PlateWithLevelsProps = {
  layout: PlateLayout;
  rowFactor: PlateFactor;
  columnFactor: PlateFactor;
  /** Row and column of the chosen cell, from 0; their levels stand out. */
  chosen?: { row: number; column: number } | undefined;
  children: ReactNode;
};

/** Levels stand outside the metal, since they are not burnt on it. Below 600 px the panel beside the plate names them instead. */
export function PlateWithLevels({ layout, rowFactor, columnFactor, chosen, children }: PlateWithLevelsProps) {
  const { widthMm, heightMm } = layout.plate;
  const rowPlaces = Array.from({ length: layout.rows }, (_, row) => layout.cells.find((cell) => cell.row === row)?.rect);
  const columnPlaces = Array.from({ length: layout.columns }, (_, column) => layout.cells.find((cell) => cell.column === column)?.rect);
  const firstColumn = columnPlaces[0];
  return (
    <Box
      display={{ base: 'block', sm: 'grid' }}
      gridTemplateColumns="48px minmax(0, 1fr)"
      gridTemplateRows="40px auto"
      fontSize="sm"
      lineHeight="16px"
      color="fg.muted"
    >
      <Box display={{ base: 'none', sm: 'block' }} gridColumn="2" position="relative" aria-hidden="true">
        <chakra.span position="absolute" top="0" style={{ left: percent((firstColumn?.xMm ?? 0) / widthMm) }} whiteSpace="nowrap">
          {columnFactor.title}
        </chakra.span>
        {columnPlaces.map((place, column) =>
          place === undefined ? null : (
            <Level
              key={place.xMm}
              isChosen={column === chosen?.column}
              style={{ left: percent((place.xMm + place.widthMm / 2) / widthMm), top: 20, transform: 'translateX(-50%)' }}
            >
              {columnFactor.levels[column]}
            </Level>
          ),
        )}
      </Box>
      <Box display={{ base: 'none', sm: 'block' }} gridRow="2" position="relative" aria-hidden="true">
        <chakra.span position="absolute" right="2" textAlign="right" style={{ top: percent(((rowPlaces[0]?.yMm ?? 0) - 5) / heightMm) }}>
          {rowFactor.title}
        </chakra.span>
        {rowPlaces.map((place, row) =>
          place === undefined ? null : (
            <Level
              key={place.yMm}
              isChosen={row === chosen?.row}
              style={{ right: 8, top: percent((place.yMm + place.heightMm / 2) / heightMm), transform: 'translateY(-50%)' }}
            >
              {rowFactor.levels[row]}
            </Level>
          ),
        )}
      </Box>
      <Box gridColumn="2" minW="0">
        {children}
      </Box>
    </Box>
  );
}

type LevelProps = { isChosen: boolean; style: Record<string, string | number>; children: ReactNode };

function Level({ isChosen, style, children }: LevelProps) {
  return (
    <chakra.span
      position="absolute"
      whiteSpace="nowrap"
      style={style}
      color={isChosen ? 'fg' : 'fg.muted'}
      fontWeight={isChosen ? 'bold' : 'normal'}
    >
      {children}
    </chakra.span>
  );
}

function percent(share: number): string {
  return `${(share * 100).toFixed(3)}%`;
}
