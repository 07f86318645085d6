import { chakra } from '@chakra-ui/react';
import type { ReactNode } from 'react';
import { type Column, DataTable } from '../../../components/data-table';
import { StateMark } from '../../../components/state-mark';
import { TextLink } from '../../../components/text-link';
import { formatDate, formatNumber } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import type { RecipeSummary } from '../recipes.api';
import { markOf, recipeMark, recipeStateWord, underWayWord } from '../revision-words';
import { RecipeFace } from './recipe-face';

const NOTHING = '—';

export function RecipeTable({ recipes }: { recipes: readonly RecipeSummary[] }) {
  const { shop } = useSession();
  return <DataTable label="Recipes" columns={columns(shop.timeZone)} rows={recipes} rowKey={({ id }) => id} />;
}

function columns(timeZone: string): readonly Column<RecipeSummary>[] {
  return [
    {
      key: 'face',
      header: 'Plate',
      isHeaderHidden: true,
      width: '66px',
      onPhone: 'picture',
      cell: ({ face }) => face !== null && <RecipeFace face={face} />,
    },
    {
      key: 'code',
      header: 'Code',
      onPhone: 'title',
      cell: ({ code, title }) => (
        <TextLink
          to={paths.recipe(code)}
          color="fg"
          fontWeight="semibold"
          textDecoration="none"
          whiteSpace="nowrap"
          py="3"
          aria-label={`${code} ${title}`}
        >
          {code}
        </TextLink>
      ),
    },
    { key: 'material', header: 'Material and finish', cell: ({ material, finish }) => `${material.name}, ${lowerFirst(finish.name)}` },
    {
      key: 'effect',
      header: 'Effect',
      cell: ({ effect }) => lowerFirst(effect.name),
      fold: { into: 'material', words: ({ effect }) => lowerFirst(effect.name) },
    },
    { key: 'machine', header: 'Machine, lens', cell: ({ machine, lens }) => `${machine.name}, ${lens.name}` },
    { key: 'state', header: 'State', cell: (recipe) => <RecipeState recipe={recipe} /> },
    {
      key: 'revision',
      header: 'Rev.',
      align: 'end',
      onPhone: 'hidden',
      cell: ({ current }) => current?.number ?? NOTHING,
      fold: { into: 'code', words: ({ current }) => current !== null && `rev. ${current.number}` },
    },
    { key: 'parts', header: 'Parts, 30 d', align: 'end', onPhone: 'hidden', cell: ({ last30Days: { good, scrap } }) => good + scrap },
    {
      key: 'scrap',
      header: 'Scrap, %',
      align: 'end',
      onPhone: 'hidden',
      cell: ({ last30Days }) => scrapShare(last30Days),
      fold: {
        into: 'parts',
        words: ({ last30Days }) => last30Days.scrap > 0 && <chakra.span whiteSpace="nowrap">{scrapShare(last30Days)} % scrap</chakra.span>,
      },
    },
    {
      key: 'due',
      header: 'Re-prove by',
      align: 'end',
      cell: ({ current }) =>
        current?.reviewDue == null ? NOTHING : <ReviewDue current={current}>{formatDate(current.reviewDue, timeZone)}</ReviewDue>,
      fold: {
        into: 'state',
        words: ({ current }) =>
          current?.reviewDue != null && <ReviewDue current={current}>re-prove by {formatDate(current.reviewDue, timeZone)}</ReviewDue>,
      },
    },
  ];
}

function ReviewDue({ current: { isReviewOverdue }, children }: { current: { isReviewOverdue: boolean }; children: ReactNode }) {
  return (
    <chakra.span whiteSpace="nowrap" color={isReviewOverdue ? 'straw.fg' : undefined} fontWeight={isReviewOverdue ? 'semibold' : undefined}>
      {children}
    </chakra.span>
  );
}

/** The approved setting stays the row; a revision under way is a second line. */
function RecipeState({ recipe: { state, current, underWay, isHeld, checkDue } }: { recipe: RecipeSummary }) {
  return (
    <chakra.span display="inline-grid" justifyItems="start" py="1">
      {checkDue !== null && <StateMark state="reproveDue">Check due: power moved</StateMark>}
      {isHeld && <StateMark state="caution">On hold</StateMark>}
      <StateMark state={recipeMark(state)}>{recipeStateWord(state)}</StateMark>
      {current !== null && underWay !== null && <StateMark state={markOf(underWay)}>{underWayWord(underWay)}</StateMark>}
    </chakra.span>
  );
}

/** One decimal of all parts; nothing made gives no share. */
export function scrapShare({ good, scrap }: RecipeSummary['last30Days']): string {
  return good + scrap === 0 ? NOTHING : formatNumber((scrap / (good + scrap)) * 100, { decimals: 1 });
}

/** "Bead blasted" within a line; names such as "F160" stay. */
function lowerFirst(words: string): string {
  return /^[A-Z][a-z]/.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words;
}
