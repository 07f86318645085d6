import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from './button';
import { Dialog } from './dialog';
import { Facets, type FacetsProps } from './facets';

export type FacetTrayProps = FacetsProps & {
  /** What stands behind the filters now: "12 recipes". */
  resultText: string;
};

/** Filters beside the list on a wide screen; below 1024 px they open from a button and the count follows every tap. */
export function FacetTray({ resultText, ...facets }: FacetTrayProps) {
  const [isOpen, setIsOpen] = useState(false);
  const active = Object.values(facets.chosen).reduce((sum, values) => sum + values.length, 0);
  return (
    <>
      <chakra.div display={{ base: 'none', lg: 'block' }}>
        <Facets {...facets} />
      </chakra.div>
      <chakra.div display={{ base: 'block', lg: 'none' }}>
        <Button onClick={() => setIsOpen(true)}>{active === 0 ? 'Filters' : `Filters, ${active} on`}</Button>
      </chakra.div>
      {isOpen && (
        <Dialog
          title="Filters"
          onClose={() => setIsOpen(false)}
          actions={
            <Button kind="primary" size="touch" shape="wide" onClick={() => setIsOpen(false)}>
              Show {resultText}
            </Button>
          }
        >
          <Facets {...facets} />
        </Dialog>
      )}
    </>
  );
}
