import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { useNavigate } from 'react-router';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { Panel } from '../../../components/page';
import { paths } from '../../../lib/paths';
import { roleWord } from '../../../lib/roles';
import { type Session, useSession } from '../../../lib/session';
import { ChangeShopForm } from '../forms/change-shop-form';

type Shop = Session['shops'][number];

/** A session works in one shop; another one takes the password again. */
export function OtherShops() {
  const { shop, shops } = useSession();
  const navigate = useNavigate();
  const [chosen, setChosen] = useState<Shop>();
  const others = shops.filter(({ id }) => id !== shop.id);
  if (others.length === 0) return null;
  return (
    <Panel p="5" aria-labelledby="other-shops-title">
      <chakra.h2 id="other-shops-title" mb="2">
        Your other shops
      </chakra.h2>
      <chakra.ul display="grid" gap="2">
        {others.map((other) => (
          <chakra.li key={other.id} display="flex" flexWrap="wrap" alignItems="center" justifyContent="space-between" gap="3">
            <span>
              {other.name}
              <chakra.span color="fg.muted"> {roleWord(other.role)}</chakra.span>
            </span>
            <Button onClick={() => setChosen(other)}>Work in {other.name}</Button>
          </chakra.li>
        ))}
      </chakra.ul>
      {chosen !== undefined && (
        <Dialog title={`Work in ${chosen.name}`} onClose={() => setChosen(undefined)}>
          <ChangeShopForm shop={chosen} onChanged={() => void navigate(paths.home)} />
        </Dialog>
      )}
    </Panel>
  );
}
