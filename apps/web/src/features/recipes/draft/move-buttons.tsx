import { chakra } from '@chakra-ui/react';
import { Button } from '../../../components/button';
import { ChevronDownIcon } from '../../../components/icons';

export type MoveButtonsProps = { what: string; isFirst: boolean; isLast: boolean; onMove: (by: -1 | 1) => void };

/** An order is changed by buttons, never by dragging alone. */
export function MoveButtons({ what, isFirst, isLast, onMove }: MoveButtonsProps) {
  return (
    <>
      <Button
        kind="quiet"
        shape="square"
        aria-label={`Move ${what} up`}
        disabled={isFirst}
        onClick={() => onMove(-1)}
        icon={
          <chakra.span transform="rotate(180deg)" lineHeight="none">
            <ChevronDownIcon />
          </chakra.span>
        }
      />
      <Button
        kind="quiet"
        shape="square"
        aria-label={`Move ${what} down`}
        disabled={isLast}
        onClick={() => onMove(1)}
        icon={<ChevronDownIcon />}
      />
    </>
  );
}
