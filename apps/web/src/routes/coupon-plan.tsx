import { useMemo } from 'react';
import { useNavigate, useSearchParams } from 'react-router';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonForm } from '../components/skeletons';
import { type Coupon, useCoupon } from '../features/coupons/coupons.api';
import { planKey } from '../features/coupons/plan/kept-plan';
import { PlanCoupon } from '../features/coupons/plan/plan-coupon';
import { emptyPlan, planFrom } from '../features/coupons/plan/plan-values';
import { ProveDraft } from '../features/coupons/plan/prove-draft';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

const CRUMBS = [{ label: 'Coupons', to: paths.coupons }, { label: 'Plan a coupon' }];

/** `?from=C-0117` begins where that coupon was; `?proves=…` plans the equal cells that prove a draft. */
export function Component() {
  const { shop } = useSession();
  const [search] = useSearchParams();
  const [from, proves] = [search.get('from') ?? undefined, search.get('proves')];
  const navigate = useNavigate();
  const handlePlanned = ({ code }: Coupon) => void navigate(paths.markCoupon(code));
  if (proves !== null) {
    return (
      <Page title="Prove a draft" name="equal cells" crumbs={CRUMBS}>
        <ProveDraft revisionId={proves} locale={shop.locale} onPlanned={handlePlanned} />
      </Page>
    );
  }
  return (
    <Page title="Plan a coupon" name={from === undefined ? undefined : `from ${from}`} crumbs={CRUMBS}>
      {from === undefined ? <EmptyPlan onPlanned={handlePlanned} /> : <NextPlan code={from} onPlanned={handlePlanned} />}
    </Page>
  );
}

function EmptyPlan({ onPlanned }: { onPlanned: (coupon: Coupon) => void }) {
  const { shop, member } = useSession();
  const initial = useMemo(emptyPlan, []);
  const keepAs = planKey({ shopId: shop.id, memberId: member.id, from: undefined });
  return <PlanCoupon initial={initial} keepAs={keepAs} locale={shop.locale} onPlanned={onPlanned} />;
}

function NextPlan({ code, onPlanned }: { code: string; onPlanned: (coupon: Coupon) => void }) {
  const { shop, member } = useSession();
  const { data, error, mutate } = useCoupon(code);
  if (error !== undefined) return <ReadProblem problem={error} thing="the coupon to begin from" onRetry={() => void mutate()} />;
  if (data === undefined) return <SkeletonForm fields={8} />;
  return (
    <PlanCoupon
      key={data.id}
      initial={planFrom(data, data.profile.panel, shop.locale)}
      keepAs={planKey({ shopId: shop.id, memberId: member.id, from: data.code })}
      locale={shop.locale}
      onPlanned={onPlanned}
    />
  );
}
