import { chakra, Flex } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { Panel } from '../../../components/page';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonBlock } from '../../../components/skeletons';
import { useStatusLine } from '../../../components/status-line';
import { ProblemError } from '../../../lib/api';
import { formatTime } from '../../../lib/format';
import { useSession } from '../../../lib/session';
import { endSession, type OpenSession, useOpenSessions } from '../auth.api';
import { deviceWords } from '../device-words';

/** Where the person is signed in; each other device can be signed out from here. */
export function DevicesPanel() {
  const { data, error, mutate } = useOpenSessions();
  return (
    <Panel p="5" aria-labelledby="devices-title">
      <chakra.h2 id="devices-title" mb="1">
        Where you are signed in
      </chakra.h2>
      <chakra.p mb="2" color="fg.muted">
        A device you don't know: sign it out, then change your password.
      </chakra.p>
      {data === undefined && error === undefined && <SkeletonBlock height="96px" label="Loading your devices" />}
      {data === undefined && error !== undefined && <ReadProblem problem={error} thing="your devices" onRetry={() => void mutate()} />}
      <chakra.ul>
        {data?.items.map((session) => (
          <Device key={session.id} session={session} />
        ))}
      </chakra.ul>
    </Panel>
  );
}

function Device({ session }: { session: OpenSession }) {
  const { shop } = useSession();
  const announce = useStatusLine();
  const [isBusy, setIsBusy] = useState(false);
  const name = deviceWords(session.userAgent);
  const lastUsed = formatTime(session.lastSeenAt, shop.timeZone);
  const handleEnd = async () => {
    setIsBusy(true);
    try {
      await endSession(session);
      announce(`${name} is signed out.`);
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      announce(`Not signed out. ${error.detail}`);
      setIsBusy(false);
    }
  };
  return (
    <chakra.li
      display="flex"
      flexWrap={{ base: 'wrap', sm: 'nowrap' }}
      gap="3"
      alignItems="center"
      justifyContent="space-between"
      py="2"
      borderTop="hairline"
      minHeight="touch"
    >
      <chakra.div minW="0">
        <chakra.p fontWeight="semibold">{name}</chakra.p>
        <Flex columnGap="4" wrap="wrap" fontSize="sm" lineHeight="sm" color="fg.muted">
          <span>Last used {lastUsed}</span>
          {session.shopName !== null && <span>{session.shopName}</span>}
        </Flex>
      </chakra.div>
      {session.isCurrent ? (
        <chakra.span fontSize="sm" color="fg.muted" whiteSpace="nowrap">
          this device
        </chakra.span>
      ) : (
        <Button flexShrink="0" isBusy={isBusy} aria-label={`Sign out ${name}, last used ${lastUsed}`} onClick={() => void handleEnd()}>
          Sign out
        </Button>
      )}
    </chakra.li>
  );
}
