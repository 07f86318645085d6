import { chakra } from '@chakra-ui/react';
import { NumbersPanel, type NumbersPanelProps } from './numbers-panel';

export type FoldedNumbersProps = NumbersPanelProps & {
  /** What opens them. */
  summary: string;
};

/** The numbers behind one press, where the setting itself is what people came for. */
export function FoldedNumbers({ summary, ...panel }: FoldedNumbersProps) {
  return (
    <chakra.details>
      <chakra.summary
        display="list-item"
        py="2.5"
        minHeight={{ base: 'glove', lg: '0' }}
        width="fit-content"
        color="brand.fg"
        cursor="pointer"
      >
        {summary}
      </chakra.summary>
      <NumbersPanel {...panel} />
    </chakra.details>
  );
}
