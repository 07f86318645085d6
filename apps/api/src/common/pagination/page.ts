import { type Type as ClassOf } from '@nestjs/common';
import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { IsInt, IsOptional, IsString, isUUID, Max, MaxLength, Min } from 'class-validator';
import { isDay } from '../decorators/is-day';
import { InvalidError } from '../errors/domain-error';

export const DEFAULT_PAGE_SIZE = 25;
export const MAX_PAGE_SIZE = 100;
const MAX_CURSOR_LENGTH = 500;

/** Query of every list: how many, and where to go on. List queries extend it. */
export class PageQuery {
  @ApiPropertyOptional({ description: 'How many items at most', minimum: 1, maximum: MAX_PAGE_SIZE, default: DEFAULT_PAGE_SIZE })
  @IsOptional()
  @Type(() => Number)
  @IsInt()
  @Min(1)
  @Max(MAX_PAGE_SIZE)
  limit: number = DEFAULT_PAGE_SIZE;

  @ApiPropertyOptional({ description: 'nextCursor of the page before; opaque' })
  @IsOptional()
  @IsString()
  @MaxLength(MAX_CURSOR_LENGTH)
  cursor?: string;
}

export type Page<T> = { readonly items: T[]; readonly nextCursor: string | null };
export type CursorPart = string | number;
/** What the sort value of a list is; it goes into a comparison of the database, which knows no other form. */
export type CursorKind = 'string' | 'number' | 'id' | 'day' | 'moment';

/** Response class of a list: `class MemberPageDto extends PageOf(MemberDto) {}`. */
export function PageOf<T>(item: ClassOf<T>) {
  abstract class PageDto {
    @ApiProperty({ type: [item], description: 'The items of this page, in order' }) items: T[];
    @ApiProperty({ type: String, nullable: true, description: 'Send as cursor for the next page; null at the end' }) nextCursor:
      | string
      | null;
  }
  return PageDto;
}

/** Opaque text for the sort values of the last row of a page. */
export const encodeCursor = (parts: readonly CursorPart[]) => Buffer.from(JSON.stringify(parts)).toString('base64url');

/**
 * The sort values behind a cursor, or undefined for the first page.
 *
 * @param kinds kind of each sort value, in order
 * @throws InvalidError when the text is not a cursor of this list
 */
export function decodeCursor(cursor: string | undefined, kinds: readonly CursorKind[]): CursorPart[] | undefined {
  if (cursor === undefined) return undefined;
  const parts = parseCursor(cursor);
  const fits = Array.isArray(parts) && parts.length === kinds.length && parts.every((part, index) => isOfKind(part, kinds[index]));
  if (fits) return parts;
  throw new InvalidError('Start again from the first page.', [{ pointer: '#/cursor', detail: 'This is not a cursor of this list.' }]);
}

/** Cuts `limit + 1` rows into a page. Repositories fetch one row more than asked, so that the end is known without a count. */
export function pageOf<Row, Item>(
  rows: readonly Row[],
  limit: number,
  as: { item: (row: Row) => Item; cursor: (row: Row) => readonly CursorPart[] },
): Page<Item> {
  const kept = rows.slice(0, limit);
  const last = kept.at(-1);
  const hasMore = rows.length > limit && last !== undefined;
  return { items: kept.map(as.item), nextCursor: hasMore ? encodeCursor(as.cursor(last)) : null };
}

const MOMENT = /^(\d{4}-\d{2}-\d{2})[T ]\d{2}:\d{2}:\d{2}(?:\.\d{1,6})?(?:Z|[+-]\d{2}(?::\d{2})?)$/;

function isOfKind(part: unknown, kind: CursorKind | undefined): boolean {
  if (kind === 'number') return Number.isSafeInteger(part);
  if (typeof part !== 'string') return false;
  if (kind === 'id') return isUUID(part);
  if (kind === 'day') return isDay(part);
  return kind === 'string' || isDay(MOMENT.exec(part)?.[1] ?? '');
}

function parseCursor(cursor: string): unknown {
  try {
    return JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
  } catch {
    return undefined;
  }
}
