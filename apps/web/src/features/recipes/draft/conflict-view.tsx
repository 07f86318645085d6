import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { Panel } from '../../../components/page';
import { Segmented } from '../../../components/segmented';
import { StateShape } from '../../../components/state-mark';
import type { Conflict, ConflictPart, PartKey } from './draft-conflict';

const CHOICES = [
  { value: 'mine', label: 'Keep what is here' },
  { value: 'theirs', label: 'Take what was saved' },
] as const;

const CHANGED_WORDS: Record<ConflictPart['changedBy'], string> = {
  me: 'changed only here',
  them: 'changed only there',
  both: 'changed in both places',
};

/** One draft was open in two places, of one person or of two: both values of everything that differs, and a choice for each part. Nothing is overwritten unseen. */
export function ConflictView({ conflict, onResolve }: { conflict: Conflict; onResolve: (keepsMine: ReadonlySet<PartKey>) => void }) {
  const [keepsMine, setKeepsMine] = useState<ReadonlySet<PartKey>>(
    () => new Set(conflict.parts.filter(({ changedBy }) => changedBy !== 'them').map(({ key }) => key)),
  );
  const choose = (key: PartKey, choice: string) => {
    const next = new Set(keepsMine);
    if (choice === 'mine') next.add(key);
    else next.delete(key);
    setKeepsMine(next);
  };
  return (
    <Panel role="alert" px="5" py="4" mb="4" borderColor="straw.emphasized">
      <Flex gap="2" align="center" color="straw.fg">
        <StateShape state="caution" />
        <h2>This draft was saved in another place meanwhile</h2>
      </Flex>
      <p>
        By somebody else, or by you in another tab or on another device. Nothing is lost or overwritten. Decide on each part, then save.
      </p>
      <chakra.ul mt="2">
        {conflict.parts.map((part) => (
          <chakra.li key={part.key} borderTop="hairline" py="3">
            <Flex justify="space-between" align="center" gap="3" wrap="wrap">
              <span>
                <b>{part.label}</b>{' '}
                <chakra.span fontSize="sm" color="fg.muted">
                  {CHANGED_WORDS[part.changedBy]}
                </chakra.span>
              </span>
              <Segmented
                label={part.label}
                choices={CHOICES}
                value={keepsMine.has(part.key) ? 'mine' : 'theirs'}
                onChange={(choice) => choose(part.key, choice)}
              />
            </Flex>
            <BothValues part={part} />
          </chakra.li>
        ))}
      </chakra.ul>
      {conflict.parts.length === 0 && <p>Both are the same by now.</p>}
      <Button kind="primary" onClick={() => onResolve(keepsMine)} mt="2">
        Save the draft as decided
      </Button>
    </Panel>
  );
}

function BothValues({ part: { leaves, label } }: { part: ConflictPart }) {
  return (
    <chakra.table width="full" mt="2" fontSize="sm" lineHeight="sm" aria-label={`${label}: both values`}>
      <thead>
        <tr>
          {['Where', 'Here', 'Saved there'].map((head) => (
            <chakra.th key={head} scope="col" textAlign="start" color="fg.muted" fontWeight="semibold" py="1" width="33%">
              {head}
            </chakra.th>
          ))}
        </tr>
      </thead>
      <tbody>
        {leaves.map(({ name, mine, theirs }) => (
          <tr key={name}>
            <chakra.td py="1" color="fg.muted">
              {name === '' ? label : name}
            </chakra.td>
            <chakra.td py="1" overflowWrap="anywhere">
              {mine}
            </chakra.td>
            <chakra.td py="1" overflowWrap="anywhere">
              {theirs}
            </chakra.td>
          </tr>
        ))}
      </tbody>
    </chakra.table>
  );
}
