import { AccessTokens } from '../../src/auth/access-tokens';
import { SessionsService } from '../../src/auth/sessions.service';
import type { TestApp } from './app';

export const TEST_DEVICE = { address: '127.0.0.1', userAgent: 'test' };
const FIRST_VERSION = 1;

/** A session row and an access token, without going through the password. */
export async function signInAs(test: TestApp, member: { readonly personId: string; readonly shopId: string; readonly memberId: string }) {
  const opening = { ...member, version: FIRST_VERSION, device: TEST_DEVICE };
  const key = await test.unitOfWork.outsideShop((db) => test.app.get(SessionsService).open(db, opening));
  const { accessToken } = await test.app.get(AccessTokens).mint(key);
  return { headers: { authorization: `Bearer ${accessToken}` }, sessionId: key.sessionId, refreshToken: key.refreshToken };
}
