import { Box, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { useParams } from 'react-router';
import { Button, ButtonLink } from '../components/button';
import { SealIcon } from '../components/icons';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { useStatusLine } from '../components/status-line';
import { TextLink } from '../components/text-link';
import { groundWords, lowerFirst } from '../features/coupons/coupon-words';
import { type Coupon, useCoupon } from '../features/coupons/coupons.api';
import { CraterSection } from '../features/coupons/craters/crater-section';
import { CouponLog } from '../features/coupons/log/components/coupon-log';
import { CouponMeta } from '../features/coupons/log/components/coupon-meta';
import { SealDialog } from '../features/coupons/log/forms/seal-dialog';
import { type Inspection, useInspection, usePhotos } from '../features/coupons/log/log.api';
import { CouponDownloads } from '../features/coupons/mark/downloads';
import { paths } from '../lib/paths';
import { useSession } from '../lib/session';

const CRUMBS = [{ label: 'Coupons', to: paths.coupons }];

export function Component() {
  const { code = '' } = useParams();
  const { data: coupon, error, mutate } = useCoupon(code);
  if (coupon === undefined) {
    return (
      <Page title={code} crumbs={[...CRUMBS, { label: code }]}>
        {error === undefined ? (
          <SkeletonBlock height="640px" label="Loading the coupon" />
        ) : (
          <ReadProblem problem={error} thing="this coupon" onRetry={() => void mutate()} />
        )}
      </Page>
    );
  }
  return <CouponPage coupon={coupon} />;
}

function CouponPage({ coupon }: { coupon: Coupon }) {
  const { shop } = useSession();
  const { data: inspection, error, mutate } = useInspection(coupon.id);
  const photos = usePhotos(coupon.id);
  const acts = <Acts coupon={coupon} inspection={inspection} />;
  return (
    <Page
      title={coupon.code}
      name={coupon.title === '' ? `${groundWords(coupon)}, ${lowerFirst(coupon.effect.name)}` : coupon.title}
      crumbs={[...CRUMBS, { label: coupon.code }]}
      meta={
        <>
          <CouponMeta coupon={coupon} inspection={inspection} timeZone={shop.timeZone} />
          <TextLink to={paths.ledgerOf(coupon.code)}>In the ledger</TextLink>
        </>
      }
      actions={
        <Flex gap="2" display={{ base: 'none', lg: 'flex' }}>
          {acts}
        </Flex>
      }
    >
      {error !== undefined && <ReadProblem problem={error} thing="what was found on it" onRetry={() => void mutate()} />}
      {error === undefined && (inspection === undefined || (photos.data === undefined && photos.error === undefined)) && (
        <SkeletonBlock height="640px" label="Loading what was found on it" />
      )}
      {inspection !== undefined && (photos.data !== undefined || photos.error !== undefined) && (
        <CouponLog key={coupon.id} coupon={coupon} inspection={inspection} photos={photos.data?.items ?? []} />
      )}
      {inspection?.measurements.some(({ quantity }) => quantity === 'crater-diameter') === true && (
        <Box mt="6">
          <CraterSection coupon={coupon} />
        </Box>
      )}
      {coupon.state === 'planned' && (
        <Box mt="4" maxW="form">
          <CouponDownloads coupon={coupon} />
        </Box>
      )}
      {photos.error !== undefined && <ReadProblem problem={photos.error} thing="its photos" onRetry={() => void photos.mutate()} />}
      <Flex gap="2" wrap="wrap" mt="4" display={{ base: 'flex', lg: 'none' }}>
        {acts}
      </Flex>
    </Page>
  );
}

function Acts({ coupon, inspection }: { coupon: Coupon; inspection: Inspection | undefined }) {
  const announce = useStatusLine();
  const [isSealing, setIsSealing] = useState(false);
  const isOpen = coupon.state === 'marked' || coupon.state === 'inspected';
  return (
    <>
      {coupon.allowedActions.includes('mark') && (
        <ButtonLink kind="primary" to={paths.markCoupon(coupon.code)}>
          Mark the plate
        </ButtonLink>
      )}
      {coupon.allowedActions.includes('plan-next') && (
        <ButtonLink to={`${paths.planCoupon}?from=${encodeURIComponent(coupon.code)}`}>Plan the next coupon</ButtonLink>
      )}
      {isOpen && inspection !== undefined && (
        <Button icon={<SealIcon />} onClick={() => setIsSealing(true)}>
          Seal coupon
        </Button>
      )}
      {isSealing && inspection !== undefined && (
        <SealDialog
          coupon={coupon}
          inspection={inspection}
          onClose={() => setIsSealing(false)}
          onDone={(words) => {
            setIsSealing(false);
            announce(words);
            // the button that opened the dialog is gone with the seal
            requestAnimationFrame(() => document.getElementById('content')?.focus());
          }}
        />
      )}
    </>
  );
}
