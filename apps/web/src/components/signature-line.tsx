import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { type MarkState, StateShape } from './state-mark';

export type SignatureLineProps = {
  /** As printed; undefined draws an empty line to be signed. */
  name?: string;
  state?: MarkState;
  /** What the signature means and when it was given, with zone: "Approved for use, 3 Mar 2026 09:12 CET". */
  caption: ReactNode;
};

/** A name on an ink line with its caption, as on paper. */
export function SignatureLine({ name, state = 'approved', caption }: SignatureLineProps) {
  return (
    <chakra.div minW="0">
      <chakra.div
        display="flex"
        alignItems="center"
        gap="2"
        minHeight="28px"
        px="1"
        borderBottom="hairline"
        borderColor="fg"
        fontSize="lg"
        lineHeight="xl"
        fontWeight="semibold"
      >
        {name !== undefined && <StateShape state={state} />}
        {name}
      </chakra.div>
      <chakra.div px="1" pt="3px" fontSize="sm" lineHeight="sm" color="fg.muted">
        {caption}
      </chakra.div>
    </chakra.div>
  );
}
