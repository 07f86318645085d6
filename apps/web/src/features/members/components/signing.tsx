import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { useStatusLine } from '../../../components/status-line';
import { ProcessesForm } from '../forms/processes-form';
import type { Member } from '../members.api';
import { SOURCES } from '../process-choice';

/** Which processes a lead or owner signs for: an effect on a kind of source each. */
export function Signing({ member }: { member: Member }) {
  const announce = useStatusLine();
  const [isChoosing, setIsChoosing] = useState(false);
  if (member.role !== 'lead' && member.role !== 'owner') return null;
  return (
    <chakra.section mt="8" aria-labelledby="signing-title">
      <chakra.h2 id="signing-title" mb="2">
        Signs for
      </chakra.h2>
      <Processes member={member} />
      {member.allowedActions.includes('edit') && (
        <Button mt="3" onClick={() => setIsChoosing(true)}>
          Choose the processes
        </Button>
      )}
      {isChoosing && (
        <Dialog title={`What ${member.printedName} signs for`} width="wide" onClose={() => setIsChoosing(false)}>
          <ProcessesForm
            member={member}
            onChanged={() => {
              setIsChoosing(false);
              announce(`It holds from the next signature of ${member.printedName} on.`);
            }}
          />
        </Dialog>
      )}
    </chakra.section>
  );
}

function Processes({ member: { signsFor } }: { member: Member }) {
  if (signsFor === null) return <p>Every process of the shop.</p>;
  if (signsFor.length === 0) return <p>Nothing at the moment: no process is named.</p>;
  const effects = [...new Map(signsFor.map(({ effectId, effectName }) => [effectId, effectName]))];
  return (
    <chakra.ul display="grid" gap="1">
      {effects.map(([effectId, effectName]) => (
        <li key={effectId}>
          <b>{effectName}</b>{' '}
          <chakra.span color="fg.muted">
            {signsFor
              .filter((process) => process.effectId === effectId)
              .map(({ sourceKind }) => SOURCES.find(({ value }) => value === sourceKind)?.label ?? sourceKind)
              .join(' · ')}
          </chakra.span>
        </li>
      ))}
    </chakra.ul>
  );
}
