import { chakra } from '@chakra-ui/react';
import { FactList } from '../../../components/fact-list';
import { Panel } from '../../../components/page';
import { roleWord } from '../../../lib/roles';
import { useSession } from '../../../lib/session';

export function AccountFacts() {
  const { person, member, shop } = useSession();
  return (
    <Panel p="5" aria-labelledby="account-title">
      <chakra.h2 id="account-title" mb="2">
        {person.name}
      </chakra.h2>
      <FactList
        facts={[
          { label: 'Signs as', value: member.printedName },
          { label: 'E-mail', value: person.email },
          { label: 'Shop', value: shop.name },
          { label: 'Role', value: roleWord(member.role) },
        ]}
      />
    </Panel>
  );
}
