import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { Button } from '../../../components/button';
import { StateShape } from '../../../components/state-mark';
import { formatTime } from '../../../lib/format';
import { shiftWords } from '../../../lib/power-shift-words';
import { useSession } from '../../../lib/session';
import type { FinderAnswer, FinderCaution, WithdrawnRecipe } from '../finder.api';

/** A caution says never: there is no setting to show, whatever was signed before. */
export function Forbidden({ cautions }: { cautions: readonly FinderCaution[] }) {
  return (
    <>
      {cautions
        .filter(({ level }) => level === 'never')
        .map(({ id, subject, text, source }) => (
          <Stop key={id} title={subject}>
            <p>{text}</p>
            <p>Choose another material, or ask the laser safety officer.</p>
            <chakra.p fontSize="sm" color="fg.muted">
              {source}
            </chakra.p>
          </Stop>
        ))}
    </>
  );
}

export type WithdrawnProps = { recipes: readonly WithdrawnRecipe[]; onLookFor?: (recipe: WithdrawnRecipe) => void };

export function Withdrawn({ recipes, onLookFor }: WithdrawnProps) {
  const { shop } = useSession();
  return (
    <>
      {recipes.map((recipe) => (
        <Stop key={recipe.recipeId} title={`${recipe.code} ${recipe.title} was withdrawn`}>
          {recipe.reason !== '' && <p>{recipe.reason}</p>}
          <p>Do not mark with it any more, also not from paper or memory.</p>
          <chakra.p fontSize="sm" color="fg.muted">
            Revision {recipe.revisionNumber}
            {recipe.by === null ? '' : `, withdrawn by ${recipe.by}`}
            {recipe.at === null ? '' : `, ${formatTime(recipe.at, shop.timeZone)}`}
          </chakra.p>
          {onLookFor !== undefined && (
            <Button size="glove" mt="3" onClick={() => onLookFor(recipe)}>
              Look for another setting
            </Button>
          )}
        </Stop>
      ))}
    </>
  );
}

/** What the reader must know of an approved setting before the cautions. */
export function AnswerNotices({ answer }: { answer: FinderAnswer }) {
  const isBlocked = answer.blockedBecause.length > answer.holds.length;
  return (
    <>
      {answer.isOverdue && (
        <Look title="It is due to be proved again">
          {isBlocked
            ? 'The shop’s policy stops runs until then. Tell a lead.'
            : 'It may still be used. Compare the first piece with care, and tell a lead.'}
        </Look>
      )}
      {answer.checkDue !== null && (
        <Look title={shiftWords(answer.checkDue)}>
          The setting stays as it was signed. Compare the first piece with care, and tell a lead.
        </Look>
      )}
      {!answer.isProfilePresent && (
        <Look title={`${answer.machine.name} was changed after this was proved`}>
          Its source or optics are not what they were. Compare the first piece with care, and tell a lead.
        </Look>
      )}
      {answer.route !== 'coupons' && (
        <Look title="It was not proved on coupons here">{ROUTE_WORDS[answer.route]} Compare the first piece with care.</Look>
      )}
    </>
  );
}

const ROUTE_WORDS: Record<Exclude<FinderAnswer['route'], 'coupons'>, string> = {
  'earlier-experience': 'A lead approved it on earlier experience.',
  'customer-given': 'The customer gave it.',
  transferred: 'It was transferred from another machine.',
};

function Stop({ title, children }: { title: string; children: ReactNode }) {
  return (
    <chakra.section
      role="alert"
      display="grid"
      gridTemplateColumns="36px minmax(0, 1fr)"
      p="4"
      bg="oxide.subtle"
      border="hairline"
      borderColor="oxide.emphasized"
      borderRadius="md"
    >
      <chakra.span color="oxide.fg" pt="1" lineHeight="none">
        <StateShape state="withdrawn" size={24} />
      </chakra.span>
      <div>
        <chakra.h2 color="oxide.fg">{title}</chakra.h2>
        {children}
      </div>
    </chakra.section>
  );
}

function Look({ title, children }: { title: string; children: ReactNode }) {
  return (
    <chakra.section
      display="grid"
      gridTemplateColumns="32px minmax(0, 1fr)"
      px="4"
      py="3"
      bg="straw.subtle"
      border="hairline"
      borderColor="straw.emphasized"
      borderRadius="md"
    >
      <chakra.span color="straw.fg" pt="0.5" lineHeight="none">
        <StateShape state="reproveDue" size={20} />
      </chakra.span>
      <div>
        <b>{title}. </b>
        {children}
      </div>
    </chakra.section>
  );
}
