import { chakra } from '@chakra-ui/react';
import { formatCount } from '../../../lib/format';
import type { FinderRecipe } from '../finder.api';
import { inSentence } from '../sentence';

export type ChooseRecipeProps = { recipes: readonly FinderRecipe[]; count: number; onShow: (recipe: FinderRecipe) => void };

/** Several approved recipes are left: what each is for, one tap away. */
export function ChooseRecipe({ recipes, count, onShow }: ChooseRecipeProps) {
  return (
    <section>
      <chakra.h2 mb="2">{formatCount(count, 'approved recipe')} left. Which one is it?</chakra.h2>
      <chakra.ul display="grid" gridTemplateColumns={{ base: '1fr', md: 'repeat(2, minmax(0, 1fr))' }} gap="2">
        {recipes.map((recipe) => (
          <li key={recipe.recipeId}>
            <Choice type="button" onClick={() => onShow(recipe)}>
              <b>
                {inSentence('material', recipe.material.name)}, {inSentence('finish', recipe.finish.name)},{' '}
                {inSentence('effect', recipe.effect.name)}
              </b>
              <chakra.span display="block" color="fg.muted" fontSize="sm" lineHeight="sm">
                {recipe.code} {recipe.title}. {recipe.machine.name}, {recipe.lens.name}
              </chakra.span>
            </Choice>
          </li>
        ))}
      </chakra.ul>
    </section>
  );
}

const Choice = chakra('button', {
  base: {
    width: 'full',
    height: 'full',
    minHeight: 'glove',
    px: '4',
    py: '2.5',
    textAlign: 'start',
    bg: 'bg.panel',
    border: 'hairline',
    borderColor: 'border.emphasized',
    borderRadius: 'md',
    cursor: 'pointer',
    _hover: { bg: 'bg.subtle' },
  },
});
