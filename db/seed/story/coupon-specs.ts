import type { Role } from '@proofplate/recipe-model';
import type { MarkKind } from '../photos/mark-kinds';
import type { BenchKey, FinishKey, LensKey, MaterialKey } from './cast';
import type { TypedFactor, TypedSetting } from './setting';

/** How far a coupon has come. */
export type CouponReached = 'planned' | 'half marked' | 'inspected' | 'sealed';
export type WorkSpec = {
  readonly material: MaterialKey;
  readonly finish: FinishKey;
  readonly effect: string;
  readonly bench: BenchKey;
  readonly lens: LensKey;
};
/** What the invented craters of a plate are drawn with: spot radius w, threshold of one pulse, incubation coefficient. */
export type CraterSpec = { readonly spotRadiusUm: number; readonly thresholdUj: number; readonly incubationCoefficient: number };
export type CouponSpec = WorkSpec & {
  readonly key: string;
  readonly at: string;
  readonly by: Role;
  readonly title: string;
  readonly kind: MarkKind;
  readonly lot: string;
  readonly storedAt: string;
  readonly reached: CouponReached;
  /** Of a plate of single pulses, whose craters somebody measures. */
  readonly craters?: CraterSpec;
  readonly grid: { readonly rows: TypedFactor; readonly columns: TypedFactor; readonly base: TypedSetting };
};
export type ProofSpec = Pick<CouponSpec, 'key' | 'at' | 'by' | 'kind' | 'lot' | 'storedAt' | 'reached'> &
  WorkSpec & { readonly proves: string; readonly count: number };

export const WORK = {
  steel: { material: '316L', finish: 'brushed', effect: 'dark-anneal', bench: 'bench 2', lens: 'F160' },
  black: { material: 'black anodised', finish: 'sealed satin', effect: 'dye-bleaching', bench: 'bench 2', lens: 'F160' },
  clear: { material: 'clear anodised', finish: 'sealed matt', effect: 'dark-mark', bench: 'bench 2', lens: 'F160' },
  titanium: { material: 'titanium', finish: 'brushed', effect: 'colour-anneal', bench: 'bench 2', lens: 'F160' },
  brass: { material: 'brass', finish: 'turned', effect: 'shallow-engrave', bench: 'bench 1', lens: 'F160' },
  coat: { material: 'powder coat', finish: 'blue gloss', effect: 'coating-removal', bench: 'bench 1', lens: 'F254' },
  acrylic: { material: 'acrylic', finish: 'as supplied', effect: 'frost', bench: 'bench 3', lens: 'F200' },
  slate: { material: 'slate', finish: 'riven', effect: 'white-mark', bench: 'bench 3', lens: 'F200' },
  blasted: { material: '316L', finish: 'bead blasted', effect: 'dark-anneal', bench: 'bench 2', lens: 'F160' },
} as const satisfies Readonly<Record<string, WorkSpec>>;

const power = (from: number, to: number, count: number): TypedFactor => ({ parameter: 'powerPercent', from, to, count, spacing: 'steps' });
const speed = (from: number, to: number, count: number): TypedFactor => ({ parameter: 'speedMmPerS', from, to, count, spacing: 'ratios' });

