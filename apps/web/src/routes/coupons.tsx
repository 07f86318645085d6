import { useState } from 'react';
import { useSearchParams } from 'react-router';
import { Button, ButtonLink } from '../components/button';
import { DownloadIcon, PlusIcon, UploadIcon } from '../components/icons';
import { Page } from '../components/page';
import { useStatusLine } from '../components/status-line';
import { downloadList } from '../features/coupons/coupons.api';
import { filtersFromAddress } from '../features/coupons/list/coupon-filters';
import { CouponList } from '../features/coupons/list/coupon-list';
import { ProblemError } from '../lib/api';
import { paths } from '../lib/paths';

export function Component() {
  return (
    <Page
      title="Coupons"
      actions={
        <>
          <CsvButton />
          <ButtonLink to={paths.importCoupon} icon={<UploadIcon />}>
            Burnt earlier
          </ButtonLink>
          <ButtonLink kind="primary" to={paths.planCoupon} icon={<PlusIcon />}>
            Plan a coupon
          </ButtonLink>
        </>
      }
    >
      <CouponList />
    </Page>
  );
}

function CsvButton() {
  const [search] = useSearchParams();
  const [isBusy, setIsBusy] = useState(false);
  const announce = useStatusLine();
  const handleSave = async () => {
    setIsBusy(true);
    try {
      await downloadList(filtersFromAddress(search));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      announce(`The file was not made. ${error.detail}`);
    } finally {
      setIsBusy(false);
    }
  };
  return (
    <Button icon={<DownloadIcon />} isBusy={isBusy} onClick={() => void handleSave()}>
      CSV
    </Button>
  );
}
