import { chakra, Flex } from '@chakra-ui/react';
import { Global } from '@emotion/react';
import type { ReactNode } from 'react';
import { Button, ButtonLink } from './button';
import { PrintIcon } from './icons';

/** The page of paper alone: no margins of the browser's own, nothing of the frame around it. */
const PRINT_STYLES = {
  '@page': { size: 'A4 portrait', margin: '0' },
  '@media print': { 'html, body': { background: '#ffffff' }, main: { padding: '0 !important' } },
};

export type PrintedPageProps = { back: { to: string; label: string }; children: ReactNode };

/** A sheet of paper as it prints, with the buttons that do not. */
export function PrintedPage({ back, children }: PrintedPageProps) {
  return (
    <>
      <Global styles={PRINT_STYLES} />
      <Flex gap="3" mb="4" wrap="wrap" css={{ '@media print': { display: 'none' } }}>
        <Button kind="primary" size="primaryAct" icon={<PrintIcon />} onClick={() => window.print()}>
          Print
        </Button>
        <ButtonLink to={back.to} size="glove">
          {back.label}
        </ButtonLink>
      </Flex>
      <chakra.div
        // The paper is wider than a phone: it scrolls sideways, by keys too.
        role="region"
        aria-label="The sheet as it prints"
        tabIndex={0}
        overflowX="auto"
        css={{ '@media print': { overflow: 'visible' } }}
      >
        {children}
      </chakra.div>
    </>
  );
}
