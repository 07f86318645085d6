import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from './button';
import { useStatusLine } from './status-line';

/** As much as people compare by eye. */
const SHOWN_LETTERS = 8;

/** "7f3a c21e …": what a signature is bound to; one press copies all of it, another shows it. */
export function Digest({ value, label = 'Signed digest' }: { value: string; label?: string }) {
  const [isWhole, setIsWhole] = useState(false);
  const announce = useStatusLine();
  const handleCopy = async () => {
    try {
      await navigator.clipboard.writeText(value);
      announce('The digest is copied.');
    } catch {
      // Without the right to write there is still the text itself, to be copied by hand.
      setIsWhole(true);
      announce('The browser does not let this page copy. The digest stands in full.');
    }
  };
  return (
    <Flex as="span" wrap="wrap" align="center" columnGap="2">
      <span>
        {label}{' '}
        <chakra.code fontFamily="mono" fontSize="sm" color="fg" overflowWrap="anywhere">
          {isWhole ? inFours(value) : `${inFours(value.slice(0, SHOWN_LETTERS))} …`}
        </chakra.code>
      </span>
      <Button kind="quiet" px="1.5" fontSize="sm" fontWeight="normal" onClick={() => void handleCopy()}>
        Copy
      </Button>
      <Button kind="quiet" px="1.5" fontSize="sm" fontWeight="normal" aria-expanded={isWhole} onClick={() => setIsWhole(!isWhole)}>
        {isWhole ? 'Show less' : 'Show all'}
      </Button>
    </Flex>
  );
}

const inFours = (text: string) => (text.match(/.{1,4}/g) ?? []).join(' ');
