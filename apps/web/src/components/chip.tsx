import { chakra, defineRecipe } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { CrossIcon, TickIcon } from './icons';

const chipRecipe = defineRecipe({
  base: {
    display: 'inline-flex',
    alignItems: 'center',
    gap: '1.5',
    minHeight: { base: '44px', lg: '32px' },
    px: '2.5',
    border: 'hairline',
    borderColor: 'border.emphasized',
    borderRadius: 'md',
    bg: 'bg.panel',
    fontSize: 'sm',
    cursor: 'pointer',
    _hover: { bg: 'bg.subtle' },
    _pressed: { bg: 'brand.subtle', borderColor: 'brand.solid', color: 'brand.fg', fontWeight: 'semibold' },
  },
});
const ChipFrame = chakra('button', chipRecipe);

export type ChipProps = { children: ReactNode; isPressed: boolean; onToggle: (isPressed: boolean) => void };

/** A tag that is on or off; on shows a tick. */
export function Chip({ children, isPressed, onToggle }: ChipProps) {
  return (
    <ChipFrame type="button" aria-pressed={isPressed} onClick={() => onToggle(!isPressed)}>
      {isPressed && <TickIcon size={16} />}
      {children}
    </ChipFrame>
  );
}

export type RemovableChipProps = { label: string; onRemove: () => void };

/** An active filter; pressing it takes the filter away. */
export function RemovableChip({ label, onRemove }: RemovableChipProps) {
  return (
    <ChipFrame type="button" aria-label={`Remove the filter ${label}`} onClick={onRemove}>
      {label}
      <CrossIcon size={16} />
    </ChipFrame>
  );
}
