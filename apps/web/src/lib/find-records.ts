import { request } from './api';
import { paths } from './paths';
import type { Role } from './session';

type RecordKind = 'recipe' | 'coupon' | 'material' | 'machine';
type FindAnswer = { items: readonly { kind: RecordKind; id: string; code?: string; name: string }[] };

export type FoundRecord = { kind: RecordKind; id: string; label: string; to: string };

const PATH_OF: Record<RecordKind, (item: { id: string; code: string }) => string> = {
  recipe: ({ code }) => paths.recipe(code),
  coupon: ({ code }) => paths.coupon(code),
  material: ({ id }) => paths.material(id),
  machine: ({ id }) => paths.machineDetail(id),
};

/** Records whose code or name holds the words. A trainee, who reads no recipes, is led to the setting at the machine. */
export async function findRecords(words: string, role: Role, signal: AbortSignal): Promise<readonly FoundRecord[]> {
  const { items } = await request<FindAnswer>('get', '/api/find', { query: { q: words }, signal });
  return items.map(({ kind, id, code = '', name }) => ({
    kind,
    id,
    label: code === '' ? name : `${code} ${name}`,
    to: role === 'trainee' && kind === 'recipe' ? paths.machineWith(id) : PATH_OF[kind]({ id, code }),
  }));
}
