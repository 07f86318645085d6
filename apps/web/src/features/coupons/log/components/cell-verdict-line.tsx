import { chakra, Flex } from '@chakra-ui/react';
import { StateShape } from '../../../../components/state-mark';
import { formatNumber, inShopNumbers } from '../../../../lib/format';
import type { CellVerdict } from '../log.api';

/** How the cell stands against the criteria, and which of them it fails. */
export function CellVerdictLine({ verdict, count }: { verdict: CellVerdict | undefined; count: number }) {
  if (verdict === undefined || verdict.rank === null) return null;
  const failed = verdict.results.filter(({ meets }) => meets === false);
  const open = verdict.results.filter(({ meets }) => meets === null);
  const place = `Place ${verdict.rank} of ${count} judged cells.`;
  return (
    <Flex gap="2" pb="3" fontSize="sm" lineHeight="sm" align="flex-start">
      <chakra.span pt="2px" lineHeight="none" color={failed.length > 0 ? 'oxide.fg' : verdict.meets === true ? 'brand.fg' : 'fg.muted'}>
        <StateShape state={failed.length > 0 ? 'fails' : verdict.meets === true ? 'passes' : 'unknown'} />
      </chakra.span>
      <span>
        {words(verdict.results.length, failed, open.length)} <chakra.span color="fg.muted">{place}</chakra.span>
      </span>
    </Flex>
  );
}

function words(total: number, failed: readonly CellVerdict['results'][number][], open: number): string {
  if (total === 0) return 'No measured criteria: ratings alone decide.';
  if (failed.length > 0) {
    return `Fails: ${failed.map(({ criterion, value }) => `${inShopNumbers(criterion)} (measured ${formatNumber(value ?? 0)})`).join('; ')}.`;
  }
  if (open > 0) return `${total - open} of ${total} criteria met, ${open} not measured.`;
  if (total === 1) return 'Meets the criterion.';
  return total === 2 ? 'Meets both criteria.' : `Meets all ${total} criteria.`;
}