/** Plates that look for a setting. */
export const COUPON_SPECS: readonly CouponSpec[] = [
  {
    ...{ ...WORK.steel, key: 'steel', at: '2026-02-10T09:00:00Z', by: 'operator', kind: 'stainless dark anneal', reached: 'sealed' },
    ...{ title: '316L brushed, dark anneal', lot: '316L-2291', storedAt: 'Drawer 1' },
    grid: {
      rows: speed(100, 600, 6),
      columns: power(30, 80, 6),
      base: { values: { frequencyKhz: 400, pulseWidthNs: 60, lineSpacingUm: 0.01, passes: 1, focusOffsetMm: 0 } },
    },
  },
  {
    ...{ ...WORK.black, key: 'black', at: '2026-02-17T09:00:00Z', by: 'operator', kind: 'anodised black bleach', reached: 'sealed' },
    ...{ title: 'Black anodised 6061, bleaching', lot: '6061-B14', storedAt: 'Drawer 1' },
    grid: {
      rows: speed(200, 1500, 6),
      columns: power(15, 45, 7),
      base: { values: { frequencyKhz: 60, pulseWidthNs: 8, lineSpacingUm: 0.02, passes: 1, focusOffsetMm: 0.5 } },
    },
  },
  {
    ...{ ...WORK.clear, key: 'clear', at: '2026-03-03T09:00:00Z', by: 'operator', kind: 'anodised clear dark mark', reached: 'sealed' },
    ...{ title: 'Clear anodised 6061, dark mark', lot: '6061-C03', storedAt: 'Drawer 1' },
    grid: {
      rows: speed(100, 800, 6),
      columns: power(20, 50, 6),
      base: { values: { frequencyKhz: 200, pulseWidthNs: 8, lineSpacingUm: 0.01, passes: 1, focusOffsetMm: 0 } },
    },
  },
  {
    ...{ ...WORK.titanium, key: 'titanium', at: '2026-03-10T09:00:00Z', by: 'operator', kind: 'titanium colour anneal', reached: 'sealed' },
    ...{ title: 'Titanium tags, blue', lot: 'TI2-077', storedAt: 'Drawer 2' },
    grid: {
      rows: speed(100, 1000, 8),
      columns: power(15, 45, 7),
      base: { values: { frequencyKhz: 400, pulseWidthNs: 60, lineSpacingUm: 0.012, passes: 1, focusOffsetMm: 0 } },
    },
  },
  {
    ...{ ...WORK.brass, key: 'brass', at: '2026-03-24T09:00:00Z', by: 'operator', kind: 'brass dark engrave', reached: 'sealed' },
    ...{ title: 'Brass bezels, shallow engraving', lot: 'MS-1180', storedAt: 'Drawer 2' },
    grid: {
      rows: speed(150, 900, 5),
      columns: power(50, 100, 6),
      base: { values: { frequencyKhz: 30, lineSpacingUm: 0.02, passes: 3, focusOffsetMm: 0 } },
    },
  },
  {
    ...{ ...WORK.coat, key: 'coat', at: '2026-04-14T09:00:00Z', by: 'operator', kind: 'powder coat removal', reached: 'sealed' },
    ...{ title: 'Powder coat on 5083, bare metal', lot: 'PC-BL-9', storedAt: 'Drawer 3' },
    grid: {
      rows: speed(150, 900, 5),
      columns: power(50, 100, 6),
      base: { values: { frequencyKhz: 40, lineSpacingUm: 0.04, passes: 2, focusOffsetMm: 0 }, fill: 'crossed' },
    },
  },
  {
    ...{ ...WORK.acrylic, key: 'acrylic', at: '2026-05-05T09:00:00Z', by: 'lead', kind: 'acrylic frost', reached: 'sealed' },
    ...{ title: 'Cast acrylic, frosting', lot: 'PMMA-5-21', storedAt: 'Drawer 3' },
    grid: {
      rows: speed(2, 20, 5),
      columns: power(20, 60, 5),
      base: { values: { lineSpacingUm: 250, passes: 1, focusOffsetMm: 0 }, fill: 'both directions', assist: 'air' },
    },
  },
  {
    ...{ ...WORK.slate, key: 'slate', at: '2026-05-19T09:00:00Z', by: 'lead', kind: 'slate engrave', reached: 'sealed' },
    ...{ title: 'Slate, light mark', lot: 'SL-40', storedAt: 'Drawer 3' },
    grid: {
      rows: speed(2, 16, 5),
      columns: power(30, 90, 5),
      base: { values: { lineSpacingUm: 250, passes: 1, focusOffsetMm: 0 } },
    },
  },
  {
    ...{ ...WORK.blasted, key: 'blasted', at: '2026-11-12T09:00:00Z', by: 'operator', kind: 'stainless dark anneal', reached: 'inspected' },
    ...{ title: '316L bead blasted, dark anneal', lot: '316L-2310', storedAt: 'On the bench' },
    grid: {
      rows: speed(120, 480, 5),
      columns: power(35, 70, 5),
      base: { values: { frequencyKhz: 400, pulseWidthNs: 60, lineSpacingUm: 0.01, passes: 1, focusOffsetMm: 0 } },
    },
  },
  {
    ...{
      ...WORK.black,
      key: 'black, closer',
      at: '2026-11-24T13:00:00Z',
      by: 'operator',
      kind: 'anodised black bleach',
      reached: 'half marked',
    },
    ...{ title: 'Black anodised 6061, a closer look', lot: '6061-B22', storedAt: 'On the bench' },
    grid: {
      rows: speed(500, 1000, 4),
      columns: power(28, 42, 8),
      base: { values: { frequencyKhz: 60, pulseWidthNs: 8, lineSpacingUm: 0.02, passes: 1, focusOffsetMm: 0.5 } },
    },
  },
  {
    ...{ ...WORK.titanium, bench: 'bench 1', lens: 'F254', effect: 'dark-mark' },
    ...{ key: 'titanium, grey', at: '2026-11-26T09:00:00Z', by: 'operator', kind: 'titanium colour anneal', reached: 'planned' },
    ...{ title: 'Titanium tags, dark grey on Bench 1', lot: 'TI2-081', storedAt: '' },
    grid: {
      rows: speed(200, 1000, 6),
      columns: power(40, 90, 6),
      base: { values: { frequencyKhz: 60, lineSpacingUm: 0.02, passes: 1, focusOffsetMm: 1 } },
    },
  },
  {
    ...{ ...WORK.steel, effect: 'deep-engrave', key: 'steel, craters', at: '2026-11-27T09:00:00Z', by: 'operator' },
    ...{
      kind: 'stainless dark anneal',
      reached: 'inspected',
      title: '316L, craters of single pulses',
      lot: '316L-2310',
      storedAt: 'Drawer 4',
    },
    // fast and wide enough that no two pulses touch: 117 µm from pulse to pulse, 150 µm from line to line
    craters: { spotRadiusUm: 19.2, thresholdUj: 17.4, incubationCoefficient: 0.88 },
    grid: {
      rows: { parameter: 'passes', from: 1, to: 4, count: 3, spacing: 'ratios' },
      columns: { parameter: 'powerPercent', from: 10, to: 45, count: 8, spacing: 'ratios' },
      base: {
        values: { speedMmPerS: 7000, frequencyKhz: 60, pulseWidthNs: 8, lineSpacingUm: 0.15, focusOffsetMm: 0 },
        fill: 'one direction',
      },
    },
  },
];

