import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { PlusIcon } from '../../../components/icons';
import { StateMark } from '../../../components/state-mark';
import type { RevisionBrief } from '../recipes.api';
import { markOf, revisionName } from '../revision-words';

export type AddRevisionProps = { revisions: readonly RevisionBrief[]; onAdd: (revisionId: string) => void };

/** One more column, as long as there are fewer than four. */
export function AddRevision({ revisions, onAdd }: AddRevisionProps) {
  const [isOpen, setIsOpen] = useState(false);
  return (
    <>
      <Button icon={<PlusIcon />} onClick={() => setIsOpen(true)}>
        Add a revision
      </Button>
      {isOpen && (
        <Dialog title="Add a revision" onClose={() => setIsOpen(false)}>
          <chakra.ul display="grid" gap="2">
            {revisions.map((revision) => (
              <li key={revision.id}>
                <Button
                  size="touch"
                  shape="wide"
                  justifyContent="space-between"
                  onClick={() => {
                    onAdd(revision.id);
                    setIsOpen(false);
                  }}
                >
                  {revisionName(revision)}
                  <StateMark state={markOf(revision)} />
                </Button>
              </li>
            ))}
          </chakra.ul>
        </Dialog>
      )}
    </>
  );
}
