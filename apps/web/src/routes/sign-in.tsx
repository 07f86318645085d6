import { chakra } from '@chakra-ui/react';
import { Navigate, useSearchParams } from 'react-router';
import { Page, Panel } from '../components/page';
import { TextLink } from '../components/text-link';
import { SignInForm } from '../features/auth/forms/sign-in-form';
import { paths, safeNext } from '../lib/paths';
import { useSessionState } from '../lib/session';

export function Component() {
  const state = useSessionState();
  const [search] = useSearchParams();
  if (state.status === 'signed-in') return <Navigate to={safeNext(search.get('next'))} replace />;
  return (
    <Page title="Sign in">
      {state.status === 'signed-out' && state.reason === 'ended' && (
        <chakra.p role="status" mb="4">
          Your session ended. Sign in and you come back to where you were.
        </chakra.p>
      )}
      <Panel p={{ base: '4', sm: '6' }}>
        <SignInForm />
      </Panel>
      <chakra.div mt="4" display="flex" flexWrap="wrap" justifyContent="space-between" columnGap="6">
        <TextLink py="2.5" to={paths.forgotPassword}>
          Forgot your password
        </TextLink>
        <TextLink py="2.5" to={paths.signUp}>
          Open a new shop
        </TextLink>
      </chakra.div>
    </Page>
  );
}
