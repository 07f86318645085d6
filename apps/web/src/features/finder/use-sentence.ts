import { useCallback, useEffect, useRef } from 'react';
import { useSearchParams } from 'react-router';
import { useSession } from '../../lib/session';
import { type Choice, type FinderRecipe, type FinderResult, SLOTS, type SlotKey, useFinder } from './finder.api';
import { choiceFrom, forgetChoice, keepChoice, keptChoice, paramsOf } from './sentence';

/** The sentence lives in the address; machine and lens of the last use fill an empty one. */
export function useSentence() {
  const { shop } = useSession();
  const [params, setParams] = useSearchParams();
  const isFirst = useRef(true);
  const kept = isFirst.current && params.size === 0 ? keptChoice(shop.id) : undefined;
  const choice = kept === undefined ? choiceFrom(params) : kept;
  const finder = useFinder(choice);
  const { data, error } = finder;

  const change = useCallback(
    (next: Choice, { replace = false } = {}) => {
      isFirst.current = false;
      setParams(paramsOf(next), { replace, preventScrollReset: true });
    },
    [setParams],
  );
  useEffect(() => {
    if (kept !== undefined && Object.keys(kept).length > 0) change(kept, { replace: true });
    isFirst.current = false;
  }, [kept, change]);
  useEffect(() => {
    // A machine or lens that left the shop since the last use must not lock the sentence.
    if (error?.status !== 404) return;
    forgetChoice();
    change({}, { replace: true });
  }, [error, change]);
  useKeepPlace(shop.id, choice, data);

  return {
    choice,
    finder,
    choose: (slot: SlotKey, id: string | undefined) => {
      const { recipe: _answered, [slot]: _before, ...rest } = withAnswer(choice, data);
      change(id === undefined ? rest : { ...rest, [slot]: id });
    },
    setWords: (words: string) => {
      const { words: _before, recipe: _answered, ...rest } = choice;
      change(words === '' ? rest : { ...rest, words }, { replace: true });
    },
    show: (recipe: FinderRecipe) => change({ ...keysOf(recipe), recipe: recipe.recipeId }),
    /** The same part without that recipe: what comes nearest, and the request for a setting. */
    lookFor: (recipe: FinderRecipe) => change(keysOf(recipe)),
    startOver: () => change(placeOf(choice)),
  };
}

/** A recipe that was opened by its code fills the sentence as soon as somebody changes a slot of it. */
function withAnswer(choice: Choice, result: FinderResult | undefined): Choice {
  return choice.recipe !== undefined && result?.answer != null ? { ...keysOf(result.answer), ...choice } : choice;
}

function keysOf(recipe: FinderRecipe): Choice {
  return Object.fromEntries(SLOTS.map((slot) => [slot, recipe[slot].id]));
}

function placeOf({ machine, lens }: Choice): Choice {
  return { ...(machine === undefined ? {} : { machine }), ...(lens === undefined ? {} : { lens }) };
}

function useKeepPlace(shopId: string, choice: Choice, result: FinderResult | undefined): void {
  const answer = result?.answer;
  const machine = answer?.machine.id ?? choice.machine;
  const lens = answer?.lens.id ?? choice.lens;
  useEffect(() => {
    if (machine !== undefined) keepChoice(shopId, lens === undefined ? { machine } : { machine, lens });
  }, [shopId, machine, lens]);
}
