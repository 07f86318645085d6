import { minutesAfter, type Stage } from '../stage/stage';
import type { Cast } from './cast';
import { measureCraters } from './coupon-craters';
import { measureCells, moveOn, rateBest, rateCells, recordCriteria } from './coupon-inspecting';
import { markCoupon } from './coupon-marking';
import { burn, photograph } from './coupon-photographing';
import { planCoupon, planProof } from './coupon-planning';
import { COUPON_SPECS, type CouponSpec, PROOF_SPECS, type ProofSpec } from './coupon-specs';
import type { Made } from './records';
import type { Script } from './script';
import { teller } from './shop';

/** Minutes from the plan of a coupon to its later acts; the longest plate is marked within half an hour. */
const AFTER = {
  marking: 15,
  photo: 60,
  criteria: 70,
  measuring: 80,
  craters: 85,
  rating: 90,
  secondRating: 100,
  inspected: 110,
  sealed: 120,
};
const SHARE_OF_HALF = 0.55;

export type World = { readonly stage: Stage; readonly cast: Cast; readonly made: Made; readonly script: Script };

export function writeCoupons(world: World): void {
  const { script, cast, made } = world;
  for (const spec of COUPON_SPECS) {
    script.add(new Date(spec.at), teller(cast.people[spec.by]), async (turn) => {
      made.coupons.set(spec.key, await planCoupon(turn, cast, spec));
    });
    writeMarking(world, spec);
  }
  for (const spec of PROOF_SPECS) {
    script.add(new Date(spec.at), teller(cast.people[spec.by]), async (turn) => {
      made.coupons.set(spec.key, await planProof(turn, cast, spec, made.revision(spec.proves)));
    });
    writeMarking(world, spec);
  }
}

function writeMarking(world: World, spec: CouponSpec | ProofSpec): void {
  const { script, cast, made } = world;
  if (spec.reached === 'planned') return;
  const by = teller(cast.people[spec.by]);
  const share = spec.reached === 'half marked' ? SHARE_OF_HALF : 1;
  script.add(minutesAfter(new Date(spec.at), AFTER.marking), by, (turn) => markCoupon(turn, made.coupon(spec.key), share));
  if (spec.reached !== 'half marked') writeInspection(world, spec);
}

function writeInspection({ stage, cast, made, script }: World, spec: CouponSpec | ProofSpec): void {
  const bench = cast.benches[spec.bench];
  const by = teller(cast.people[spec.by]);
  const later = (minutes: number) => minutesAfter(new Date(spec.at), minutes);
  const record = () => made.coupon(spec.key);
  script.add(later(AFTER.photo), by, async (turn) => {
    burn(record(), spec.kind, bench.physical);
    await photograph(turn, stage, record(), spec.kind);
  });
  script.add(later(AFTER.criteria), by, (turn) => recordCriteria(turn, record()));
  script.add(later(AFTER.measuring), by, (turn) => measureCells(turn, record(), bench));
  const craters = 'craters' in spec ? spec.craters : undefined;
  if (craters !== undefined) script.add(later(AFTER.craters), by, (turn) => measureCraters(turn, record(), craters));
  script.add(later(AFTER.rating), by, (turn) => rateCells(turn, record(), record().cells));
  const second = cast.people[spec.by === 'lead' ? 'operator' : 'lead'];
  script.add(later(AFTER.secondRating), teller(second), (turn) => rateBest(turn, record()));
  script.add(later(AFTER.inspected), by, (turn) => moveOn(turn, record(), 'inspected'));
  if (spec.reached === 'sealed') script.add(later(AFTER.sealed), by, (turn) => moveOn(turn, record(), 'sealed'));
}
