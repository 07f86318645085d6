import { GeneralCautions } from '../../../components/general-cautions';
import type { ShopCaution } from '../coupons.api';
import { NeverMarked } from '../plan/never-marked';

/** In one row while the hands are at work; what became a `never` since the plan stands out. */
export function MarkCautions({ cautions }: { cautions: readonly ShopCaution[] }) {
  const never = cautions.filter(({ level }) => level === 'never');
  return (
    <>
      {never.map((caution) => (
        <NeverMarked key={caution.id} caution={caution} />
      ))}
      <GeneralCautions cautions={cautions.filter(({ level }) => level !== 'never')} lead="Take care" />
    </>
  );
}
