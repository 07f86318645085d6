import { chakra } from '@chakra-ui/react';
import { roleAtLeast } from '@proofplate/recipe-model';
import { Button, ButtonLink } from '../../../components/button';
import { CautionIcon, TickIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import { EvidencePlate } from '../../../components/plate/evidence-plate';
import { platePhotoOf } from '../../../components/plate/plate-photo';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import { type FinderRecipe, type NearMiss, SLOTS, type SlotKey } from '../finder.api';
import { inSentence } from '../sentence';

const HEADERS: Record<SlotKey, string> = { machine: 'Machine', lens: 'Lens', material: 'Material', finish: 'Finish', effect: 'Effect' };
const COLUMNS = '88px minmax(0, 1.7fr) repeat(5, minmax(0, 1fr)) 180px';

export type NearMissesProps = { misses: readonly NearMiss[]; onShow: (recipe: FinderRecipe) => void };

/** What comes nearest, as a table of sames and differences; on a phone a card names only what differs. */
export function NearMisses({ misses, onShow }: NearMissesProps) {
  const [first] = misses;
  if (first === undefined) return null;
  return (
    <>
      <Panel role="table" aria-label="Nearest approved recipes" overflow="hidden" fontSize="md">
        <chakra.div role="rowgroup" display={{ base: 'none', lg: 'block' }}>
          <chakra.div role="row" display="grid" gridTemplateColumns={COLUMNS} gap="3" px="3" py="2" fontSize="sm" color="fg.muted">
            <chakra.span role="columnheader" gridColumn="span 2">
              Recipe
            </chakra.span>
            {SLOTS.map((slot) => (
              <chakra.span key={slot} role="columnheader">
                {HEADERS[slot]}
              </chakra.span>
            ))}
            <chakra.span role="columnheader" srOnly>
              Act
            </chakra.span>
          </chakra.div>
        </chakra.div>
        <chakra.div role="rowgroup">
          {misses.map((miss, index) => (
            <MissRow key={miss.recipeId} miss={miss} isFirst={index === 0} onShow={onShow} />
          ))}
        </chakra.div>
      </Panel>
      <WhyNot miss={first} />
    </>
  );
}

function MissRow({ miss, isFirst, onShow }: { miss: NearMiss; isFirst: boolean; onShow: NearMissesProps['onShow'] }) {
  const mayDraft = roleAtLeast(useSession().member.role, 'operator');
  const isElsewhereOnly = miss.missingWords.length === 0 && miss.differs.every(({ slot }) => slot === 'machine' || slot === 'lens');
  const act = isElsewhereOnly && miss.differs.some(({ slot }) => slot === 'machine') ? `Mark it on ${miss.machine.name}` : 'Show setting';
  return (
    <chakra.div
      role="row"
      display="grid"
      gridTemplateColumns={{ base: '72px minmax(0, 1fr)', lg: COLUMNS }}
      gap="3"
      alignItems={{ base: 'start', lg: 'center' }}
      px="3"
      py="3"
      borderTop="hairline"
    >
      <chakra.span role="cell" gridRow={{ base: 'span 2', lg: 'auto' }}>
        {miss.reference !== null && (
          <EvidencePlate
            shape={{ ...miss.reference.plate, code: miss.reference.couponCode }}
            photo={platePhotoOf(miss.reference.photo, 'small')}
            chosen={miss.reference.address}
          />
        )}
      </chakra.span>
      <chakra.span role="cell">
        <b>{miss.code}</b>
        <chakra.span display={{ base: 'inline', lg: 'block' }} ml={{ base: '1.5', lg: '0' }}>
          {miss.title}
        </chakra.span>
        {miss.missingWords.length > 0 && (
          <chakra.b display="block" color="straw.fg">
            not {miss.missingWords.map((word) => `“${word}”`).join(', ')}
          </chakra.b>
        )}
      </chakra.span>
      {SLOTS.map((slot) => (
        <SlotCell key={slot} slot={slot} miss={miss} />
      ))}
      <chakra.span role="cell" gridColumn={{ base: '1 / -1', lg: 'auto' }} display="grid">
        <Button
          kind={isFirst && isElsewhereOnly ? 'primary' : 'plain'}
          size="glove"
          px="3"
          whiteSpace="normal"
          lineHeight="sm"
          onClick={() => onShow(miss)}
          aria-label={`${act}: ${miss.code}`}
        >
          {act}
        </Button>
        {isElsewhereOnly && mayDraft && (
          <ButtonLink
            kind="quiet"
            size="glove"
            px="3"
            mt="2"
            whiteSpace="normal"
            lineHeight="sm"
            to={paths.transferRecipe(miss.code)}
            aria-label={`Work out a transfer of ${miss.code}`}
          >
            Work out a transfer
          </ButtonLink>
        )}
      </chakra.span>
    </chakra.div>
  );
}

function SlotCell({ slot, miss }: { slot: SlotKey; miss: NearMiss }) {
  const difference = miss.differs.find((one) => one.slot === slot);
  if (difference === undefined && miss.missingWords.length > 0)
    // Words were typed, so the sentence asks for nothing that this could be the same as.
    return (
      <chakra.span role="cell" display={{ base: 'none', lg: 'block' }} color="fg.muted" overflowWrap="anywhere">
        {inSentence(slot, miss[slot].name)}
      </chakra.span>
    );
  if (difference === undefined)
    return (
      <chakra.span role="cell" display={{ base: 'none', lg: 'inline-flex' }} alignItems="center" gap="2" color="fg.muted">
        <TickIcon size={16} />
        same
      </chakra.span>
    );
  return (
    <chakra.span role="cell" gridColumn={{ base: '2', lg: 'auto' }} overflowWrap="anywhere">
      <chakra.span display={{ base: 'inline', lg: 'none' }} color="fg.muted">
        {HEADERS[slot]}:{' '}
      </chakra.span>
      <chakra.b color="straw.fg">{inSentence(slot, difference.has)}</chakra.b>
      <chakra.span display={{ base: 'inline', lg: 'block' }} fontSize={{ lg: 'sm' }} color="fg.muted">
        <chakra.span display={{ base: 'inline', lg: 'none' }}>, </chakra.span>
        not {inSentence(slot, difference.wanted)}
      </chakra.span>
    </chakra.span>
  );
}

function WhyNot({ miss }: { miss: NearMiss }) {
  if (miss.whyNot === '') return null;
  const place = miss.differs.find(({ slot }) => slot === 'machine')?.wanted;
  return (
    <Panel display="grid" gridTemplateColumns="34px minmax(0, 1fr)" px="5" py="3.5" mt="4" role="note">
      <chakra.span lineHeight="none" pt="0.5">
        <CautionIcon />
      </chakra.span>
      <span>
        <b>
          Why {miss.code} does not carry over{place === undefined ? '' : ` to ${place}`}
        </b>
        <chakra.span display="block" color="fg.muted">
          {miss.whyNot}
        </chakra.span>
      </span>
    </Panel>
  );
}
