import { chakra } from '@chakra-ui/react';
import { NavLink } from 'react-router';
import { paths } from '../../../lib/paths';

const TABS = [
  { to: paths.materials, label: 'Materials' },
  { to: paths.finishes, label: 'Finishes' },
  { to: paths.materialGroups, label: 'Groups' },
  { to: paths.effects, label: 'Effects' },
  { to: paths.cautions, label: 'Cautions' },
] as const;

const Tab = chakra(NavLink, {
  base: {
    display: 'inline-flex',
    alignItems: 'center',
    minHeight: { base: '44px', lg: '40px' },
    px: '3',
    color: 'fg.muted',
    whiteSpace: 'nowrap',
    borderBottom: '2px solid transparent',
    _hover: { color: 'fg' },
    '&[aria-current=page]': { color: 'fg', fontWeight: 'semibold', borderColor: 'brand.solid' },
  },
});

/** The five pages under Materials. */
export function MaterialsTabs() {
  return (
    <chakra.nav aria-label="Materials" mb="4" borderBottom="hairline" overflowX="auto">
      <chakra.ul display="flex" ml="-3">
        {TABS.map(({ to, label }) => (
          <li key={to}>
            <Tab to={to} end>
              {label}
            </Tab>
          </li>
        ))}
      </chakra.ul>
    </chakra.nav>
  );
}
