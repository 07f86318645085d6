import { uuidFromRandom } from './device-id';

it('is a UUID of version 4, and another one each time', () => {
  const ids = Array.from({ length: 50 }, uuidFromRandom);
  for (const id of ids) expect(id).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
  expect(new Set(ids).size).toBe(50);
});
