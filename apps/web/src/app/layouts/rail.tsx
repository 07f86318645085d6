import { Box, chakra, Flex } from '@chakra-ui/react';
import { Link, NavLink } from 'react-router';
import { FindIcon, PlateMarkIcon } from '../../components/icons';
import { Keycap } from '../../components/keycap';
import { paths } from '../../lib/paths';
import { roleWord } from '../../lib/roles';
import type { Session } from '../../lib/session';
import { type NavigationEntry, navigationFor } from './navigation';

const BrandLink = chakra(Link, {
  base: {
    display: 'flex',
    flexShrink: '0',
    alignItems: 'center',
    gap: '2.5',
    px: '2',
    fontWeight: 'bold',
    overflowWrap: 'anywhere',
    fontSize: 'lg',
    color: 'fg',
    borderRadius: 'md',
  },
});

const EntryLink = chakra(NavLink, {
  base: {
    display: 'flex',
    alignItems: 'center',
    gap: '2.5',
    minHeight: 'control',
    px: '2',
    borderRadius: 'md',
    color: 'fg',
    position: 'relative',
    _hover: { bg: 'bg.subtle' },
    _currentPage: {
      bg: 'brand.subtle',
      color: 'brand.fg',
      fontWeight: 'semibold',
      _before: {
        content: '""',
        position: 'absolute',
        left: '-12px',
        top: '8px',
        bottom: '8px',
        width: '3px',
        bg: 'brand.solid',
        borderRadius: '0 2px 2px 0',
      },
    },
  },
});

const FindButton = chakra('button', {
  base: {
    display: 'flex',
    alignItems: 'center',
    gap: '2',
    minHeight: 'control',
    flexShrink: '0',
    flexWrap: 'wrap',
    width: 'full',
    px: '2',
    mb: '3',
    border: 'hairline',
    borderColor: 'border.emphasized',
    borderRadius: 'md',
    bg: 'bg.panel',
    color: 'fg.muted',
    cursor: 'pointer',
    _hover: { bg: 'bg.subtle' },
  },
});

export type RailProps = { session: Session; onFind: () => void };

export function Rail({ session, onFind }: RailProps) {
  const entries = navigationFor(session.member.role);
  const shopEntries = entries.filter(({ group }) => group === 'shop');
  return (
    <chakra.div
      display={{ base: 'none', lg: 'flex' }}
      flexDirection="column"
      gap="1"
      position="sticky"
      top="0"
      height="screen"
      overflowY="auto"
      borderRight="hairline"
      px="3"
      pt="6"
      pb="4"
      css={{ '@media print': { display: 'none' } }}
    >
      <BrandLink to={paths.home}>
        <PlateMarkIcon />
        Proofplate
      </BrandLink>
      <Box pl="44px" pr="2" pb="3.5" mt="-1.5" fontSize="sm" lineHeight="sm" color="fg.muted" overflowWrap="anywhere">
        {session.shop.name}
      </Box>
      <FindButton type="button" onClick={onFind} aria-keyshortcuts="Control+K Meta+K">
        <FindIcon />
        Find
        <Keycap ml="auto" aria-hidden="true">
          Ctrl K
        </Keycap>
      </FindButton>
      <chakra.nav aria-label="Main" flexShrink="0">
        <EntryList entries={entries.filter(({ group }) => group === 'work')} />
        {shopEntries.length > 0 && (
          <>
            <Box fontSize="sm" lineHeight="sm" color="fg.subtle" px="2" pt="3.5" pb="1" id="rail-shop">
              Shop
            </Box>
            <EntryList entries={shopEntries} labelledBy="rail-shop" />
          </>
        )}
      </chakra.nav>
      <PersonLink session={session} />
    </chakra.div>
  );
}

function EntryList({ entries, labelledBy }: { entries: readonly NavigationEntry[]; labelledBy?: string }) {
  return (
    <chakra.ul display="grid" gap="1" aria-labelledby={labelledBy}>
      {entries.map(({ to, label, icon: Icon }) => (
        <li key={to}>
          <EntryLink to={to}>
            <Icon />
            {label}
          </EntryLink>
        </li>
      ))}
    </chakra.ul>
  );
}

const AccountLink = chakra(NavLink, {
  base: { display: 'flex', alignItems: 'center', gap: '2.5', minHeight: 'touch', px: '2', borderRadius: 'md', _hover: { bg: 'bg.subtle' } },
});

function PersonLink({ session }: { session: Session }) {
  return (
    <Box mt="auto" pt="2" borderTop="hairline" flexShrink="0">
      <AccountLink to={paths.account}>
        <Flex
          boxSize="8"
          borderRadius="full"
          bg="bg.muted"
          align="center"
          justify="center"
          fontWeight="semibold"
          fontSize="sm"
          flexShrink={0}
          aria-hidden="true"
        >
          {initials(session.person.name)}
        </Flex>
        <Box fontSize="sm" lineHeight="sm" minW="0" overflowWrap="anywhere">
          <chakra.span fontWeight="semibold" display="block">
            {session.person.name}
          </chakra.span>
          <chakra.span color="fg.muted">{roleWord(session.member.role)}</chakra.span>
        </Box>
      </AccountLink>
    </Box>
  );
}

function initials(name: string): string {
  const words = name.trim().split(/\s+/);
  const ends = words.length > 1 ? [words[0], words.at(-1)] : words;
  return ends
    .map((word) => Array.from(word ?? '')[0] ?? '')
    .join('')
    .toUpperCase();
}
