import { chakra } from '@chakra-ui/react';
import { type ReactNode, useEffect, useState } from 'react';
import { Button } from '../../../components/button';
import type { FinderResult } from '../finder.api';
import { inSentence } from '../sentence';

const PHONE = '@media (max-width: 599px)';

export type FoldedOnPhoneProps = { result: FinderResult; isAnswered: boolean; children: ReactNode };

/** On a phone the answered sentence folds to its words, so that cautions and setting come up; one press opens the slots again. */
export function FoldedOnPhone({ result: { answer }, isAnswered, children }: FoldedOnPhoneProps) {
  const [isOpen, setIsOpen] = useState(false);
  const answered = isAnswered ? answer : null;
  const revisionId = answered?.revisionId;
  useEffect(() => {
    if (revisionId !== undefined) setIsOpen(false);
  }, [revisionId]);
  const isFolded = answered !== null && !isOpen;
  return (
    <>
      {isFolded && (
        <chakra.div
          display="none"
          css={{ [PHONE]: { display: 'grid' } }}
          gridTemplateColumns="minmax(0, 1fr) auto"
          alignItems="center"
          gap="3"
        >
          <chakra.p overflowWrap="anywhere">
            On <b>{answered.machine.name}</b> with the <b>{answered.lens.name}</b> lens:{' '}
            <b>{inSentence('material', answered.material.name)}</b>, {inSentence('finish', answered.finish.name)},{' '}
            {inSentence('effect', answered.effect.name)}.
          </chakra.p>
          <Button size="glove" px="4" onClick={() => setIsOpen(true)}>
            Change
          </Button>
        </chakra.div>
      )}
      <chakra.div css={isFolded ? { [PHONE]: { display: 'none' } } : {}}>{children}</chakra.div>
    </>
  );
}
