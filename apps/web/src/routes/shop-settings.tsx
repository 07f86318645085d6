import { chakra } from '@chakra-ui/react';
import { Page, Panel } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonForm } from '../components/skeletons';
import { PolicyForm } from '../features/shops/forms/policy-form';
import { ShopForm } from '../features/shops/forms/shop-form';
import { useShop } from '../features/shops/shops.api';

export function Component() {
  return (
    <Page title="Shop settings">
      <Settings />
    </Page>
  );
}

function Settings() {
  const { data: shop, error, mutate } = useShop();
  if (shop === undefined) return error === undefined ? <SkeletonForm /> : <ReadProblem problem={error} onRetry={() => void mutate()} />;
  return (
    <chakra.div
      key={shop.version}
      display="grid"
      gridTemplateColumns={{ base: 'minmax(0, 544px)', xl: 'repeat(2, minmax(0, 544px))' }}
      gap="4"
      alignItems="start"
    >
      <Panel p="5" aria-labelledby="shop-title">
        <chakra.h2 id="shop-title" mb="4">
          The shop
        </chakra.h2>
        <ShopForm shop={shop} />
      </Panel>
      <Panel p="5" aria-labelledby="policy-title">
        <chakra.h2 id="policy-title" mb="4">
          Rules for signing and proving
        </chakra.h2>
        <PolicyForm shop={shop} />
      </Panel>
    </chakra.div>
  );
}
