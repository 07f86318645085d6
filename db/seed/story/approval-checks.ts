import { type Criterion, QUANTITIES, type RouteKind } from '@proofplate/recipe-model';
import type { ShopPolicyRow } from './cast';

type Kept = { key: string; passes: boolean; title: string; detail: string; isAdvisory: boolean; blocks: 'submit' | 'approve' };
export type ProvedMark = {
  readonly lot: string;
  readonly day: string;
  readonly measured: readonly { quantity: string; value: number; unit: string }[];
};
export type Grounds = {
  readonly route: RouteKind;
  readonly stepCount: number;
  readonly reason: string;
  readonly cautionCount: number;
  readonly basis: readonly string[];
  readonly marks: readonly ProvedMark[];
  readonly criteria: readonly Criterion[];
  readonly calibratedOn: string | null;
  readonly grounds: string;
  readonly machineName: string;
  readonly policy: ShopPolicyRow;
  readonly at: Date;
};

const MS_PER_DAY = 24 * 60 * 60 * 1000;
const DIGITS = 4;

/** What a signature keeps of the checks that it was given on. */
export function keptChecks(about: Grounds, signer?: { readonly name: string }) {
  const { marks, policy } = about;
  const lots = [...new Set(marks.map(({ lot }) => lot))];
  const dayCount = new Set(marks.map(({ day }) => day)).size;
  return { items: checksOf(about, signer), confirmation: { count: marks.length, lots, dayCount, spreads: spreadsOf(about) }, policy };
}

function checksOf(about: Grounds, signer?: { readonly name: string }): Kept[] {
  const { route, stepCount, reason, cautionCount, grounds, machineName } = about;
  const steps = `${stepCount} mark ${stepCount === 1 ? 'step' : 'steps'}, each with power, speed and passes.`;
  return [
    passed('setting', 'Setting complete', steps),
    passed('panel', 'Can be dialled in', 'The panel can show every value.'),
    passed('reason', 'Reason', reason),
    passed('never', 'Nothing forbids it', 'No caution says never.'),
    passed('cautions-author', 'Cautions acknowledged by the author', `All ${cautionCount} acknowledged.`),
    ...(route === 'coupons' ? proofChecks(about) : [passed('grounds', 'Written grounds of a lead', grounds)]),
    passed('profile', 'Machine as proved', `${machineName} is what it was.`),
    calibrationCheck(about),
    passed('scope', 'One setting per part', 'No other approved recipe covers the same parts.'),
    ...(signer === undefined
      ? []
      : [{ ...passed('cautions-signer', 'Cautions acknowledged by the signer', 'All acknowledged.'), blocks: 'approve' as const }]),
  ];
}

function proofChecks(about: Grounds): Kept[] {
  const { basis, marks, policy } = about;
  const lots = new Set(marks.map(({ lot }) => lot)).size;
  const numbers = spreadsOf(about).map(
    ({ label, lowest, highest, mean, n }) => `${label} ${shown(lowest)} to ${shown(highest)}, mean ${shown(mean)} (n = ${n}).`,
  );
  const summary = `${marks.length} of ${policy.minimumConfirmationMarks} marks count, ${lots} ${lots === 1 ? 'lot' : 'lots'}.`;
  return [
    passed('basis', 'Basis', `${basis.join(', ')}, sealed.`),
    passed('confirmation', 'Confirmation', [summary, ...numbers].join(' ')),
    passed('criteria', 'Criteria before inspection', 'Recorded before anybody looked.'),
    passed('photo', 'Photo', 'Every cited coupon has one.'),
  ];
}

function calibrationCheck({ calibratedOn, route, policy, at }: Grounds): Kept {
  if (calibratedOn === null) return { ...passed('calibration', 'Power calibration', 'None is cited.'), passes: false, isAdvisory: true };
  const ageDays = Math.max(0, Math.floor((at.getTime() - new Date(`${calibratedOn}T00:00:00Z`).getTime()) / MS_PER_DAY));
  const found = `Read ${calibratedOn}, ${ageDays} days old, limit ${policy.calibrationAgeDays}.`;
  return {
    ...passed('calibration', 'Power calibration', found),
    passes: ageDays <= policy.calibrationAgeDays,
    isAdvisory: route !== 'coupons',
  };
}

function spreadsOf({ marks, criteria }: Grounds) {
  return criteria.flatMap(({ quantity, unit }) => {
    const values = marks.flatMap(({ measured }) => measured.filter((one) => one.quantity === quantity).map(({ value }) => value));
    if (values.length === 0) return [];
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
    return [
      {
        quantity,
        label: QUANTITIES[quantity].label,
        unit,
        n: values.length,
        lowest: Math.min(...values),
        highest: Math.max(...values),
        mean,
      },
    ];
  });
}

const passed = (key: string, title: string, detail: string): Kept => ({
  key,
  passes: true,
  title,
  detail,
  isAdvisory: false,
  blocks: 'submit',
});
const shown = (value: number) => String(Number(value.toPrecision(DIGITS)));
