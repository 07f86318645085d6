import { storyIds } from './ids';

const at = new Date('2026-02-10T09:00:00Z');

describe('storyIds', () => {
  it('gives the same ids for the same story and others for another', () => {
    expect(storyIds(1)(at)).toBe(storyIds(1)(at));
    expect(storyIds(1)(at)).not.toBe(storyIds(2)(at));
  });

  it('gives uuids of version 7 that carry the time', () => {
    const id = storyIds(1)(at);
    expect(id).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
    expect(Number.parseInt(id.replace('-', '').slice(0, 12), 16)).toBe(at.getTime());
  });

  it('rises within one millisecond', () => {
    const next = storyIds(1);
    const ids = Array.from({ length: 300 }, () => next(at));
    expect([...ids].sort()).toEqual(ids);
    expect(new Set(ids).size).toBe(ids.length);
  });
});
