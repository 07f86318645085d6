import { csvText } from '../../lib/csv';
import type { RecipeSummary } from './recipes.api';
import { recipeStateWord, stateWord } from './revision-words';

const HEADER = [
  'code',
  'title',
  'material',
  'finish',
  'effect',
  'machine',
  'lens',
  'state',
  'approved revision',
  'approved by',
  'approved at (UTC)',
  'under way',
  'good parts in 30 days',
  'scrap in 30 days',
  're-prove by (UTC)',
];

/** The list as a file; whoever signed stands beside what was signed. */
export function recipesCsv(recipes: readonly RecipeSummary[]): string {
  return csvText([HEADER, ...recipes.map(rowOf)]);
}

function rowOf(recipe: RecipeSummary): (string | number | null)[] {
  const { current, underWay, last30Days } = recipe;
  const approval = current?.signOffs.find(({ meaning }) => meaning === 'approved');
  return [
    recipe.code,
    recipe.title,
    recipe.material.name,
    recipe.finish.name,
    recipe.effect.name,
    recipe.machine.name,
    recipe.lens.name,
    recipeStateWord(recipe.state),
    current?.number ?? null,
    approval?.printedName ?? null,
    approval?.signedAt ?? null,
    underWay === null ? null : stateWord(underWay.state),
    last30Days.good,
    last30Days.scrap,
    current?.reviewDue ?? null,
  ];
}
