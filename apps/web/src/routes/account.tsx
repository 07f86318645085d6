import { chakra } from '@chakra-ui/react';
import { Page, Panel } from '../components/page';
import { AccountFacts } from '../features/auth/components/account-facts';
import { ColourModeChoice } from '../features/auth/components/colour-mode-choice';
import { DevicesPanel } from '../features/auth/components/devices-panel';
import { OtherShops } from '../features/auth/components/other-shops';
import { PasswordPanel } from '../features/auth/components/password-panel';
import { SignOutPanel } from '../features/auth/components/sign-out-panel';

export function Component() {
  return (
    <Page title="Your account">
      <chakra.div display="grid" gap="4" maxW="prose">
        <AccountFacts />
        <Panel p="5" aria-labelledby="display-title">
          <chakra.h2 id="display-title" mb="3">
            Display
          </chakra.h2>
          <ColourModeChoice />
        </Panel>
        <OtherShops />
        <PasswordPanel />
        <DevicesPanel />
        <SignOutPanel />
      </chakra.div>
    </Page>
  );
}
