import type { AreaMm, EnteredPart, Role } from '@proofplate/recipe-model';
import { COMPASS_RING } from './round-part';

/** One run as the shop's book would have it: day, slot, setting, who, job, part, lot, good, scrap, minutes. */
export type BookedRun = {
  readonly day: string;
  readonly slot: 'first' | 'second';
  readonly revision: string;
  readonly by: Role;
  readonly job: string;
  readonly part: string;
  readonly lot: string;
  readonly good: number;
  readonly scrap: number;
  readonly minutes: number;
  readonly notes?: string;
  readonly badResult?: { readonly outcome: string; readonly note: string };
  readonly underDeviation?: boolean;
  readonly isOpen?: boolean;
  /** Set up on the rotary and kept with the run. */
  readonly roundPart?: EnteredPart;
  /** Marked area of the piece that somebody clocked. */
  readonly clockedMm?: AreaMm;
};

type Row = readonly [
  day: string,
  slot: BookedRun['slot'],
  revision: string,
  by: Role,
  job: string,
  part: string,
  lot: string,
  good: number,
  scrap: number,
  minutes: number,
];
type More = Pick<BookedRun, 'notes' | 'badResult' | 'underDeviation' | 'isOpen' | 'roundPart' | 'clockedMm'>;

const run = ([day, slot, revision, by, job, part, lot, good, scrap, minutes]: Row, more: More = {}): BookedRun => ({
  ...{ day, slot, revision, by, job, part, lot, good, scrap, minutes },
  ...more,
});
const clocked = (widthMm: number, heightMm: number): More => ({ clockedMm: { widthMm, heightMm } });
const BROWN = { outcome: 'wrong-colour', note: 'Brown at the rim on four housings.' };

