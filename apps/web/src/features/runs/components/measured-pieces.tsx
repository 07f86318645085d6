import { chakra } from '@chakra-ui/react';
import { StateMark } from '../../../components/state-mark';
import { formatNumber } from '../../../lib/format';
import { decimalsOf, methodWord, symbolOf } from '../../../lib/measurement-words';
import type { Run } from '../runs.api';

/** What was measured on the pieces, and whether it is within the criteria. */
export function MeasuredPieces({ measurements }: Pick<Run, 'measurements'>) {
  if (measurements.length === 0) return null;
  return (
    <chakra.ul aria-label="Measured pieces" mt="3" fontSize="sm" lineHeight="sm">
      {measurements.map(({ piece, quantity, value, unit, method, meets }, index) => (
        <chakra.li
          // Nothing forbids measuring the same thing twice on a piece.
          key={`${piece} ${quantity} ${index}`}
          display="flex"
          justifyContent="space-between"
          gap="4"
          py="1"
          borderTop="hairline"
        >
          <span>
            Piece {piece}: {symbolOf(quantity)} {formatNumber(value, { decimals: decimalsOf(quantity) })}
            {unit === '1' ? '' : ` ${unit}`}, {methodWord(method)}
          </span>
          {meets === null ? (
            <chakra.span color="fg.muted">no criterion</chakra.span>
          ) : (
            <StateMark state={meets ? 'passes' : 'fails'}>{meets ? 'within' : 'outside'}</StateMark>
          )}
        </chakra.li>
      ))}
    </chakra.ul>
  );
}
