import { chakra } from '@chakra-ui/react';
import { NavLink } from 'react-router';
import { MoreIcon } from '../../components/icons';
import { paths } from '../../lib/paths';
import type { Role } from '../../lib/session';
import { barFor } from './navigation';

const BarLink = chakra(NavLink, {
  base: {
    display: 'flex',
    flexDirection: 'column',
    alignItems: 'center',
    justifyContent: 'center',
    gap: '0.5',
    height: 'bar',
    minWidth: '0',
    fontSize: 'sm',
    lineHeight: '18px',
    color: 'fg.muted',
    outlineOffset: '-4px !important',
    _currentPage: { color: 'brand.fg', fontWeight: 'semibold', boxShadow: 'inset 0 3px 0 var(--pp-colors-brand-solid)' },
  },
});

/** Below 1024 px: at most five places, as high as a gloved thumb needs. */
export function BottomBar({ role }: { role: Role }) {
  const { bar } = barFor(role);
  return (
    <chakra.nav
      aria-label="Main"
      display={{ base: 'block', lg: 'none' }}
      position="fixed"
      insetX="0"
      bottom="0"
      zIndex="bar"
      bg="bg.panel"
      borderTop="hairline"
      css={{ '@media print': { display: 'none' } }}
    >
      <chakra.ul display="grid" gridAutoFlow="column" gridAutoColumns="1fr">
        {bar.map(({ to, shortLabel, icon: Icon }) => (
          <li key={to}>
            <BarLink to={to}>
              <Icon />
              {shortLabel}
            </BarLink>
          </li>
        ))}
        <li>
          <BarLink to={paths.more}>
            <MoreIcon />
            More
          </BarLink>
        </li>
      </chakra.ul>
    </chakra.nav>
  );
}
