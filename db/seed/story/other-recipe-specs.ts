import { WORK } from './coupon-specs';
import type { RecipeSpec } from './recipe-specs';

const area = { featureKind: 'filled-area' } as const;
const FIBRE = { passes: 1, focusOffsetMm: 0 } as const;

/** Recipes that are not, or no longer, what the shop works with, and those that did not come from a coupon. */
export const OTHER_RECIPES: readonly RecipeSpec[] = [
  {
    ...{ material: 'brass', finish: 'lacquered', effect: 'deep-engrave', bench: 'bench 1', lens: 'F160' },
    ...{ key: 'brass, deep', title: 'Brass CuZn37, lacquered: deep engraving', kind: 'brass dark engrave', purpose: 'rough' },
    ...{ setUp: [{ text: 'Mask the lacquer round the mark' }], limits: { notes: '' }, scope: area },
    revisions: [
      {
        ...{ draftedAt: '2026-01-19T13:00:00Z', by: 'operator', reason: 'From the notebook of the old machine.' },
        setting: {
          typed: { values: { powerPercent: 95, speedMmPerS: 250, frequencyKhz: 25, lineSpacingUm: 0.03, passes: 40, focusOffsetMm: 0 } },
        },
        ...{ route: 'earlier-experience', grounds: { by: 'lead', text: 'Used for two years on plaques; depth checked on five of them.' } },
        ...{ submittedAt: '2026-01-20T10:00:00Z', ending: { act: 'approved', at: '2026-01-20T15:00:00Z', by: 'lead' } },
        withdrawal: {
          at: '2026-07-14T09:20:00Z',
          by: 'lead',
          reason: 'Burr on three plaques, and the lacquer lifts. Not to be used until it is proved again.',
        },
      },
    ],
  },
  {
    ...{ material: 'clear anodised', finish: 'sealed matt', effect: 'shallow-engrave', bench: 'bench 1', lens: 'F160' },
    ...{
      key: 'clear, code',
      title: 'Clear anodised 6061: code fields, as the customer asks',
      kind: 'anodised clear dark mark',
      purpose: 'engrave',
    },
    ...{ setUp: [{ text: 'Verify the first code, grade B or better', mustTick: true }], limits: { notes: 'Code fields of 8 to 20 mm.' } },
    scope: { featureKind: 'code', featureSizeMm: { from: 8, to: 20 }, customerSpecification: 'Invented specification TW-77, issue 2' },
    revisions: [
      {
        ...{ draftedAt: '2026-04-21T13:00:00Z', by: 'operator', reason: 'The customer’s setting for its code fields.' },
        setting: { typed: { values: { ...FIBRE, powerPercent: 60, speedMmPerS: 600, frequencyKhz: 40, lineSpacingUm: 0.03, passes: 2 } } },
        ...{
          route: 'customer-given',
          grounds: { by: 'lead', text: 'Given with specification TW-77; our verifier reads grade A on three plates.' },
        },
        ...{ submittedAt: '2026-04-22T10:00:00Z', ending: { act: 'approved', at: '2026-04-22T15:00:00Z', by: 'owner' } },
      },
    ],
  },
  {
    ...{
      ...WORK.steel,
      bench: 'bench 1',
      lens: 'F254',
      key: 'steel, bench 1',
      title: '316L brushed: black anneal on Bench 1',
      kind: 'stainless dark anneal',
    },
    ...{ purpose: 'anneal', setUp: [], limits: { notes: '' }, scope: area },
    revisions: [
      {
        ...{
          draftedAt: '2026-10-12T13:00:00Z',
          by: 'operator',
          reason: 'So that Bench 2 is not the only one.',
          route: 'earlier-experience',
        },
        setting: {
          typed: { values: { ...FIBRE, powerPercent: 55, speedMmPerS: 90, frequencyKhz: 80, lineSpacingUm: 0.015, focusOffsetMm: 2 } },
        },
      },
    ],
  },
  {
    ...{
      ...WORK.blasted,
      key: 'blasted',
      title: '316L bead blasted, round housings: black anneal',
      kind: 'stainless dark anneal',
      purpose: 'anneal',
    },
    setUp: [
      { text: 'Guard over the rotary shut, sleeves tied', caution: 'A turning part catches hair, sleeves and gloves.', mustTick: true },
    ],
    limits: { partDiameterMm: { from: 18, to: 40 }, notes: 'One strip per index step.' },
    scope: { ...area, partDiameterMm: { from: 18, to: 40 } },
    revisions: [
      {
        ...{ draftedAt: '2026-10-05T13:00:00Z', by: 'operator', reason: 'Housings of the next order.', route: 'earlier-experience' },
        setting: {
          typed: { values: { ...FIBRE, powerPercent: 50, speedMmPerS: 220, frequencyKhz: 400, pulseWidthNs: 60, lineSpacingUm: 0.01 } },
        },
        grounds: { by: 'lead', text: 'Near to the setting for brushed plates; only as a start.' },
        submittedAt: '2026-10-06T10:00:00Z',
        ending: {
          act: 'returned',
          at: '2026-10-07T09:00:00Z',
          by: 'lead',
          comment: 'Blasted steel needs its own plate. Burn a coupon first, then come back.',
        },
      },
    ],
  },
  {
    ...{ ...WORK.titanium, bench: 'bench 1', lens: 'F254', effect: 'dark-mark' },
    ...{ key: 'titanium, grey', title: 'Titanium grade 2 tags: dark grey on Bench 1', kind: 'titanium colour anneal', purpose: 'fill' },
    ...{ setUp: [{ text: 'Lay the tags on the brass plate, never on wood', mustTick: true }], limits: { notes: '' }, scope: area },
    revisions: [
      {
        ...{
          draftedAt: '2026-11-20T13:00:00Z',
          by: 'operator',
          reason: 'Set by eye on Bench 1 for a repair job last winter; the slip was found again.',
        },
        setting: {
          typed: { values: { ...FIBRE, powerPercent: 70, speedMmPerS: 260, frequencyKhz: 60, lineSpacingUm: 0.02, focusOffsetMm: 1 } },
        },
        ...{
          route: 'earlier-experience',
          grounds: { by: 'lead', text: 'To be looked at beside a coupon before anything is marked with it.' },
        },
        submittedAt: '2026-11-25T10:00:00Z',
      },
    ],
  },
  {
    ...{
      ...WORK.acrylic,
      effect: 'cut-mark',
      key: 'acrylic, cut',
      title: 'Cast acrylic 5 mm: scored line',
      kind: 'acrylic frost',
      purpose: 'cut',
    },
    ...{ setUp: [], limits: { notes: '' }, scope: { featureKind: 'single-line' } },
    revisions: [
      {
        ...{ draftedAt: '2026-11-25T13:00:00Z', by: 'lead', reason: 'Asked for by the trophy maker.', route: 'customer-given' },
        setting: { typed: { fill: 'outline', assist: 'air', values: { powerPercent: 80, speedMmPerS: 1, passes: 2, focusOffsetMm: 0 } } },
      },
    ],
  },
];
