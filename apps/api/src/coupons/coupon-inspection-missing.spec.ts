import { blocking, type InspectionFacts, missingToInspect, missingToSeal, NOT_RATED_TAG } from './coupon-inspection-missing';

const CELLS: InspectionFacts['cells'] = [
  { id: '1', address: 'A1', markState: 'marked' },
  { id: '2', address: 'A2', markState: 'differs' },
  { id: '3', address: 'A3', markState: 'skipped' },
];
const facts = (given: Partial<InspectionFacts> = {}): InspectionFacts => ({
  coupon: { state: 'inspected', criteriaRecordedAt: new Date(0) },
  cells: CELLS,
  ratings: [
    { cellId: '1', rating: 0, tags: [] },
    { cellId: '2', rating: null, tags: [NOT_RATED_TAG] },
  ],
  photos: [{ id: 'p', state: 'ready', hasCorners: true }],
  isPhotoRequired: true,
  ...given,
});
const codes = (items: ReturnType<typeof missingToSeal>) => items.map(({ code }) => code);

describe('what is missing on a coupon', () => {
  it('is nothing when each cell is rated, skipped or named, and a photo is there', () => {
    expect(missingToInspect(facts())).toEqual([]);
    expect(missingToSeal(facts())).toEqual([]);
  });

  it('names the cells that nobody judged; a note or an outcome alone is no rating', () => {
    const open = missingToInspect(facts({ ratings: [{ cellId: '1', rating: null, tags: ['even'] }] }));
    expect(open).toEqual([
      { code: 'ratings', text: '2 cells are not rated. Rate them, or say why not.', addresses: ['A1', 'A2'], isBlocking: true },
    ]);
  });

  it('is listed all at once', () => {
    const coupon = { state: 'marked', criteriaRecordedAt: null } as const;
    const photos = [{ id: 'p', state: 'processing', hasCorners: false }];
    expect(codes(missingToSeal(facts({ coupon, ratings: [], photos })))).toEqual([
      'criteria',
      'ratings',
      'inspection',
      'photo',
      'photo-processing',
    ]);
  });

  it('leaves the photo to the shop’s policy, but never seals over one that is still being processed', () => {
    expect(missingToSeal(facts({ photos: [], isPhotoRequired: false }))).toEqual([]);
    const refused = [{ id: 'p', state: 'refused', hasCorners: false }];
    expect(codes(missingToSeal(facts({ photos: refused })))).toEqual(['photo']);
    const uploading = [{ id: 'p', state: 'uploading', hasCorners: false }];
    expect(codes(missingToSeal(facts({ photos: uploading, isPhotoRequired: false })))).toEqual(['photo-processing']);
  });

  it('reminds of corners without stopping the seal', () => {
    const missing = missingToSeal(facts({ photos: [{ id: 'p', state: 'ready', hasCorners: false }] }));
    expect(codes(missing)).toEqual(['photo-corners']);
    expect(blocking(missing)).toEqual([]);
  });
});
