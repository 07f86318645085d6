import { chakra } from '@chakra-ui/react';
import { Panel } from '../page';
import { NumbersPanel, type NumbersPanelProps } from './numbers-panel';

export type NumbersColumnsProps = { columns: readonly (NumbersPanelProps & { key: string })[] };

/** The numbers of several settings side by side, each with formula, inputs and source. */
export function NumbersColumns({ columns }: NumbersColumnsProps) {
  return (
    <Panel px="5" py="3" aria-label="Where the numbers come from">
      <chakra.details>
        <chakra.summary
          display="list-item"
          py="1.5"
          width="fit-content"
          color="brand.fg"
          cursor="pointer"
          minHeight={{ base: '44px', lg: '0' }}
        >
          All numbers with formula, inputs and source
        </chakra.summary>
        <chakra.div display="grid" gap="5" mt="2" gridTemplateColumns="repeat(auto-fit, minmax(min(260px, 100%), 1fr))">
          {columns.map(({ key, label, groups }) => (
            <div key={key}>
              <chakra.h3 mb="1">{label}</chakra.h3>
              <NumbersPanel label={`Numbers of ${label.toLowerCase()}`} groups={groups} />
            </div>
          ))}
        </chakra.div>
      </chakra.details>
    </Panel>
  );
}
