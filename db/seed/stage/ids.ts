import { seededRandom } from '../photos/noise';

const VERSION_7 = 0x7000;
const VARIANT = 0x8000;
const SAME_TIME_LIMIT = 0x1000;

/**
 * Ids of rows (uuid version 7) that are the same at every seeding: the time is the story's, what should be random comes from a seed,
 * and ids of one millisecond rise in the order in which they were asked for.
 */
export function storyIds(seed: number): (at: Date) => string {
  const random = seededRandom(seed);
  const given = new Map<number, number>();
  const word = () => Math.floor(random() * 0x10000);
  return (at) => {
    const time = at.getTime();
    const turn = given.get(time) ?? 0;
    if (turn >= SAME_TIME_LIMIT) throw new RangeError(`more than ${SAME_TIME_LIMIT} ids at ${at.toISOString()}`);
    given.set(time, turn + 1);
    const head = time.toString(16).padStart(12, '0');
    const tail = [VERSION_7 | turn, VARIANT | (word() & 0x3fff), word(), word(), word()].map((part) => part.toString(16).padStart(4, '0'));
    const [turnPart, variantPart, ...rest] = tail;
    return `${head.slice(0, 8)}-${head.slice(8)}-${turnPart}-${variantPart}-${rest.join('')}`;
  };
}
