import { chakra } from '@chakra-ui/react';
import { type EnteredPart, PART_INSIDE_NOT_CHECKED, PART_NOT_CHECKED } from '@proofplate/recipe-model';

/** What no number covers. */
export function NotChecked({ side }: { side: EnteredPart['side'] }) {
  const lines = side === 'inside' ? [PART_INSIDE_NOT_CHECKED, ...PART_NOT_CHECKED] : PART_NOT_CHECKED;
  return (
    <chakra.ul aria-label="Not checked" fontSize="sm" lineHeight="sm" color="fg.muted" display="grid" gap="1">
      {lines.map((line) => (
        <li key={line}>{line}</li>
      ))}
    </chakra.ul>
  );
}
