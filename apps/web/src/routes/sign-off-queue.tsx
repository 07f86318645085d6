import { Page } from '../components/page';
import { Queue } from '../features/sign-offs/components/queue';

export function Component() {
  return (
    <Page title="Sign-off" meta="Oldest first. A signature is given on the revision’s own page, never from this list.">
      <Queue />
    </Page>
  );
}
