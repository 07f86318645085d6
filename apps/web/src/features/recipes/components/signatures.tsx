import { chakra } from '@chakra-ui/react';
import { Digest } from '../../../components/digest';
import { SignatureLine } from '../../../components/signature-line';
import type { MarkState } from '../../../components/state-mark';
import { useSession } from '../../../lib/session';
import type { SignOff } from '../recipes.api';
import { signatureCaption } from '../signature-words';

const STATE_OF: Record<SignOff['meaning'], MarkState> = {
  'submitted for review': 'inReview',
  recalled: 'returned',
  approved: 'approved',
  returned: 'returned',
  withdrawn: 'withdrawn',
};

/** Who said what, oldest first: name, meaning, time with zone, and the words given with it. */
export function Signatures({ signOffs }: { signOffs: readonly SignOff[] }) {
  const { shop } = useSession();
  if (signOffs.length === 0) return <chakra.p color="fg.muted">Nobody has signed yet.</chakra.p>;
  return (
    <chakra.ul display="grid" gap="3">
      {signOffs.map((signOff) => (
        <li key={signOff.id}>
          <SignatureLine
            name={signOff.printedName}
            state={STATE_OF[signOff.meaning]}
            caption={
              <>
                {signatureCaption(signOff, shop.timeZone)}
                {signOff.comment !== '' && (
                  <chakra.span display="block" color="fg">
                    {signOff.comment}
                  </chakra.span>
                )}
                <Digest value={signOff.contentHash} />
              </>
            }
          />
        </li>
      ))}
    </chakra.ul>
  );
}
