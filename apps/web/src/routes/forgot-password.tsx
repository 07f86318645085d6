import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Page, Panel } from '../components/page';
import { TextLink } from '../components/text-link';
import { ForgotPasswordForm } from '../features/auth/forms/forgot-password-form';
import { paths } from '../lib/paths';

export function Component() {
  const [sentTo, setSentTo] = useState<string>();
  return (
    <Page title="Forgot your password">
      <Panel p={{ base: '4', sm: '6' }}>
        {sentTo === undefined ? (
          <ForgotPasswordForm onSent={setSentTo} />
        ) : (
          <div role="status">
            <chakra.h2 mb="2">Look into your mail</chakra.h2>
            <p>
              If <b>{sentTo}</b> belongs to somebody here, a link to set a new password is on its way. It works once, for half an hour.
            </p>
          </div>
        )}
      </Panel>
      <TextLink display="inline-block" mt="4" py="2.5" to={paths.signIn}>
        Back to sign in
      </TextLink>
    </Page>
  );
}
