import { request } from './api';
import { paths } from './paths';

type RecordKind = 'recipe' | 'coupon' | 'material' | 'machine';
type FindAnswer = { items: readonly { kind: RecordKind; id: string; code?: string; name: string }[] };

export type FoundRecord = { kind: RecordKind; id: string; label: string; to: string };

const PATH_OF: Record<RecordKind, (item: { id: string; code: string }) => string> = {
  recipe: ({ code }) => paths.recipe(code),
  coupon: ({ code }) => paths.coupon(code),
  material: ({ id }) => paths.material(id),
  machine: ({ id }) => paths.machineDetail(id),
};

/** Records whose code or name holds the words. */
export async function findRecords(words: string, signal: AbortSignal): Promise<readonly FoundRecord[]> {
  const { items } = await request<FindAnswer>('get', '/api/find', { query: { q: words }, signal });
  return items.map(({ kind, id, code = '', name }) => ({
    kind,
    id,
    label: code === '' ? name : `${code} ${name}`,
    to: PATH_OF[kind]({ id, code }),
  }));
}
