import { useNavigate, useParams } from 'react-router';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { useStatusLine } from '../components/status-line';
import { groundWords } from '../features/coupons/coupon-words';
import { type Coupon, useCoupon } from '../features/coupons/coupons.api';
import { MarkCoupon } from '../features/coupons/mark/mark-coupon';
import { CouponClock } from '../features/marking-time/components/coupon-clock';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

export function Component() {
  const { code = '' } = useParams();
  const { shop } = useSession();
  const { data, error, mutate } = useCoupon(code);
  const navigate = useNavigate();
  const announce = useStatusLine();
  const handleFinished = (coupon: Coupon) => {
    announce(`${coupon.code} is marked.`);
    void navigate(paths.coupon(coupon.code));
  };
  if (error !== undefined && data === undefined) return <ReadProblem problem={error} thing="this coupon" onRetry={() => void mutate()} />;
  if (data === undefined) return <SkeletonBlock height="420px" label="Loading the coupon" />;
  return (
    <Page
      title={`Mark ${data.code}`}
      name={groundWords(data)}
      crumbs={[{ label: 'Coupons', to: paths.coupons }, { label: data.code, to: paths.coupon(data.code) }, { label: 'Mark' }]}
      meta={
        <>
          <span>{data.machine.name}</span>
          <span>{data.lens.name}</span>
        </>
      }
    >
      <MarkCoupon
        coupon={data}
        page={{
          change: (change) => void mutate((shown) => (shown === undefined ? undefined : change(shown)), { revalidate: false }),
          readAgain: () => mutate(),
        }}
        locale={shop.locale}
        clock={(cell) => <CouponClock coupon={data} cell={cell} />}
        onFinished={handleFinished}
      />
    </Page>
  );
}
