import { Box, chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { CautionIcon } from './icons';

export type Caution = {
  key: string;
  /** What to do, first. */
  act: string;
  /** Why; it defers to the machine's manual and the laser safety officer. */
  reason: ReactNode;
  /** Where the caution comes from. On a phone it folds behind a tap. */
  source?: ReactNode;
};

/** Each caution draws the line around itself, so that an unfilled last row stays empty ground. */
const HAIRLINE_ROUND = { boxShadow: '0 0 0 1px var(--pp-colors-straw-emphasized)' };

/** Cautions stand before the setting, side by side on a wide screen. */
export function CautionList({ cautions, label = 'Cautions' }: { cautions: readonly Caution[]; label?: string }) {
  if (cautions.length === 0) return null;
  const columns = Math.min(cautions.length, 3);
  return (
    <chakra.ul
      aria-label={label}
      display="grid"
      gridTemplateColumns={{ base: '1fr', sm: `repeat(${columns}, minmax(0, 1fr))` }}
      gap="1px"
      overflow="hidden"
      bg="straw.subtle"
      border="hairline"
      borderColor="straw.emphasized"
      borderRadius="md"
    >
      {cautions.map(({ key, act, reason, source }) => (
        <chakra.li key={key} position="relative" css={HAIRLINE_ROUND} py="2.5" pr="3.5" pl={{ base: '44px', sm: '48px' }}>
          <Box position="absolute" left="3.5" top="13px" lineHeight="none">
            <CautionIcon />
          </Box>
          <chakra.b display="block">{act}</chakra.b>
          <chakra.span display="block" fontSize="sm" lineHeight="sm">
            {reason}
          </chakra.span>
          {source !== undefined && <Source>{source}</Source>}
        </chakra.li>
      ))}
    </chakra.ul>
  );
}

function Source({ children }: { children: ReactNode }) {
  return (
    <>
      <chakra.div display={{ base: 'none', sm: 'block' }} fontSize="sm" lineHeight="sm" color="fg.muted">
        {children}
      </chakra.div>
      <chakra.details display={{ base: 'block', sm: 'none' }} fontSize="sm" lineHeight="sm" color="fg.muted">
        {/* The whole caution takes the tap: the word alone is too small for a glove. */}
        <chakra.summary py="1" cursor="pointer" _after={{ content: '""', position: 'absolute', inset: '0' }}>
          Source
        </chakra.summary>
        {children}
      </chakra.details>
    </>
  );
}
