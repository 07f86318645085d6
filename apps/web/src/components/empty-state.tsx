import { chakra, Flex } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { Panel } from './page';

export type EmptyStateProps = {
  /** none-yet: teaches and gives the first act; none-match: names the filter to drop; no-right: says who can. */
  kind: 'none-yet' | 'none-match' | 'no-right';
  title: string;
  children: ReactNode;
  /** A drawing, for none-yet: usually an empty plate. */
  drawing?: ReactNode;
  actions?: ReactNode;
  /** A last line under the actions. */
  note?: ReactNode;
};

export function EmptyState({ kind, title, children, drawing, actions, note }: EmptyStateProps) {
  const isLarge = kind === 'none-yet' && drawing !== undefined;
  return (
    <Panel
      display="grid"
      gridTemplateColumns={isLarge ? { base: '1fr', lg: '380px minmax(0, 1fr)' } : '1fr'}
      gap={{ base: '6', lg: '16' }}
      alignItems="center"
      px={{ base: '5', sm: '10', lg: isLarge ? '20' : '12' }}
      py={{ base: '8', lg: isLarge ? '18' : '10' }}
    >
      {isLarge && (
        <chakra.div maxW={{ base: '240px', lg: 'full' }} aria-hidden="true">
          {drawing}
        </chakra.div>
      )}
      <chakra.div maxW="prose">
        <chakra.h2 fontSize={isLarge ? '2xl' : 'xl'} lineHeight={isLarge ? 'title' : 'xl'}>
          {title}
        </chakra.h2>
        <chakra.div mt="2" color={isLarge ? 'fg' : 'fg.muted'}>
          {children}
        </chakra.div>
        {actions !== undefined && (
          <Flex mt="5" gap="3" wrap="wrap">
            {actions}
          </Flex>
        )}
        {note !== undefined && (
          <chakra.p mt="4" fontSize="sm" lineHeight="sm" color="fg.muted">
            {note}
          </chakra.p>
        )}
      </chakra.div>
    </Panel>
  );
}
