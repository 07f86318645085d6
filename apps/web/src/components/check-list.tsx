import { chakra, Flex } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { Panel } from './page';
import { StateShape } from './state-mark';

export type Check = { key: string; title: string; detail: string; passes: boolean; isAdvisory: boolean };

export type CheckListProps = {
  title?: string;
  checks: readonly Check[];
  /** Keys of passing checks that are shown in full; the other passing ones are named in one line. Absent: all in full. */
  inFull?: ReadonlySet<string>;
  children?: ReactNode;
};

/** Everything that is checked, what fails first and in full. */
export function CheckList({ title = 'Checks', checks, inFull, children }: CheckListProps) {
  const failing = checks.filter(({ passes }) => !passes);
  const passing = checks.filter(({ passes }) => passes);
  const shown = passing.filter(({ key }) => inFull === undefined || inFull.has(key));
  const folded = passing.filter((check) => !shown.includes(check));
  return (
    <Panel px="5" pt="3" pb="2" aria-label={title}>
      <Flex justify="space-between" align="baseline" gap="3" wrap="wrap">
        <h2>{title}</h2>
        <chakra.span fontSize="sm" lineHeight="sm" role="status">
          <b>{passing.length} pass</b>
          {failing.length > 0 && (
            <>
              , <chakra.b color="oxide.fg">{failing.length} fail</chakra.b>
            </>
          )}
        </chakra.span>
      </Flex>
      <chakra.ul mt="1">
        {[...failing, ...shown].map((check) => (
          <CheckRow key={check.key} check={check} />
        ))}
      </chakra.ul>
      {folded.length > 0 && (
        <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted" pl="6" pb="1">
          Also pass: {folded.map(({ title: name }) => lowerFirst(name)).join(', ')}
        </chakra.p>
      )}
      {children}
    </Panel>
  );
}

function CheckRow({ check: { title, detail, passes, isAdvisory } }: { check: Check }) {
  const blocks = !passes && !isAdvisory;
  return (
    <chakra.li display="grid" gridTemplateColumns="24px minmax(0, 1fr)" py="1" lineHeight="sm">
      <chakra.span pt="2px" lineHeight="none" color={passes ? 'brand.fg' : blocks ? 'oxide.fg' : 'straw.fg'}>
        <StateShape state={passes ? 'passes' : blocks ? 'fails' : 'caution'} />
      </chakra.span>
      <span>
        <chakra.span fontWeight={passes ? 'normal' : 'semibold'}>
          <chakra.span srOnly>{passes ? 'Passes: ' : blocks ? 'Fails: ' : 'Advice: '}</chakra.span>
          {title}
        </chakra.span>
        <chakra.span
          display="block"
          fontSize="sm"
          lineHeight="sm"
          color={passes ? 'fg.muted' : blocks ? 'oxide.fg' : 'straw.fg'}
          overflowWrap="anywhere"
        >
          {detail}
        </chakra.span>
      </span>
    </chakra.li>
  );
}

const lowerFirst = (words: string) => (/^[A-Z][a-z]/.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words);
