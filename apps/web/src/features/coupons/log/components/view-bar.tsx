import { Flex } from '@chakra-ui/react';
import { Segmented } from '../../../../components/segmented';
import { Switch } from '../../../../components/switch';
import type { TestGrid } from '../../coupons.api';
import { PLATE_VIEWS, type PlateView } from '../plate-views';

export type ViewBarProps = {
  view: PlateView;
  onView: (view: PlateView) => void;
  isRatingShown: boolean;
  onRatingShown: (isShown: boolean) => void;
  grids: readonly TestGrid[];
  gridNumber: number;
  onGrid: (number: number) => void;
};

export function ViewBar({ view, onView, isRatingShown, onRatingShown, grids, gridNumber, onGrid }: ViewBarProps) {
  return (
    <Flex ml={{ base: '0', sm: '48px' }} mb="2.5" gap="3" wrap="wrap" align="center" fontSize={{ base: 'sm', sm: 'md' }}>
      <Segmented label="Show on the plate" choices={PLATE_VIEWS} value={view} onChange={onView} />
      {grids.length > 1 && (
        <Segmented
          label="Grid"
          choices={grids.map(({ number }) => ({ value: String(number), label: `Grid ${number}` }))}
          value={String(gridNumber)}
          onChange={(number) => onGrid(Number(number))}
        />
      )}
      <Flex ml={{ base: '0', sm: 'auto' }} fontSize="sm" color="fg.muted">
        <Switch label="Ratings on cells" isOn={isRatingShown} onChange={onRatingShown} />
      </Flex>
    </Flex>
  );
}
