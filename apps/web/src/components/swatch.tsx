import { chakra } from '@chakra-ui/react';
import { formatNumber } from '../lib/format';

export type SwatchProps = {
  /** Measured colour as sRGB, `#rrggbb`; shown as it is, in both modes. */
  colour: string;
  /** Its CIE L*a*b* values, shown beside it to one decimal. */
  lab?: { l: number; a: number; b: number };
};

export function Swatch({ colour, lab }: SwatchProps) {
  return (
    <chakra.span display="inline-flex" alignItems="center" gap="2" whiteSpace="nowrap">
      <chakra.span
        aria-hidden="true"
        boxSize="16px"
        borderRadius="sm"
        border="hairline"
        borderColor="border.emphasized"
        style={{ background: colour }}
      />
      {lab !== undefined && (
        <chakra.span display="inline-flex" gap={{ base: '2', sm: '3' }}>
          {[lab.l, lab.a, lab.b].map((value, index) => (
            <span key={'Lab'[index]}>{formatNumber(value, { decimals: 1 })}</span>
          ))}
        </chakra.span>
      )}
    </chakra.span>
  );
}