/** Two months of work. Jobs, parts and counts are invented. */
export const BOOKED_RUNS: readonly BookedRun[] = [
  run(['2026-09-28', 'first', 'black/3', 'trainee', 'TW-26-0371', 'Tide dial, 60 mm', '6061-B20', 40, 1, 50]),
  run(['2026-09-29', 'first', 'steel/3', 'operator', 'TW-26-0372', 'Sensor plate', '316L-2304', 24, 0, 45]),
  run(['2026-09-30', 'first', 'brass/1', 'operator', 'TW-26-0374', 'Depth-gauge bezel', 'MS-1190', 30, 1, 55]),
  run(['2026-10-01', 'first', 'black/3', 'trainee', 'TW-26-0375', 'Compass ring', '6061-B20', 60, 0, 50]),
  run(['2026-10-02', 'first', 'coat/1', 'operator', 'TW-26-0377', 'Panel, left', 'PC-BL-13', 12, 0, 40]),
  run(['2026-10-02', 'second', 'coat/1', 'operator', 'TW-26-0377', 'Panel, right', 'PC-BL-13', 12, 1, 40]),
  run(['2026-10-06', 'first', 'titanium/1', 'operator', 'TW-26-0380', 'Tag, 30 mm', 'TI2-080', 58, 1, 55]),
  run(['2026-10-07', 'first', 'acrylic/1', 'trainee', 'TW-26-0381', 'Trophy front', 'PMMA-5-24', 8, 0, 35]),
  run(['2026-10-08', 'first', 'black/3', 'trainee', 'TW-26-0383', 'Tide dial, 60 mm', '6061-B21', 80, 0, 55], clocked(40, 6)),
  run(['2026-10-09', 'first', 'clear/1', 'operator', 'TW-26-0384', 'Scale, 120 mm', '6061-C10', 41, 0, 45]),
  run(['2026-10-12', 'second', 'steel/3', 'operator', 'TW-26-0386', 'Sensor plate', '316L-2306', 36, 1, 50], clocked(30, 8)),
  run(['2026-10-14', 'first', 'slate/1', 'trainee', 'TW-26-0388', 'Gift slate', 'SL-44', 15, 1, 45]),
  run(['2026-10-19', 'first', 'brass/1', 'operator', 'TW-26-0391', 'Depth-gauge bezel', 'MS-1191', 44, 0, 55]),
  run(['2026-10-20', 'first', 'clear, code/1', 'operator', 'TW-26-0392', 'Housing with code field', '6061-C10', 50, 0, 40], {
    ...clocked(10, 10),
    notes: 'First code verified: grade A.',
  }),
  run(['2026-10-21', 'first', 'black/3', 'trainee', 'TW-26-0393', 'Compass ring', '6061-B21', 64, 0, 50]),
  run(['2026-10-22', 'first', 'coat/1', 'operator', 'TW-26-0395', 'Panel, left', 'PC-BL-13', 18, 0, 45]),
  run(['2026-10-26', 'first', 'titanium/1', 'operator', 'TW-26-0398', 'Tag, 45 mm', 'TI2-080', 32, 0, 50], clocked(25, 10)),
  run(['2026-10-28', 'first', 'slate/1', 'trainee', 'TW-26-0401', 'Gift slate', 'SL-44', 16, 1, 45]),
  run(['2026-10-29', 'first', 'steel/3', 'operator', 'TW-26-0402', 'Sensor plate', '316L-2308', 30, 2, 50], {
    ...clocked(30, 8),
    notes: 'Two pieces a little brown.',
  }),
  run(['2026-11-03', 'first', 'coat/1', 'operator', 'TW-26-0406', 'Panel, right', 'PC-BL-14', 22, 0, 50], { underDeviation: true }),
  run(['2026-11-04', 'first', 'steel/3', 'operator', 'TW-26-0407', 'Sensor plate', '316L-2308', 22, 4, 50], { badResult: BROWN }),
  run(['2026-11-05', 'first', 'acrylic/1', 'trainee', 'TW-26-0409', 'Trophy front', 'PMMA-5-24', 20, 1, 45]),
  run(['2026-11-06', 'first', 'black/3', 'trainee', 'TW-26-0410', 'Tide dial, 60 mm', '6061-B22', 40, 0, 50], clocked(52, 18)),
  run(['2026-11-11', 'first', 'slate/1', 'operator', 'TW-26-0414', 'House number', 'SL-45', 6, 2, 45], {
    badResult: { outcome: 'uneven', note: 'Pale stripes on two slates.' },
  }),
  run(['2026-11-13', 'first', 'brass/1', 'operator', 'TW-26-0417', 'Depth-gauge bezel', 'MS-1192', 38, 0, 55], clocked(24, 6)),
  run(['2026-11-16', 'second', 'clear/1', 'trainee', 'TW-26-0419', 'Scale, 120 mm', '6061-C11', 36, 0, 45], clocked(100, 4)),
  run(['2026-11-18', 'second', 'black/3', 'trainee', 'TW-26-0422', 'Compass ring', '6061-B22', 56, 0, 50], { roundPart: COMPASS_RING }),
  run(['2026-11-20', 'second', 'titanium/1', 'operator', 'TW-26-0424', 'Tag, 30 mm', 'TI2-081', 26, 0, 45], clocked(16, 12)),
  run(['2026-11-26', 'first', 'black/3', 'trainee', 'TW-26-0429', 'Tide dial, 60 mm', '6061-B22', 48, 1, 50], clocked(12, 30)),
  run(['2026-11-27', 'first', 'black/3', 'trainee', 'TW-26-0430', 'Tide dial, 60 mm', '6061-B22', 0, 0, 0], { isOpen: true }),
];

/** Mornings on which a reference cell was marked again; the watts fall a little from week to week. */
export const DAILY_CHECKS: readonly { readonly day: string; readonly watts: number }[] = [
  { day: '2026-09-28', watts: 1 },
  { day: '2026-10-05', watts: 0.995 },
  { day: '2026-10-12', watts: 0.992 },
  { day: '2026-10-19', watts: 0.985 },
  { day: '2026-10-26', watts: 0.98 },
  { day: '2026-11-02', watts: 0.972 },
  { day: '2026-11-09', watts: 0.968 },
  { day: '2026-11-16', watts: 0.96 },
  { day: '2026-11-23', watts: 0.955 },
  { day: '2026-11-27', watts: 0.95 },
];
