import { useNavigate } from 'react-router';
import { Page } from '../components/page';
import { useStatusLine } from '../components/status-line';
import type { Coupon } from '../features/coupons/coupons.api';
import { ImportCoupon } from '../features/coupons/import/import-coupon';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

const CRUMBS = [{ label: 'Coupons', to: paths.coupons }, { label: 'Burnt earlier' }];

export function Component() {
  const { shop } = useSession();
  const navigate = useNavigate();
  const announce = useStatusLine();
  const handleImported = ({ code }: Coupon) => {
    announce(`${code} is entered as marked.`);
    void navigate(paths.coupon(code));
  };
  return (
    <Page title="A plate burnt earlier" crumbs={CRUMBS}>
      <ImportCoupon locale={shop.locale} onImported={handleImported} />
    </Page>
  );
}
