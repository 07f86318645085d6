import { Box, chakra, Flex } from '@chakra-ui/react';
import { formatPercentChange } from '../lib/format';

export type ChangeBarProps = {
  /** Change as a fraction of the compared value: −0.26. */
  change: number;
  /** End of the scale, the same for all bars of a table. */
  limit?: number;
};

/** A bar from a hairline zero, left or right, on one scale per table; the signed number stands beside it. */
export function ChangeBar({ change, limit = 0.65 }: ChangeBarProps) {
  const share = Math.min(1, Math.abs(change) / limit) * 50;
  const isBeyond = Math.abs(change) > limit;
  return (
    <Flex align="center" gap="2">
      <chakra.span minW="56px" textAlign="right" fontWeight="semibold" whiteSpace="nowrap">
        {formatPercentChange(change)}
      </chakra.span>
      <Box position="relative" flex="1" minW="80px" maxW="160px" height="8px" aria-hidden="true">
        <Box
          position="absolute"
          top="0"
          bottom="0"
          bg="brand.solid"
          style={{ width: `${share}%`, [change < 0 ? 'right' : 'left']: '50%' }}
        />
        <Box position="absolute" left="50%" top="-2px" bottom="-2px" width="1px" bg="border.emphasized" />
        {isBeyond && (
          <Box position="absolute" top="0" bottom="0" width="3px" bg="straw.solid" style={{ [change < 0 ? 'left' : 'right']: 0 }} />
        )}
      </Box>
    </Flex>
  );
}
