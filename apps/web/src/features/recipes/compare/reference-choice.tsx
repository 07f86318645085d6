import { chakra } from '@chakra-ui/react';
import { StateShape } from '../../../components/state-mark';
import { formatDate } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import type { Revision } from '../recipes.api';
import { revisionName } from '../revision-words';

type ReferenceChoiceProps = { revisions: readonly Revision[]; referenceId: string; onReference: (revisionId: string) => void };

/** Which column the others are compared with. */
export function ReferenceChoice({ revisions, referenceId, onReference }: ReferenceChoiceProps) {
  return (
    <chakra.label display="block" fontWeight="semibold" fontSize="sm" lineHeight="sm">
      Compared with
      <chakra.select
        display="block"
        mt="1"
        width="full"
        minHeight={{ base: 'touch', lg: 'control' }}
        px="2"
        border="hairline"
        borderColor="border.emphasized"
        borderRadius="md"
        bg="bg.panel"
        fontWeight="normal"
        fontSize="md"
        value={referenceId}
        onChange={(event) => onReference(event.currentTarget.value)}
      >
        {revisions.map((revision) => (
          <option key={revision.id} value={revision.id}>
            {revisionName(revision).toLowerCase()}
          </option>
        ))}
      </chakra.select>
    </chakra.label>
  );
}

/** Reason, approval and, where it is not approved, that nobody has signed. */
export function WhyAndWho({ revision: { reason, signOffs } }: { revision: Revision }) {
  const { shop } = useSession();
  const approval = signOffs.findLast(({ meaning }) => meaning === 'approved');
  return (
    <>
      <chakra.p overflowWrap="anywhere">{reason === '' ? 'no reason written' : reason}</chakra.p>
      <chakra.p display="flex" gap="1.5" alignItems="center" color="fg.muted">
        {approval === undefined ? (
          'not signed yet'
        ) : (
          <>
            <StateShape state="approved" /> {approval.printedName}, {formatDate(approval.signedAt, shop.timeZone)}
          </>
        )}
      </chakra.p>
    </>
  );
}
