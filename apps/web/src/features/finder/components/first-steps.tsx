import { chakra } from '@chakra-ui/react';
import { roleAtLeast } from '@proofplate/recipe-model';
import { EmptyState } from '../../../components/empty-state';
import { StateMark } from '../../../components/state-mark';
import { TextLink } from '../../../components/text-link';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import type { FinderResult } from '../finder.api';

type FirstStep = { what: string; to: string; why: string; isDone: boolean };

/** A shop without an approved recipe has nothing to look up: what comes first, and where. */
export function FirstSteps({ result }: { result: FinderResult }) {
  const { member } = useSession();
  if (!roleAtLeast(member.role, 'operator'))
    return (
      <EmptyState kind="none-yet" title="No recipe is approved yet">
        Here you look up the approved setting for a part. The shop has none so far: as soon as a lead has signed one, it is found here.
        Until then, mark nothing from memory; ask a lead.
      </EmptyState>
    );
  const last = roleAtLeast(member.role, 'lead')
    ? 'What is proved waits for a signature under Sign-off. Once it is signed, it is found here.'
    : 'Leads add equipment and materials, and sign what is proved. Once it is signed, it is found here.';
  return (
    <EmptyState kind="none-yet" title="No recipe is approved yet: this comes first" note={last}>
      <chakra.ol display="grid" gap="3" mt="3" color="fg">
        {stepsOf(result).map((step, index) => (
          <Step key={step.what} order={index + 1} step={step} />
        ))}
      </chakra.ol>
    </EmptyState>
  );
}

function Step({ order, step: { what, to, why, isDone } }: { order: number; step: FirstStep }) {
  return (
    <chakra.li display="grid" gridTemplateColumns="28px minmax(0, 1fr)">
      <chakra.span color="fg.subtle" py="1" aria-hidden="true">
        {order}
      </chakra.span>
      <div>
        <chakra.span display="inline-flex" flexWrap="wrap" columnGap="3" alignItems="center">
          <TextLink to={to} fontWeight="semibold" py="1">
            {what}
          </TextLink>
          {isDone && <StateMark state="passes">in the shop</StateMark>}
        </chakra.span>
        <chakra.span display="block" color="fg.muted">
          {why}
        </chakra.span>
      </div>
    </chakra.li>
  );
}

function stepsOf({ slots }: FinderResult): FirstStep[] {
  const has = (slot: 'machine' | 'lens' | 'material') => slots[slot].options.length > 0;
  return [
    {
      what: 'Equipment',
      to: paths.equipment,
      why: 'The machine with its panel, and the lenses that fit it.',
      isDone: has('machine') && has('lens'),
    },
    { what: 'Materials', to: paths.materials, why: 'What is marked, with its finish and its cautions.', isDone: has('material') },
    { what: 'A coupon', to: paths.coupons, why: 'Plan a test grid, mark it, and judge its cells.', isDone: false },
    { what: 'A recipe', to: paths.recipes, why: 'Draft it from the best cell, prove it, and submit it.', isDone: false },
  ];
}
