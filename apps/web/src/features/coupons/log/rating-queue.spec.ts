import { ProblemError } from '../../../lib/api';
import type { CellRating, OwnRating, SentRating } from './log.api';
import { createRatingQueue, type RatingQueueOptions } from './rating-queue';

const own = (rating: number | null, given: Partial<OwnRating> = {}): OwnRating => ({ rating, outcome: null, tags: [], note: '', ...given });
const stored = (sent: SentRating): CellRating => ({
  ...sent,
  tags: [...sent.tags],
  id: `r-${sent.cellId}`,
  memberId: 'me',
  by: 'Me',
  ratedAt: '2026-05-13T09:24:00Z',
  version: (sent.seenVersion ?? 0) + 1,
});
const refusal = (status: number, body: Record<string, unknown> = {}) =>
  new ProblemError({ type: '', title: '', status, code: 'x', detail: '', errors: [] }, body);

function setUp(answer: (sent: readonly SentRating[]) => Promise<readonly CellRating[]>) {
  const sent: (readonly SentRating[])[] = [];
  const on = { onSaved: jest.fn(async () => undefined), onRefused: jest.fn(), onConflict: jest.fn(), onChange: jest.fn() };
  const options: RatingQueueOptions = {
    ...on,
    readVersion: () => undefined,
    send: (ratings) => {
      sent.push(ratings);
      return answer(ratings);
    },
  };
  return { queue: createRatingQueue(options), sent, on };
}
const untilIdle = async (queue: { isIdle: () => boolean }) => {
  while (!queue.isIdle()) await Promise.resolve();
};

describe('the queue of ratings', () => {
  it('shows a value at once, and sends what was typed meanwhile together with the version of the answer before', async () => {
    let release: (() => void) | undefined;
    const { queue, sent } = setUp(async (ratings) => {
      if (release === undefined) await new Promise<void>((resolve) => (release = resolve));
      return ratings.map(stored);
    });
    queue.put(new Map([['a', own(3)]]));
    expect(queue.pending('a')).toEqual(own(3));
    queue.put(new Map([['a', own(4)]]));
    queue.put(new Map([['b', own(1)]]));
    expect(queue.pending('a')).toEqual(own(4));
    release?.();
    await untilIdle(queue);
    expect(sent).toEqual([
      [{ ...own(3), cellId: 'a', seenVersion: null }],
      [
        { ...own(4), cellId: 'a', seenVersion: 1 },
        { ...own(1), cellId: 'b', seenVersion: null },
      ],
    ]);
    expect(queue.pending('a')).toBeUndefined();
  });

  it('drops a refused value, hands it back with the reason, and goes on', async () => {
    const { queue, on } = setUp((ratings) =>
      ratings[0]?.rating === 9 ? Promise.reject(refusal(503)) : Promise.resolve(ratings.map(stored)),
    );
    queue.put(new Map([['a', own(9)]]));
    queue.put(new Map([['b', own(2)]]));
    await untilIdle(queue);
    expect(queue.pending('a')).toBeUndefined();
    expect(on.onRefused).toHaveBeenCalledWith({ problem: expect.objectContaining({ status: 503 }), dropped: new Map([['a', own(9)]]) });
    expect(on.onSaved).toHaveBeenCalledWith([expect.objectContaining({ cellId: 'b', rating: 2 })]);
  });

  it('asks about a value that moved on, and sends the rest of the batch again', async () => {
    const current = stored({ ...own(1), cellId: 'a', seenVersion: 4 });
    const { queue, sent, on } = setUp((ratings) =>
      ratings.some(({ cellId }) => cellId === 'a')
        ? Promise.reject(refusal(412, { current: { conflicts: [{ cellId: 'a', yours: own(5), current }] } }))
        : Promise.resolve(ratings.map(stored)),
    );
    queue.put(
      new Map([
        ['a', own(5)],
        ['b', own(2)],
      ]),
    );
    await untilIdle(queue);
    expect(on.onConflict).toHaveBeenCalledWith([{ cellId: 'a', yours: own(5), current }]);
    expect(sent[1]).toEqual([{ ...own(2), cellId: 'b', seenVersion: null }]);
  });

  it('takes one’s own value coming back for a lost answer, not for a conflict', async () => {
    const mine = stored({ ...own(5, { tags: ['even'] }), cellId: 'a', seenVersion: null });
    const { queue, on } = setUp(() =>
      Promise.reject(refusal(412, { current: { conflicts: [{ cellId: 'a', yours: own(5, { tags: ['even'] }), current: mine }] } })),
    );
    queue.put(new Map([['a', own(5, { tags: ['even'] })]]));
    await untilIdle(queue);
    expect(on.onConflict).not.toHaveBeenCalled();
    expect(on.onSaved).toHaveBeenCalledWith([mine]);
  });
});
