import type { LimitsOfUse, RecipeScope, Role, RouteKind, StepPurpose } from '@proofplate/recipe-model';
import type { MarkKind } from '../photos/mark-kinds';
import { WORK, type WorkSpec } from './coupon-specs';
import type { TypedSetting, TypedValues } from './setting';

export type Ending =
  | { readonly act: 'approved'; readonly at: string; readonly by: Role; readonly comment?: string }
  | { readonly act: 'returned'; readonly at: string; readonly by: Role; readonly comment: string };

export type RevisionSpec = {
  readonly draftedAt: string;
  readonly by: Role;
  readonly reason: string;
  /** From the best cell of a coupon, from the revision before with some values changed, or typed in. */
  readonly setting: { readonly coupon: string; readonly changed?: TypedValues } | { readonly typed: TypedSetting };
  readonly route?: RouteKind;
  readonly grounds?: { readonly by: Role; readonly text: string };
  /** How it was proved again: a coupon of equal marks, or measured pieces of a run. */
  readonly proof?:
    | { readonly coupon: string; readonly linkedAt: string }
    | { readonly runAt: string; readonly pieces: number; readonly lot: string };
  readonly submittedAt?: string;
  readonly comment?: string;
  readonly ending?: Ending;
  readonly effectiveFrom?: string;
  readonly reviewDue?: string;
  readonly withdrawal?: { readonly at: string; readonly by: Role; readonly reason: string };
};

export type RecipeSpec = WorkSpec & {
  readonly key: string;
  readonly title: string;
  readonly kind: MarkKind;
  readonly purpose: StepPurpose;
  readonly setUp: readonly { readonly text: string; readonly caution?: string; readonly mustTick?: boolean }[];
  readonly limits: LimitsOfUse;
  readonly scope: RecipeScope;
  readonly revisions: readonly RevisionSpec[];
};

const flat = (notes: string): LimitsOfUse => ({ notes });
const area = { featureKind: 'filled-area' } as const;
const approved = (at: string, comment = ''): Ending => ({ act: 'approved', at, by: 'lead', comment });

