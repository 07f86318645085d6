import { chakra } from '@chakra-ui/react';
import { arucoModules, type LayoutFiducial, type LayoutLabel, type RectMm } from '@proofplate/imaging';
import { memo } from 'react';
import type { PlateLayout } from './plate-types';

export type Modules = readonly (readonly boolean[])[];

export type PlateMarksProps = { layout: PlateLayout; code: string | undefined; dataMatrix: Modules | undefined };

/** What is burnt besides the cells: corner marks, letters, numbers, the code and its Data Matrix. */
export const PlateMarks = memo(function PlateMarks({ layout, code, dataMatrix }: PlateMarksProps) {
  return (
    <chakra.g aria-hidden="true">
      {layout.fiducials.map((fiducial) => (
        <CornerMark key={fiducial.id} fiducial={fiducial} />
      ))}
      <Lettering labels={layout.rowLetters} />
      <Lettering labels={layout.columnNumbers} />
      {code !== undefined && <CodeText place={layout.codePlace} code={code} />}
      {dataMatrix !== undefined && <ModuleField place={inset(layout.dataMatrixPlace, dataMatrix.length)} modules={dataMatrix} />}
    </chakra.g>
  );
});

function CornerMark({ fiducial: { id, rect } }: { fiducial: LayoutFiducial }) {
  return <ModuleField place={rect} modules={arucoModules(id)} />;
}

/** Dark modules as one path: four marks and a symbol of hundreds of modules stay five elements. */
function ModuleField({ place, modules }: { place: RectMm; modules: Modules }) {
  const sideMm = place.widthMm / modules.length;
  const outline = modules.flatMap((row, rowIndex) =>
    row.map((isDark, column) =>
      isDark ? `M${mm(place.xMm + column * sideMm)} ${mm(place.yMm + rowIndex * sideMm)}h${mm(sideMm)}v${mm(sideMm)}h${mm(-sideMm)}z` : '',
    ),
  );
  return <chakra.path d={outline.join('')} fill="plate.mark" shapeRendering="crispEdges" />;
}

function Lettering({ labels }: { labels: readonly LayoutLabel[] }) {
  return (
    <>
      {labels.map(({ text, rect }) => (
        <chakra.text
          key={text}
          x={rect.xMm + rect.widthMm / 2}
          y={rect.yMm + rect.heightMm * 0.92}
          css={{ fontSize: `${rect.heightMm * 1.25}px` }}
          fontWeight="semibold"
          textAnchor="middle"
          fill="plate.mark"
        >
          {text}
        </chakra.text>
      ))}
    </>
  );
}

function CodeText({ place, code }: { place: RectMm; code: string }) {
  return (
    <chakra.text
      x={place.xMm}
      y={place.yMm + place.heightMm * 0.9}
      css={{ fontSize: `${place.heightMm}px` }}
      fontWeight="semibold"
      fill="plate.mark"
    >
      {code}
    </chakra.text>
  );
}

/** The place holds a quiet zone of one module on each side. */
function inset(place: RectMm, modules: number): RectMm {
  const moduleMm = place.widthMm / (modules + 2);
  return {
    xMm: place.xMm + moduleMm,
    yMm: place.yMm + moduleMm,
    widthMm: place.widthMm - 2 * moduleMm,
    heightMm: place.heightMm - 2 * moduleMm,
  };
}

function mm(value: number): number {
  return Math.round(value * 1000) / 1000;
}
