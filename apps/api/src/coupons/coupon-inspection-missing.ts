import type { CouponState } from '@proofplate/recipe-model';
import type { MarkState } from './dto/coupon.dto';
import type { MissingCode, MissingItemDto } from './dto/inspection.dto';

/** Tag of a cell that nobody rates; its note says why. */
export const NOT_RATED_TAG = 'not rated';

export type InspectionFacts = {
  readonly coupon: { readonly state: CouponState; readonly criteriaRecordedAt: Date | null };
  readonly cells: readonly { readonly id: string; readonly address: string; readonly markState: MarkState }[];
  readonly ratings: readonly { readonly cellId: string; readonly rating: number | null; readonly tags: readonly string[] }[];
  readonly photos: readonly { readonly id: string; readonly state: string; readonly hasCorners: boolean }[];
  readonly isPhotoRequired: boolean;
};

/** What the end of the inspection still needs. */
export function missingToInspect({ coupon, cells, ratings }: InspectionFacts): MissingItemDto[] {
  const open = openCells(cells, ratings);
  return [
    ...(coupon.criteriaRecordedAt === null ? [item('criteria', 'Record the acceptance criteria, before anything is judged.')] : []),
    ...(open.length > 0
      ? [item('ratings', `${countOf(open.length, 'cell is', 'cells are')} not rated. Rate them, or say why not.`, open)]
      : []),
  ];
}

/** What sealing still needs; all of it at once, never just the first. */
export function missingToSeal(facts: InspectionFacts): MissingItemDto[] {
  const { coupon, photos, isPhotoRequired } = facts;
  const pending = photos.filter(({ state }) => state === 'processing' || state === 'uploading').length;
  const ready = photos.filter(({ state }) => state === 'ready');
  return [
    ...missingToInspect(facts),
    ...(coupon.state === 'marked' ? [item('inspection', 'Finish the inspection.')] : []),
    ...(isPhotoRequired && ready.length === 0 ? [item('photo', 'Add a photo: the shop’s policy asks for one.')] : []),
    ...(pending > 0
      ? [
          item(
            'photo-processing',
            `${countOf(pending, 'photo is', 'photos are')} still being processed. Wait until it is ready or refused.`,
          ),
        ]
      : []),
    ...(ready.length > 0 && !ready.some(({ hasCorners }) => hasCorners)
      ? [
          {
            ...item('photo-corners', 'Set the corners of the plate in a photo: after sealing they can no longer be set.'),
            isBlocking: false,
          },
        ]
      : []),
  ];
}

export const blocking = (missing: readonly MissingItemDto[]) => missing.filter(({ isBlocking }) => isBlocking);

function openCells(cells: InspectionFacts['cells'], ratings: InspectionFacts['ratings']): string[] {
  const answered = new Set(
    ratings.filter(({ rating, tags }) => rating !== null || tags.includes(NOT_RATED_TAG)).map(({ cellId }) => cellId),
  );
  return cells.filter(({ id, markState }) => markState !== 'skipped' && !answered.has(id)).map(({ address }) => address);
}

const item = (code: MissingCode, text: string, addresses: string[] = []): MissingItemDto => ({ code, text, addresses, isBlocking: true });
const countOf = (count: number, one: string, many: string) => `${count} ${count === 1 ? one : many}`;
