import type { Role, SessionAnswer } from '../lib/session';

/** An invented person in an invented shop. */
export function makeSessionAnswer(role: Role = 'owner'): SessionAnswer {
  return {
    person: { id: 'person-1', name: 'Hanne Voss', email: 'hanne@tidewater.example' },
    member: { id: 'member-1', role, printedName: 'Hanne Voss' },
    shop: { id: 'shop-1', name: 'Tidewater Marking', unitSystem: 'metric', timeZone: 'Europe/Berlin', locale: 'en-GB' },
    shops: [{ id: 'shop-1', name: 'Tidewater Marking', role }],
    accessToken: 'token-1',
    expiresAt: '2026-05-14T09:00:00.000Z',
  };
}
