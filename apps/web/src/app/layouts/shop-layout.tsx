import { Box, chakra } from '@chakra-ui/react';
import { lazy, Suspense, useCallback, useEffect, useState } from 'react';
import { Navigate, Outlet, ScrollRestoration, useLocation } from 'react-router';
import { Button } from '../../components/button';
import { ProblemNotice } from '../../components/problem-notice';
import { SkeletonBlock } from '../../components/skeletons';
import { StatusLineProvider } from '../../components/status-line';
import { paths, signInFrom } from '../../lib/paths';
import { refreshSession, type Session, useSessionState } from '../../lib/session';
import { useShortcut } from '../../lib/shortcuts';
import { BottomBar } from './bottom-bar';
import { Rail } from './rail';
import { RoleGate } from './role-gate';
import { SkipLink } from './skip-link';

const CommandPalette = lazy(async () => ({ default: (await import('./command-palette')).CommandPalette }));
const KeyList = lazy(async () => ({ default: (await import('./key-list')).KeyList }));

/** What the frame lends to its own pages. */
export type ShopOutlet = { onFind: () => void };

/** Frame of every page for signed-in people. */
export function ShopLayout() {
  const state = useSessionState();
  const { pathname, search } = useLocation();
  useEffect(() => {
    if (state.status === 'unknown') void refreshSession();
  }, [state.status]);

  if (state.status === 'signed-out')
    return <Navigate to={state.reason === 'left' ? paths.signIn : signInFrom(pathname + search)} replace />;
  if (state.status === 'signed-in') return <ShopFrame session={state.session} />;
  return (
    <chakra.main px={{ base: '4', sm: '6', lg: '10' }} py="6">
      {state.status === 'unreachable' ? <ServerAway /> : <SkeletonBlock height="var(--pp-sizes-touch)" label="Opening the shop" />}
    </chakra.main>
  );
}

function ShopFrame({ session }: { session: Session }) {
  const [isPaletteOpen, setIsPaletteOpen] = useState(false);
  const [areKeysOpen, setAreKeysOpen] = useState(false);
  const handleFind = useCallback(() => setIsPaletteOpen(true), []);
  useShortcut('mod+k', 'Find a page or a record', handleFind);
  useShortcut('?', 'Show all keys', () => setAreKeysOpen(true));

  return (
    <StatusLineProvider>
      <SkipLink />
      <Box display={{ base: 'block', lg: 'grid' }} gridTemplateColumns="var(--pp-sizes-rail) minmax(0, 1fr)" minHeight="screen">
        <Rail session={session} onFind={handleFind} />
        <chakra.main
          id="content"
          tabIndex={-1}
          outline="none"
          minW="0"
          maxW="1328px"
          px={{ base: '4', sm: '6', lg: '10' }}
          pt={{ base: '4', sm: '5', lg: '6' }}
          pb={{ base: '184px', lg: '6' }}
        >
          <RoleGate role={session.member.role}>
            <Outlet context={{ onFind: handleFind } satisfies ShopOutlet} />
          </RoleGate>
        </chakra.main>
      </Box>
      <BottomBar role={session.member.role} />
      <Suspense fallback={null}>
        {isPaletteOpen && <CommandPalette role={session.member.role} onClose={() => setIsPaletteOpen(false)} />}
        {areKeysOpen && <KeyList onClose={() => setAreKeysOpen(false)} />}
      </Suspense>
      <ScrollRestoration />
    </StatusLineProvider>
  );
}

function ServerAway() {
  return (
    <ProblemNotice
      what="The server does not answer."
      safe="Nothing was changed."
      todo="Check the network, then try again. Set-up sheets on paper stay valid on their date of printing only."
      actions={
        <Button kind="primary" onClick={() => void refreshSession()}>
          Try again
        </Button>
      }
    />
  );
}
