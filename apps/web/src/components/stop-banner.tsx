import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { StateShape } from './state-mark';

export type StopBannerProps = { title: string; children: ReactNode; actions?: ReactNode };

/** Work stops here: before everything else on the page, in word, shape and colour. */
export function StopBanner({ title, children, actions }: StopBannerProps) {
  return (
    <chakra.div
      display="flex"
      flexWrap="wrap"
      alignItems="center"
      gap="4"
      p="4"
      bg="oxide.subtle"
      border="hairline"
      borderWidth="2px"
      borderColor="oxide.solid"
      borderRadius="md"
    >
      <chakra.span color="oxide.fg" lineHeight="none">
        <StateShape state="withdrawn" size={32} />
      </chakra.span>
      <chakra.div flex="1" minW="min(200px, 100%)" overflowWrap="anywhere">
        <chakra.h2 color="oxide.fg">{title}</chakra.h2>
        {children}
      </chakra.div>
      {actions}
    </chakra.div>
  );
}
