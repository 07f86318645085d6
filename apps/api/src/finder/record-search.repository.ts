import { Injectable } from '@nestjs/common';
import type { Tx } from '@proofplate/db';
import { type SQL, sql } from 'drizzle-orm';
import { containsText, literalText } from '../database/contains-text';

export type FoundRow = { kind: 'recipe' | 'coupon' | 'material' | 'machine'; id: string; code: string; name: string };
type Search = { words: readonly string[]; kinds: readonly FoundRow['kind'][]; isApprovedOnly: boolean };

const MOST_PER_KIND = 6;

@Injectable()
export class RecordSearchRepository {
  async search(tx: Tx, shopId: string, { words, kinds, isApprovedOnly }: Search): Promise<FoundRow[]> {
    const sources: Record<FoundRow['kind'], SQL> = {
      recipe: sql`select id, code, title as name from recipe r where shop_id = ${shopId} and ${
        isApprovedOnly
          ? sql`exists (select 1 from revision_now v where v.shop_id = r.shop_id and v.recipe_id = r.id and v.state = 'approved')`
          : sql`true`
      }`,
      coupon: sql`select c.id, c.code, coalesce(nullif(c.title, ''), m.name) as name from coupon c
        join material m on m.shop_id = c.shop_id and m.id = c.material_id where c.shop_id = ${shopId}`,
      material: sql`select id, '' as code, name from material where shop_id = ${shopId} and archived_at is null`,
      machine: sql`select id, '' as code, name from machine where shop_id = ${shopId} and archived_at is null`,
    };
    const found = kinds.map(
      (kind) => sql`(select ${kind}::text as kind, id, code, name, ${rank(words)} as rank from (${sources[kind]}) ${sql.raw(kind)}_
        where ${holdsWords(words)} order by rank, code, name limit ${MOST_PER_KIND})`,
    );
    const rows = await tx.execute<FoundRow & { rank: number }>(
      sql`select * from (${sql.join(found, sql` union all `)}) found order by rank, code, name`,
    );
    return [...rows].map(({ kind, id, code, name }) => ({ kind, id, code, name }));
  }
}

/** Each word stands somewhere in code or name. */
function holdsWords(words: readonly string[]): SQL {
  return sql.join(
    words.map((word) => sql`concat_ws(' ', code, name) ilike ${containsText(word)}`),
    sql` and `,
  );
}

function rank(words: readonly string[]): SQL {
  const typed = literalText(words.join(' '));
  return sql`case when code ilike ${typed} then 0 when code ilike ${`${typed}%`} then 1 when name ilike ${`${typed}%`} then 2 else 3 end`;
}
