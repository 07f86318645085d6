import { Navigate } from 'react-router';
import { Page } from '../components/page';
import { Invitation, InvitationGone } from '../features/auth/components/invitation';
import { paths } from '../lib/paths';
import { useSessionState } from '../lib/session';
import { useUrlToken } from '../lib/url-token';

export function Component() {
  const token = useUrlToken();
  const state = useSessionState();
  if (state.status === 'signed-in') return <Navigate to={paths.home} replace />;
  return <Page title="Join a shop">{token === undefined ? <InvitationGone isAnswer /> : <Invitation token={token} />}</Page>;
}
