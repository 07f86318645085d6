import { chakra, Flex } from '@chakra-ui/react';
import { ROUTE_KIND_LABELS } from '@proofplate/recipe-model';
import { useState } from 'react';
import { ButtonLink } from '../../../components/button';
import { Checkbox } from '../../../components/facets';
import { Panel } from '../../../components/page';
import { StateMark } from '../../../components/state-mark';
import { TextLink } from '../../../components/text-link';
import { formatDate } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import type { Recipe, RevisionBrief } from '../recipes.api';
import { markOf, revisionName } from '../revision-words';
import { signatureCaption } from '../signature-words';

const MOST_COMPARED = 4;

/** Every revision with its state and its reason, newest first; two to four of them are compared. */
export function RevisionLadder({ recipe }: { recipe: Recipe }) {
  const [chosen, setChosen] = useState<readonly string[]>(() => firstPair(recipe));
  const { revisions, code } = recipe;
  const handleChoose = (id: string, isOn: boolean) => setChosen(isOn ? [...chosen, id] : chosen.filter((own) => own !== id));
  const inOrder = revisions.filter(({ id }) => chosen.includes(id)).toReversed();
  return (
    <Panel aria-labelledby="ladder-title" px="5" py="4">
      <Flex justify="space-between" align="center" gap="3" wrap="wrap">
        <h2 id="ladder-title">Revisions</h2>
        {revisions.length > 1 &&
          (chosen.length >= 2 ? (
            <ButtonLink to={`${paths.compareRevisions(code)}?ids=${inOrder.map(({ id }) => id).join(',')}`}>
              Compare {chosen.length}
            </ButtonLink>
          ) : (
            <chakra.span fontSize="sm" color="fg.muted">
              Tick two to four to compare them
            </chakra.span>
          ))}
      </Flex>
      <chakra.ol mt="2">
        {revisions.map((revision) => (
          <Rung
            key={revision.id}
            code={code}
            revision={revision}
            hasChoice={revisions.length > 1}
            isChosen={chosen.includes(revision.id)}
            isFull={chosen.length >= MOST_COMPARED}
            onChoose={(isOn) => handleChoose(revision.id, isOn)}
          />
        ))}
      </chakra.ol>
    </Panel>
  );
}

type RungProps = {
  code: string;
  revision: RevisionBrief;
  hasChoice: boolean;
  isChosen: boolean;
  isFull: boolean;
  onChoose: (isOn: boolean) => void;
};

function Rung({ code, revision, hasChoice, isChosen, isFull, onChoose }: RungProps) {
  const { shop } = useSession();
  const name = revisionName(revision);
  const last = revision.signOffs.at(-1);
  return (
    <chakra.li
      display="grid"
      gridTemplateColumns={hasChoice ? '44px minmax(0, 1fr)' : 'minmax(0, 1fr)'}
      borderTop="hairline"
      _first={{ borderTop: 'none' }}
      py="2"
    >
      {hasChoice && (
        <chakra.label htmlFor={`compare-${revision.id}`} display="grid" minHeight="44px" alignContent="start" pt="3px" cursor="pointer">
          <chakra.span srOnly>Compare {name.toLowerCase()}</chakra.span>
          <Checkbox
            id={`compare-${revision.id}`}
            checked={isChosen}
            disabled={isFull && !isChosen}
            onChange={(event) => onChoose(event.currentTarget.checked)}
          />
        </chakra.label>
      )}
      <div>
        <Flex justify="space-between" gap="3" wrap="wrap">
          <TextLink to={paths.recipeRevision(code, revision.id)} fontWeight="semibold">
            {name}
          </TextLink>
          <StateMark state={markOf(revision)} />
        </Flex>
        <chakra.p overflowWrap="anywhere">
          {revision.reason === '' ? <chakra.span color="fg.muted">no reason written yet</chakra.span> : revision.reason}
        </chakra.p>
        <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
          {revision.route !== 'coupons' && (
            <chakra.b color="straw.fg">{ROUTE_KIND_LABELS[revision.route]}, not proved on coupons. </chakra.b>
          )}
          {last === undefined
            ? `Begun by ${revision.author.name}, ${formatDate(revision.createdAt, shop.timeZone)}`
            : `${last.printedName}: ${lowerFirst(signatureCaption(last, shop.timeZone))}`}
          {last !== undefined && last.comment !== '' && <chakra.span color="fg">. “{last.comment}”</chakra.span>}
          {revision.state === 'scheduled' &&
            revision.effectiveFrom !== null &&
            `. Takes effect ${formatDate(revision.effectiveFrom, shop.timeZone)}`}
        </chakra.p>
      </div>
    </chakra.li>
  );
}

/** What most people want to see side by side: the approved setting and the newest one beside it. */
function firstPair({ revisions, current }: Recipe): readonly string[] {
  const other = revisions.find(({ id }) => id !== current?.id);
  return current === null || other === undefined ? [] : [current.id, other.id];
}

const lowerFirst = (words: string) => words.charAt(0).toLowerCase() + words.slice(1);
