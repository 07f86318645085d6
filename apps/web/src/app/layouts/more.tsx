import { chakra, defineRecipe } from '@chakra-ui/react';
import { Link, useOutletContext } from 'react-router';
import { ChevronRightIcon, FindIcon, ScienceIcon } from '../../components/icons';
import { Page, Panel } from '../../components/page';
import { paths } from '../../lib/paths';
import { roleWord } from '../../lib/roles';
import { useSession } from '../../lib/session';
import { barFor } from './navigation';
import type { ShopOutlet } from './shop-layout';

const rowRecipe = defineRecipe({
  base: {
    width: 'full',
    display: 'flex',
    alignItems: 'center',
    gap: '3',
    minHeight: 'glove',
    px: '4',
    fontSize: 'lg',
    _hover: { bg: 'bg.subtle' },
  },
});
const RowLink = chakra(Link, rowRecipe);
const RowButton = chakra('button', rowRecipe);

/** What the bottom bar has no place for. */
export function Component() {
  const { person, member, shop } = useSession();
  const { rest } = barFor(member.role);
  const { onFind } = useOutletContext<ShopOutlet>();
  return (
    <Page title="More" meta={<span>{shop.name}</span>}>
      <Panel as="nav" aria-label="More pages">
        <chakra.ul>
          <chakra.li borderBottom="hairline">
            <RowButton type="button" onClick={onFind} cursor="pointer">
              <FindIcon />
              Find
            </RowButton>
          </chakra.li>
          {rest.map(({ to, label, icon: Icon }) => (
            <chakra.li key={to} borderBottom="hairline">
              <RowLink to={to}>
                <Icon />
                {label}
                <Trailing />
              </RowLink>
            </chakra.li>
          ))}
          <chakra.li borderBottom="hairline">
            <RowLink to={paths.scienceIndex}>
              <ScienceIcon />
              How the numbers are worked out
              <Trailing />
            </RowLink>
          </chakra.li>
          <li>
            <RowLink to={paths.account}>
              <chakra.span minW="0">
                {person.name}
                <chakra.span display="block" fontSize="sm" lineHeight="sm" color="fg.muted">
                  {roleWord(member.role)}, account and sign-out
                </chakra.span>
              </chakra.span>
              <Trailing />
            </RowLink>
          </li>
        </chakra.ul>
      </Panel>
    </Page>
  );
}

function Trailing() {
  return (
    <chakra.span ml="auto" color="fg.muted" lineHeight="none">
      <ChevronRightIcon />
    </chakra.span>
  );
}
