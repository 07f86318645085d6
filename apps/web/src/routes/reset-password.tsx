import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { ButtonLink } from '../components/button';
import { Page, Panel } from '../components/page';
import { ProblemNotice } from '../components/problem-notice';
import { ResetPasswordForm } from '../features/auth/forms/reset-password-form';
import { paths } from '../lib/paths';
import { useUrlToken } from '../lib/url-token';

export function Component() {
  const token = useUrlToken();
  const [isDone, setIsDone] = useState(false);
  return (
    <Page title="Set a new password">
      {token === undefined ? (
        <ProblemNotice
          what="The address carries no token."
          safe="Your password is unchanged."
          todo="Open the link from the mail again, or ask for a new one."
          actions={<ButtonLink to={paths.forgotPassword}>Ask for a new link</ButtonLink>}
        />
      ) : (
        <Panel p={{ base: '4', sm: '6' }}>
          {isDone ? (
            <div role="status">
              <chakra.h2 mb="2">The password is set</chakra.h2>
              <chakra.p mb="4">You are signed out on every device. Sign in with the new password.</chakra.p>
              <ButtonLink kind="primary" to={paths.signIn}>
                Sign in
              </ButtonLink>
            </div>
          ) : (
            <ResetPasswordForm token={token} onDone={() => setIsDone(true)} />
          )}
        </Panel>
      )}
    </Page>
  );
}
