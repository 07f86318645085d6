import { chakra } from '@chakra-ui/react';
import { Panel } from '../../../components/page';
import { useStatusLine } from '../../../components/status-line';
import { ChangePasswordForm } from '../forms/change-password-form';

export function PasswordPanel() {
  const announce = useStatusLine();
  return (
    <Panel p="5" aria-labelledby="password-title">
      <chakra.h2 id="password-title" mb="1">
        Password
      </chakra.h2>
      <chakra.p mb="4" color="fg.muted">
        Every other device is signed out. This one stays.
      </chakra.p>
      <ChangePasswordForm onChanged={() => announce('The password is changed. Every other device is signed out.')} />
    </Panel>
  );
}
