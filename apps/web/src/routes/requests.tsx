import { chakra } from '@chakra-ui/react';
import { useSearchParams } from 'react-router';
import { Page } from '../components/page';
import { Segmented } from '../components/segmented';
import { RequestList } from '../features/requests/components/request-list';
import { paths } from '../lib/paths';

const STATES = [
  { value: 'open', label: 'Open' },
  { value: 'answered', label: 'Answered' },
  { value: 'closed', label: 'Closed' },
] as const;

export function Component() {
  const [params, setParams] = useSearchParams();
  const state = STATES.find(({ value }) => value === params.get('state'))?.value ?? 'open';
  return (
    <Page title="Requests for settings" crumbs={[{ label: 'Runs', to: paths.runs }, { label: 'Requests' }]}>
      <chakra.div mb="4">
        <Segmented
          size="glove"
          label="Which requests"
          choices={STATES}
          value={state}
          onChange={(next) => setParams({ state: next }, { replace: true })}
        />
      </chakra.div>
      <RequestList state={state} />
    </Page>
  );
}
