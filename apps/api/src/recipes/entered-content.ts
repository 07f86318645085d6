import type { LimitsOfUse, MarkStep, Range, RecipeScope, SetUpStep } from '@proofplate/recipe-model';
import type { FieldProblem } from '../common/errors/domain-error';
import { type Entered, enterValues, powerOf, type SettingMachine } from '../coupons/coupon-plan-setting';
import type { EnterStepDto, SetUpStepDto } from './dto/mark-step.dto';
import type { LimitsOfUseDto, RangeDto, RecipeScopeDto } from './dto/scope.dto';

/** Mark steps as typed, each value by the rules of the panel; every refusal points at its field. A draft may still lack values. */
export function enterSteps(machine: SettingMachine, typed: readonly EnterStepDto[]): Entered<MarkStep[]> {
  const entered = typed.map(({ purpose, values, fill, assist, delaysUs, pauseAfterS }, index) => {
    const given = Object.fromEntries(Object.entries(values).filter(([, value]) => value !== undefined && value !== null));
    const { result, problems } = enterValues(machine.panel, given, `#/steps/${index}/values`);
    const delays = delaysUs === undefined ? {} : { delaysUs: { ...delaysUs } };
    const parameters = { values: result, fill, assist, ...delays, power: powerOf(machine, result) };
    return { step: { purpose, parameters, pauseAfterS }, problems };
  });
  return { result: entered.map(({ step }) => step), problems: entered.flatMap(({ problems }) => problems) };
}

/** The same steps with their watts worked out anew, for another calibration. What was typed stays. */
export function withPower(machine: SettingMachine, steps: readonly MarkStep[]): MarkStep[] {
  return steps.map((step) => ({ ...step, parameters: { ...step.parameters, power: powerOf(machine, step.parameters.values) } }));
}

export function setUpStepsAsStored(steps: readonly SetUpStepDto[]): SetUpStep[] {
  return steps.map(({ text, caution, photoId, mustTick }) => ({
    text,
    ...(caution === undefined || caution === '' ? {} : { caution }),
    ...(photoId == null ? {} : { photoId }),
    mustTick,
  }));
}

export function limitsAsStored({ thicknessMm, partDiameterMm, notes }: LimitsOfUseDto): LimitsOfUse {
  return { ...rangeOf('thicknessMm', thicknessMm), ...rangeOf('partDiameterMm', partDiameterMm), notes };
}

export function scopeAsStored(scope: RecipeScopeDto): RecipeScope {
  const { featureKind, materialGroupId, customerSpecification } = scope;
  return {
    ...rangeOf('thicknessMm', scope.thicknessMm),
    ...rangeOf('partDiameterMm', scope.partDiameterMm),
    ...(featureKind == null ? {} : { featureKind }),
    ...rangeOf('featureSizeMm', scope.featureSizeMm),
    ...(materialGroupId == null ? {} : { materialGroupId }),
    ...(customerSpecification === undefined || customerSpecification === '' ? {} : { customerSpecification }),
  };
}

/** Ranges that begin after they end. */
export function rangeProblems(ranges: Readonly<Record<string, RangeDto | undefined>>, pointer: string): FieldProblem[] {
  return Object.entries(ranges).flatMap(([name, range]) =>
    range?.from != null && range.to != null && range.from > range.to
      ? [{ pointer: `${pointer}/${name}`, detail: 'The lower end must not lie above the upper end.' }]
      : [],
  );
}

/** A range without an end is no range. */
function rangeOf<Name extends string>(name: Name, range: RangeDto | undefined): Partial<Record<Name, Range>> {
  const stored: Range = { ...(range?.from == null ? {} : { from: range.from }), ...(range?.to == null ? {} : { to: range.to }) };
  if (Object.keys(stored).length === 0) return {};
  // one entry under exactly this name
  return { [name]: stored } as Record<Name, Range>;
}
