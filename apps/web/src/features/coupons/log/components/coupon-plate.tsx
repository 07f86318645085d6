import { Box, chakra, Flex } from '@chakra-ui/react';
import { type ReactNode, type Ref, useImperativeHandle, useMemo, useRef } from 'react';
import { useCouponLayout } from '../../../../components/plate/evidence-plate';
import { FlatPhoto, type PlatePhoto } from '../../../../components/plate/flat-photo';
import { HeatLegend } from '../../../../components/plate/heat-legend';
import { Plate } from '../../../../components/plate/plate';
import { PlateWithLevels } from '../../../../components/plate/plate-with-levels';
import type { Coupon } from '../../coupons.api';
import { factorWords } from '../cell-words';
import type { DrawnView } from '../plate-views';
import type { PlateChoice } from '../use-plate-choice';

export type CouponPlateHandle = { focusCell: (address: string) => void };

export type CouponPlateProps = {
  coupon: Coupon;
  choice: PlateChoice;
  drawn: DrawnView;
  /** Laid under the cells in the photo view. */
  photo: PlatePhoto | undefined;
  decimalSign: '.' | ',';
  isRatingShown: boolean;
  /** Stands in the place of the legend in the photo view. */
  caption: ReactNode;
  onRate: (address: string, rating: number) => void;
  onOpen: () => void;
  ref: Ref<CouponPlateHandle>;
};

/** The plate with its levels outside, over its photo or as a map of one response. */
export function CouponPlate({ coupon, choice, drawn, photo, decimalSign, isRatingShown, caption, onRate, onOpen, ref }: CouponPlateProps) {
  const { grid, cell } = choice;
  const { rows, columns, cellMm, gapMm } = grid;
  const { panel } = coupon.profile;
  const layout = useCouponLayout({ rows, columns, cellMm, gapMm, code: coupon.code });
  const rowFactor = useMemo(() => factorWords(grid.rowFactor, panel, decimalSign), [grid, panel, decimalSign]);
  const columnFactor = useMemo(() => factorWords(grid.columnFactor, panel, decimalSign), [grid, panel, decimalSign]);
  const frame = useRef<HTMLDivElement>(null);
  useImperativeHandle(ref, () => ({
    focusCell: (address) => frame.current?.querySelector<SVGGElement>(`[data-address="${CSS.escape(address)}"]`)?.focus(),
  }));
  const isOverPhoto = photo !== undefined && choice.view === 'photo';
  return (
    <>
      <PlateWithLevels
        layout={layout}
        rowFactor={rowFactor}
        columnFactor={columnFactor}
        chosen={{ row: cell.rowIndex, column: cell.columnIndex }}
      >
        <Box ref={frame} position="relative">
          {isOverPhoto && <FlatPhoto photo={photo} plate={layout.plate} label={`Photo of coupon ${coupon.code}`} />}
          <Box position={isOverPhoto ? 'absolute' : 'static'} inset="0">
            <Plate
              layout={layout}
              cells={drawn.cells}
              scale={drawn.scale}
              label={`Cells of coupon ${coupon.code}, ${rows} rows, ${columns} columns`}
              code={coupon.code}
              chosen={cell.address}
              isOverPhoto={isOverPhoto}
              isRatingShown={isRatingShown}
              onChoose={choice.chooseCell}
              onRate={onRate}
              onOpen={onOpen}
            />
          </Box>
        </Box>
      </PlateWithLevels>
      <chakra.div ml={{ base: '0', sm: '48px' }} mt="2.5" minHeight="44px">
        {choice.view === 'photo' && caption}
        {drawn.legend !== undefined && drawn.scale !== undefined && <HeatLegend {...drawn.legend} scale={drawn.scale} />}
        {choice.view !== 'photo' && drawn.scale === undefined && <NothingMeasured />}
      </chakra.div>
    </>
  );
}

function NothingMeasured() {
  return (
    <Flex fontSize="sm" lineHeight="sm" color="fg.muted">
      Nothing is measured of this yet: every cell is hatched. Enter measurements, or look at the ratings.
    </Flex>
  );
}