/** Plates that prove a setting: equal marks of exactly what a draft says. */
export const PROOF_SPECS: readonly ProofSpec[] = [
  proof(WORK.steel, {
    key: 'steel, proof',
    at: '2026-02-12T09:00:00Z',
    kind: 'stainless dark anneal',
    lot: '316L-2295',
    proves: 'steel/1',
  }),
  proof(WORK.black, { key: 'black, proof', at: '2026-02-19T09:00:00Z', kind: 'anodised black bleach', lot: '6061-B15', proves: 'black/1' }),
  proof(WORK.clear, {
    key: 'clear, proof',
    at: '2026-03-05T09:00:00Z',
    kind: 'anodised clear dark mark',
    lot: '6061-C04',
    proves: 'clear/1',
  }),
  proof(WORK.titanium, {
    key: 'titanium, proof',
    at: '2026-03-12T09:00:00Z',
    kind: 'titanium colour anneal',
    lot: 'TI2-079',
    proves: 'titanium/1',
  }),
  proof(WORK.steel, {
    key: 'steel, proof 4',
    at: '2026-11-17T09:00:00Z',
    kind: 'stainless dark anneal',
    lot: '316L-2310',
    proves: 'steel/4',
  }),
];

function proof(work: WorkSpec, spec: Pick<ProofSpec, 'key' | 'at' | 'kind' | 'lot' | 'proves'>): ProofSpec {
  return { ...work, ...spec, by: 'operator', count: 5, storedAt: 'Drawer 4', reached: 'sealed' };
}
