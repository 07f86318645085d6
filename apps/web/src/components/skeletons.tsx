import { Box, chakra } from '@chakra-ui/react';

const Bone = chakra('div', { base: { bg: 'bg.muted', borderRadius: 'md', animation: 'pulse 1.6s ease-in-out infinite' } });

export type SkeletonTableProps = { rows?: number; label?: string };

/** One block of the size that the content will have. Give `height` (and `width`) from the theme's sizes. */
export function SkeletonBlock({ height, width = 'full', label = 'Loading' }: { height: string; width?: string; label?: string }) {
  return (
    <Box role="status" aria-label={label} width={width}>
      <Bone height={height} width="full" />
    </Box>
  );
}

/** Rows of a list in their final height. */
export function SkeletonTable({ rows = 8, label = 'Loading the list' }: SkeletonTableProps) {
  return (
    <Box role="status" aria-label={label} bg="bg.panel" border="hairline" borderRadius="md">
      {Array.from({ length: rows }, (_, row) => (
        <Box key={row} height="rowTarget" px="3" display="flex" alignItems="center" borderTop={row === 0 ? undefined : 'hairline'}>
          <Bone height="4" width={row % 3 === 0 ? '38%' : row % 3 === 1 ? '54%' : '46%'} />
        </Box>
      ))}
    </Box>
  );
}

/** Labels and boxes of a form in their final places. */
export function SkeletonForm({ fields = 4, label = 'Loading the form' }: { fields?: number; label?: string }) {
  return (
    <Box role="status" aria-label={label} maxW="form" display="grid" gap="4">
      {Array.from({ length: fields }, (_, field) => (
        <Box key={field}>
          <Bone height="3.5" width="32%" mb="2" />
          <Bone height={{ base: 'touch', lg: 'control' }} width="full" />
        </Box>
      ))}
    </Box>
  );
}