/** The recipes that the shop works with. Numbers are invented. */
export const PROVED_RECIPES: readonly RecipeSpec[] = [
  {
    ...{ ...WORK.steel, key: 'steel', title: '316L brushed, black anneal', kind: 'stainless dark anneal', purpose: 'anneal' },
    setUp: [
      { text: 'Clamp the plate with the grain along x', mustTick: true },
      { text: 'Degrease with acetone, let it dry 60 s', caution: 'Flammable: close the bottle and move it away.', mustTick: true },
      { text: 'Mark one scrap piece and compare with the reference' },
    ],
    limits: { thicknessMm: { from: 1, to: 4 }, notes: 'Flat plates. Thin rims brown at the edge.' },
    scope: { ...area, thicknessMm: { from: 1, to: 4 } },
    revisions: [
      {
        ...{ draftedAt: '2026-02-11T13:00:00Z', by: 'operator', reason: 'First setting for the new plates.', setting: { coupon: 'steel' } },
        proof: { coupon: 'steel, proof', linkedAt: '2026-02-12T13:00:00Z' },
        ...{ submittedAt: '2026-02-13T10:00:00Z', ending: approved('2026-02-13T14:10:00Z') },
      },
      {
        ...{ draftedAt: '2026-06-02T13:00:00Z', by: 'operator', reason: 'A little slower: the black was thin on lot 316L-2301.' },
        setting: { coupon: 'steel', changed: { speedMmPerS: 280 } },
        proof: { runAt: '2026-06-03T13:00:00Z', pieces: 4, lot: '316L-2301' },
        ...{ submittedAt: '2026-06-04T10:00:00Z', ending: approved('2026-06-04T14:30:00Z') },
      },
      {
        ...{
          draftedAt: '2026-08-25T13:00:00Z',
          by: 'operator',
          reason: 'After the reading of 18 August: five points more for the same watts.',
        },
        setting: { coupon: 'steel', changed: { speedMmPerS: 280, powerPercent: 85 } },
        proof: { runAt: '2026-08-26T13:00:00Z', pieces: 4, lot: '316L-2304' },
        ...{ submittedAt: '2026-08-27T10:00:00Z', ending: approved('2026-08-27T15:05:00Z', 'Matches the reference at 30°.') },
      },
      {
        ...{ draftedAt: '2026-11-16T13:00:00Z', by: 'operator', reason: 'The black has gone brown at the rim since October: more dose.' },
        setting: { coupon: 'steel', changed: { speedMmPerS: 262, powerPercent: 85 } },
        proof: { coupon: 'steel, proof 4', linkedAt: '2026-11-18T13:00:00Z' },
        ...{ submittedAt: '2026-11-19T10:12:00Z', comment: 'Please look at the rim of A3 too.' },
      },
    ],
  },
  {
    ...{
      ...WORK.black,
      key: 'black',
      title: 'Black anodised 6061, sealed satin: white mark',
      kind: 'anodised black bleach',
      purpose: 'bleach',
    },
    setUp: [
      { text: 'Seat the dial face up in fixture T-14, against both pins', mustTick: true },
      { text: 'Wipe with isopropanol, let it dry 30 s', caution: 'Flammable: close the bottle and move it away.', mustTick: true },
      { text: 'Run the outline: it clears the pins by 2 mm' },
      { text: 'Mark one scrap dial and compare with the reference' },
    ],
    limits: flat('Sealed wrought dials only. Cast or unsealed ones turn yellow.'),
    scope: { ...area, featureSizeMm: { from: 1, to: 80 } },
    revisions: [
      {
        ...{ draftedAt: '2026-02-18T13:00:00Z', by: 'operator', reason: 'First setting for dials.', setting: { coupon: 'black' } },
        proof: { coupon: 'black, proof', linkedAt: '2026-02-19T13:00:00Z' },
        ...{ submittedAt: '2026-02-20T10:00:00Z', ending: approved('2026-02-20T15:00:00Z') },
      },
      {
        ...{ draftedAt: '2026-06-16T13:00:00Z', by: 'operator', reason: 'Faster by a tenth for the summer orders.' },
        setting: { coupon: 'black', changed: { speedMmPerS: 740 } },
        proof: { runAt: '2026-06-17T13:00:00Z', pieces: 5, lot: '6061-B19' },
        ...{ submittedAt: '2026-06-18T10:00:00Z', ending: approved('2026-06-18T14:00:00Z') },
      },
      {
        ...{ draftedAt: '2026-09-08T13:00:00Z', by: 'operator', reason: 'Slower than before: lot 6061-B20 stayed grey.' },
        setting: { coupon: 'black', changed: { speedMmPerS: 640 } },
        proof: { runAt: '2026-09-09T13:00:00Z', pieces: 5, lot: '6061-B20' },
        ...{ submittedAt: '2026-09-10T10:00:00Z', ending: approved('2026-09-10T14:12:00Z', 'White enough on both lots.') },
      },
    ],
  },
  {
    ...{
      ...WORK.clear,
      key: 'clear',
      title: 'Clear anodised 6061, sealed matt: dark mark',
      kind: 'anodised clear dark mark',
      purpose: 'fill',
    },
    setUp: [{ text: 'Seat the plate in fixture T-09', mustTick: true }, { text: 'Mark the scrap strip first, wipe it with a dry cloth' }],
    limits: flat('Not over edges: the oxide is thin there.'),
    scope: { ...area },
    revisions: [
      {
        ...{ draftedAt: '2026-03-04T13:00:00Z', by: 'operator', reason: 'First setting for scales.', setting: { coupon: 'clear' } },
        proof: { coupon: 'clear, proof', linkedAt: '2026-03-05T13:00:00Z' },
        ...{ submittedAt: '2026-03-06T10:00:00Z', ending: approved('2026-03-06T14:00:00Z') },
      },
      {
        ...{ draftedAt: '2026-11-09T13:00:00Z', by: 'operator', reason: 'New fixture from February on: the focus sits 0.2 mm nearer.' },
        setting: { coupon: 'clear', changed: { focusOffsetMm: -0.2 } },
        proof: { runAt: '2026-11-10T13:00:00Z', pieces: 4, lot: '6061-C11' },
        ...{ submittedAt: '2026-11-10T15:00:00Z', effectiveFrom: '2027-02-01T08:00:00Z', ending: approved('2026-11-11T09:30:00Z') },
      },
    ],
  },
  {
    ...{ ...WORK.titanium, key: 'titanium', title: 'Titanium grade 2 tags: blue', kind: 'titanium colour anneal', purpose: 'anneal' },
    setUp: [
      {
        text: 'Lay the tags on the brass plate, never on wood',
        caution: 'Titanium dust burns. Empty the tray before and after.',
        mustTick: true,
      },
      { text: 'Look at the first tag under the booth lamp' },
    ],
    limits: { thicknessMm: { from: 0.5, to: 1.5 }, notes: 'Tags of 20 to 60 mm. Thicker parts come out paler.' },
    scope: { ...area, thicknessMm: { from: 0.5, to: 1.5 } },
    revisions: [
      {
        ...{ draftedAt: '2026-03-11T13:00:00Z', by: 'operator', reason: 'First setting for tags.', setting: { coupon: 'titanium' } },
        proof: { coupon: 'titanium, proof', linkedAt: '2026-03-12T13:00:00Z' },
        ...{ submittedAt: '2026-03-13T10:00:00Z', ending: approved('2026-03-13T14:00:00Z') },
      },
      {
        ...{ draftedAt: '2026-11-23T13:00:00Z', by: 'operator', reason: 'Try a slightly deeper blue.' },
        setting: { coupon: 'titanium', changed: { lineSpacingUm: 0.011 } },
      },
    ],
  },
  {
    ...{ ...WORK.brass, key: 'brass', title: 'Brass CuZn37 bezels: shallow engraving', kind: 'brass dark engrave', purpose: 'engrave' },
    setUp: [
      { text: 'Clamp the bezel in the soft jaws', mustTick: true },
      { text: 'Brush the first piece and measure the depth at 12 o’clock', mustTick: true },
    ],
    limits: flat('Depth gauges only where the drawing allows a groove.'),
    scope: { ...area },
    revisions: [
      {
        ...{ draftedAt: '2026-03-25T13:00:00Z', by: 'operator', reason: 'First setting for bezels.', setting: { coupon: 'brass' } },
        proof: { runAt: '2026-03-26T13:00:00Z', pieces: 3, lot: 'MS-1182' },
        ...{ submittedAt: '2026-03-27T10:00:00Z', reviewDue: '2026-10-30T09:00:00Z', ending: approved('2026-03-27T14:00:00Z') },
      },
    ],
  },
  {
    ...{
      ...WORK.coat,
      key: 'coat',
      title: 'Powder coat on 5083, blue: bare metal',
      kind: 'powder coat removal',
      purpose: 'remove-coating',
    },
    setUp: [
      { text: 'Filter for gas in the extraction, read the coat’s safety data sheet', mustTick: true },
      { text: 'Wipe off the dust after marking' },
    ],
    limits: flat('70 µm polyester coat only.'),
    scope: { ...area },
    revisions: [
      {
        ...{ draftedAt: '2026-04-15T13:00:00Z', by: 'operator', reason: 'First setting for panels.', setting: { coupon: 'coat' } },
        proof: { runAt: '2026-04-16T13:00:00Z', pieces: 3, lot: 'PC-BL-10' },
        ...{ submittedAt: '2026-04-17T10:00:00Z', ending: approved('2026-04-17T14:00:00Z') },
      },
    ],
  },
  {
    ...{ ...WORK.acrylic, key: 'acrylic', title: 'Cast acrylic 5 mm: frosted', kind: 'acrylic frost', purpose: 'frost' },
    setUp: [{ text: 'Peel the film off the marked side', mustTick: true }, { text: 'Air assist on, low' }],
    limits: { thicknessMm: { from: 3, to: 8 }, notes: 'Cast sheet only: extruded sheet runs.' },
    scope: { ...area, thicknessMm: { from: 3, to: 8 } },
    revisions: [
      {
        ...{ draftedAt: '2026-05-06T13:00:00Z', by: 'lead', reason: 'First setting for trophies.', setting: { coupon: 'acrylic' } },
        proof: { runAt: '2026-05-07T13:00:00Z', pieces: 3, lot: 'PMMA-5-22' },
        ...{ submittedAt: '2026-05-08T10:00:00Z', ending: { act: 'approved', at: '2026-05-08T16:00:00Z', by: 'owner' } },
      },
    ],
  },
  {
    ...{ ...WORK.slate, key: 'slate', title: 'Slate, riven: light mark', kind: 'slate engrave', purpose: 'engrave' },
    setUp: [{ text: 'Filter for fine dust in the extraction', mustTick: true }, { text: 'Level the slate with the wedges' }],
    limits: flat('Level within 1 mm over the marked area.'),
    scope: { ...area },
    revisions: [
      {
        ...{ draftedAt: '2026-05-20T13:00:00Z', by: 'lead', reason: 'First setting for gift work.', setting: { coupon: 'slate' } },
        proof: { runAt: '2026-05-21T13:00:00Z', pieces: 3, lot: 'SL-41' },
        ...{ submittedAt: '2026-05-22T10:00:00Z', ending: { act: 'approved', at: '2026-05-22T16:00:00Z', by: 'owner' } },
      },
    ],
  },
];
