import { chakra } from '@chakra-ui/react';
import { StateShape } from '../../../components/state-mark';
import { shiftFacts, shiftWords } from '../../../lib/power-shift-words';
import type { Recipe } from '../recipes.api';

/** A later reading of the power meter says that the setting no longer gives what it was proved with. */
export function CheckDue({ recipe: { checkDue } }: { recipe: Recipe }) {
  if (checkDue === null) return null;
  return (
    <chakra.section
      aria-label="Check due"
      display="grid"
      gridTemplateColumns="32px minmax(0, 1fr)"
      mb="4"
      px="4"
      py="3"
      bg="straw.subtle"
      border="hairline"
      borderColor="straw.emphasized"
      borderRadius="md"
    >
      <chakra.span color="straw.fg" pt="0.5" lineHeight="none">
        <StateShape state="reproveDue" size={20} />
      </chakra.span>
      <div>
        <b>Check due. {shiftWords(checkDue)}. </b>
        {checkDue.stepIndex > 0 && `Step ${checkDue.stepIndex + 1}: `}
        {shiftFacts(checkDue)}. Mark a reference cell again; if it no longer matches, propose a change.
      </div>
    </chakra.section>
  );
}
