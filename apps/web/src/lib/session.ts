// Who is signed in. The access token lives in this module's memory only; the refresh cookie is out of reach of scripts.
import { useSyncExternalStore } from 'react';
import { setShopStyle } from './format';

export type Role = 'trainee' | 'operator' | 'lead' | 'owner';
export type UnitSystem = 'metric' | 'inch';

export type Session = {
  person: { id: string; name: string; email: string };
  member: { id: string; role: Role; printedName: string };
  shop: { id: string; name: string; unitSystem: UnitSystem; timeZone: string; locale: string };
  /** Every shop the person works in, this one included. */
  shops: readonly { id: string; name: string; role: Role }[];
};

export type SessionAnswer = Session & { accessToken: string; expiresAt: string };

/** none: nobody was signed in. left: the person signed out. ended: the server no longer takes the session. */
export type SignedOutReason = 'none' | 'left' | 'ended';

export type SessionState =
  | { status: 'unknown' }
  | { status: 'signed-out'; reason: SignedOutReason }
  /** The server could not be reached, so nobody knows yet. */
  | { status: 'unreachable' }
  | { status: 'signed-in'; session: Session };

const REFRESH_PATH = '/api/auth/refresh';
const REFRESH_LOCK = 'proofplate.refresh';

/** Shown by every request that uses the refresh cookie; a page of another origin cannot set it. */
export const REQUESTED_BY = { 'X-Requested-By': 'proofplate' } as const;

let state: SessionState = { status: 'unknown' };
let accessToken: string | undefined;
let refreshing: Promise<boolean> | undefined;
const listeners = new Set<() => void>();

export function useSessionState(): SessionState {
  return useSyncExternalStore(subscribe, () => state);
}

/** The session of a page that is shown to signed-in people only. */
export function useSession(): Session {
  const current = useSessionState();
  if (current.status !== 'signed-in') throw new Error('useSession is for pages below the shop layout');
  return current.session;
}

export function currentAccessToken(): string | undefined {
  return accessToken;
}

export function openSession({ accessToken: token, expiresAt: _expiresAt, ...session }: SessionAnswer): void {
  accessToken = token;
  change({ status: 'signed-in', session });
}

/** Takes over changed facts of the shop without a new token. */
export function updateShop({ name, unitSystem, timeZone, locale }: Omit<Session['shop'], 'id'>): void {
  if (state.status !== 'signed-in') return;
  const { session } = state;
  change({ status: 'signed-in', session: { ...session, shop: { id: session.shop.id, name, unitSystem, timeZone, locale } } });
}

export function closeSession(reason: SignedOutReason): void {
  accessToken = undefined;
  change({ status: 'signed-out', reason });
}

/** Fetches a new access token; calls at the same time share one request. False when there is no session any more. */
export function refreshSession(): Promise<boolean> {
  refreshing ??= acrossTabs(refreshOnce).finally(() => {
    refreshing = undefined;
  });
  return refreshing;
}

async function refreshOnce(): Promise<boolean> {
  const wasSignedIn = state.status === 'signed-in';
  const response = await fetch(REFRESH_PATH, { method: 'POST', headers: REQUESTED_BY, credentials: 'same-origin' }).catch(() => undefined);
  if (response?.ok) {
    openSession((await response.json()) as SessionAnswer);
    return true;
  }
  // A server that is away or in trouble says nothing about the session: what is on the screen stays.
  if (response === undefined || response.status >= 500 || response.status === 429) {
    if (!wasSignedIn) change({ status: 'unreachable' });
    return false;
  }
  closeSession(wasSignedIn ? 'ended' : 'none');
  return false;
}

/** The refresh token is used up by its use: two tabs must not send the same one. */
async function acrossTabs(work: () => Promise<boolean>): Promise<boolean> {
  return navigator.locks === undefined ? await work() : await navigator.locks.request(REFRESH_LOCK, work);
}

function change(next: SessionState): void {
  state = next;
  setShopStyle(next.status === 'signed-in' ? next.session.shop : undefined);
  for (const listener of listeners) listener();
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}
