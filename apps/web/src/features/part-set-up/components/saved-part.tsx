import { chakra, Flex } from '@chakra-ui/react';
import { ButtonLink } from '../../../components/button';
import { PrintIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import { formatTime } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import { useRunPart } from '../part-set-up.api';
import { PartFacts } from './part-facts';
import { PartPicture } from './part-picture';

export type SavedPartPanelProps = { run: { id: string; code: string }; mayChange: boolean };

/** The round part on the page of its run; without one, the way to it. */
export function SavedPartPanel({ run, mayChange }: SavedPartPanelProps) {
  const { shop } = useSession();
  const { data } = useRunPart(run.id);
  const saved = data?.setUp ?? null;
  if (data === undefined || (saved === null && !mayChange)) return null;
  return (
    <Panel px="5" py="4" aria-labelledby="part-title" display="grid" gap="4">
      <Flex justify="space-between" align="center" wrap="wrap" gap="2">
        <h2 id="part-title">Part set-up</h2>
        <Flex gap="2" wrap="wrap">
          {saved !== null && (
            <ButtonLink to={paths.partSheet(run.code)} size="glove" icon={<PrintIcon />}>
              Print
            </ButtonLink>
          )}
          {mayChange && (
            <ButtonLink to={paths.partOfRun(run.code)} size="glove">
              {saved === null ? 'Set up a round part' : 'Change'}
            </ButtonLink>
          )}
        </Flex>
      </Flex>
      {saved !== null && (
        <>
          <PartFacts results={saved.results} shownIn={saved.entered.shownIn} locale={shop.locale} />
          <PartPicture part={saved.entered} results={saved.results} locale={shop.locale} />
          <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
            {saved.savedBy}, {formatTime(saved.savedAt, shop.timeZone)}, with {saved.ground.lens.name}
          </chakra.p>
        </>
      )}
    </Panel>
  );
}
