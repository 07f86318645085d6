import { Box, chakra, Flex } from '@chakra-ui/react';
import type { Ref } from 'react';
import { fieldId } from './field';
import { StateShape } from './state-mark';

export type SummaryEntry = { name: string; label: string; message: string };

/** Stands above the form after a refused submit, takes the focus, and links to each field. */
export function ErrorSummary({ entries, ref }: { entries: readonly SummaryEntry[]; ref?: Ref<HTMLDivElement> }) {
  if (entries.length === 0) return null;
  return (
    <Box
      ref={ref}
      tabIndex={-1}
      role="alert"
      aria-labelledby="error-summary-title"
      p="4"
      bg="oxide.subtle"
      border="hairline"
      borderColor="oxide.emphasized"
      borderRadius="md"
    >
      <Flex gap="2" align="center" color="oxide.fg">
        <StateShape state="fails" />
        <chakra.h2 id="error-summary-title" fontSize="md" lineHeight="md">
          {entries.length === 1 ? 'One entry needs a change' : `${entries.length} entries need a change`}
        </chakra.h2>
      </Flex>
      <chakra.ul mt="1" pl="6">
        {entries.map(({ name, label, message }) => (
          <li key={name}>
            <chakra.a
              href={`#${fieldId(name)}`}
              display="inline-block"
              py="0.5"
              color="oxide.fg"
              textDecoration="underline"
              onClick={(event) => focusField(event, name)}
            >
              {label}: {message}
            </chakra.a>
          </li>
        ))}
      </chakra.ul>
    </Box>
  );
}

/** A hash link would also write the address bar; the field just takes the focus. */
function focusField(event: { preventDefault: () => void }, name: string) {
  event.preventDefault();
  const field = document.getElementById(fieldId(name));
  field?.focus();
  field?.scrollIntoView?.({ block: 'center' });
}
