import { Box, chakra, Flex } from '@chakra-ui/react';
import { formatPercentChange } from '../lib/format';

export type ChangeTrackProps = {
  /** Change as a fraction of the compared value: −0.26. */
  change: number;
  /** End of the scale, the same for all bars of a table. */
  limit?: number;
};

export type ChangeBarProps = ChangeTrackProps & {
  /** Takes the place of the signed percentage: "−10 points". */
  text?: string;
};

/** A bar from a hairline zero, left or right, on one scale per table; the signed number stands beside it. */
export function ChangeBar({ change, limit, text }: ChangeBarProps) {
  return (
    <Flex align="center" gap="2">
      <chakra.span minW="56px" textAlign="right" fontWeight="semibold" whiteSpace="nowrap">
        {text ?? formatPercentChange(change)}
      </chakra.span>
      <ChangeTrack change={change} limit={limit} />
    </Flex>
  );
}

/** The bar alone, where its number stands elsewhere. */
export function ChangeTrack({ change, limit = 0.65 }: ChangeTrackProps) {
  const share = Math.min(1, Math.abs(change) / limit) * 50;
  const isBeyond = Math.abs(change) > limit;
  return (
    <Box position="relative" flex="1" minW="80px" maxW="160px" height="8px" aria-hidden="true">
      <Box position="absolute" top="0" bottom="0" bg="brand.solid" style={{ width: `${share}%`, [change < 0 ? 'right' : 'left']: '50%' }} />
      <Box position="absolute" left="50%" top="-2px" bottom="-2px" width="1px" bg="border.emphasized" />
      {isBeyond && (
        <Box position="absolute" top="0" bottom="0" width="3px" bg="straw.solid" style={{ [change < 0 ? 'left' : 'right']: 0 }} />
      )}
    </Box>
  );
}
