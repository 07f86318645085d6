import { chakra } from '@chakra-ui/react';
import { Navigate } from 'react-router';
import { Page, Panel } from '../components/page';
import { TextLink } from '../components/text-link';
import { SignUpForm } from '../features/auth/forms/sign-up-form';
import { paths } from '../lib/paths';
import { useSessionState } from '../lib/session';

export function Component() {
  const state = useSessionState();
  if (state.status === 'signed-in') return <Navigate to={paths.home} replace />;
  return (
    <Page title="Open a shop">
      <chakra.p mb="4" color="fg.muted">
        You become its owner and invite the others. Units, zone and number style can be changed later.
      </chakra.p>
      <Panel p={{ base: '4', sm: '6' }}>
        <SignUpForm />
      </Panel>
      <TextLink display="inline-block" mt="4" py="2.5" to={paths.signIn}>
        Sign in to a shop that exists
      </TextLink>
    </Page>
  );
}
