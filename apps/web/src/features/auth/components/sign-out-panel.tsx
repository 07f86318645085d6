import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { SignOutIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import { ProblemNotice } from '../../../components/problem-notice';
import { signOut, signOutEverywhere } from '../auth.api';

type Act = 'here' | 'everywhere';
const ACTS: Record<Act, () => Promise<void>> = { here: signOut, everywhere: signOutEverywhere };

export function SignOutPanel() {
  const [busy, setBusy] = useState<Act>();
  const [hasFailed, setHasFailed] = useState(false);
  const leave = async (act: Act) => {
    setBusy(act);
    setHasFailed(false);
    // After success this panel is gone with the page.
    await ACTS[act]().catch(() => {
      setBusy(undefined);
      setHasFailed(true);
    });
  };
  return (
    <Panel p="5" aria-labelledby="sign-out-title">
      <chakra.h2 id="sign-out-title" mb="1">
        Sign out
      </chakra.h2>
      <chakra.p mb="4" color="fg.muted">
        A shared screen at a machine: sign out when you leave it.
      </chakra.p>
      {hasFailed && (
        <chakra.div mb="4">
          <ProblemNotice what="You are still signed in: the server did not answer." todo="Try again when the connection is back." />
        </chakra.div>
      )}
      <Flex gap="2" wrap="wrap">
        <Button kind="primary" icon={<SignOutIcon />} isBusy={busy === 'here'} onClick={() => void leave('here')}>
          Sign out
        </Button>
        <Button isBusy={busy === 'everywhere'} onClick={() => void leave('everywhere')}>
          Sign out on every device
        </Button>
      </Flex>
    </Panel>
  );
}
