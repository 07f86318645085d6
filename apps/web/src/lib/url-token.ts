import { useEffect, useState } from 'react';

/**
 * One-time token from the address's fragment (`…/reset-password#token=…`). A fragment never reaches a server or its logs; it is taken
 * out of the address bar at once, so that no history keeps it either.
 */
export function useUrlToken(): string | undefined {
  const [token] = useState(() => new URLSearchParams(globalThis.location.hash.slice(1)).get('token') ?? undefined);
  useEffect(() => {
    if (token !== undefined) history.replaceState(history.state, '', globalThis.location.pathname);
  }, [token]);
  return token;
}
