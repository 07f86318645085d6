import { type ParameterSet, sameValue } from '@proofplate/recipe-model';
import type { FieldProblem } from '../common/errors/domain-error';
import { type Entered, enterValues, powerOf, type SettingMachine } from './coupon-plan-setting';
import type { TypedValuesDto } from './dto/entered-setting.dto';

/**
 * What a cell was really marked with: the plan with the typed values in place, its watts worked out anew.
 *
 * @returns the whole set, or what is wrong with the typed values; a value equal to the planned one is no difference
 */
export function actualParameters(machine: SettingMachine, planned: ParameterSet, typed: TypedValuesDto | undefined): Entered<ParameterSet> {
  const given = Object.fromEntries(Object.entries(typed ?? {}).filter(([, value]) => value !== undefined));
  const { result, problems } = enterValues(machine.panel, given, '#/actual');
  const values = { ...planned.values, ...result };
  // the keys were read from typed values, so they are parameter keys
  const keys = Object.keys(result) as (keyof typeof result)[];
  const differs = keys.some((key) => {
    const [before, after] = [planned.values[key], result[key]];
    return before === undefined || (after !== undefined && !sameValue(before, after));
  });
  const none: FieldProblem = { pointer: '#/actual', detail: 'Enter what differs from the plan, or choose Marked.' };
  return {
    result: { ...planned, values, power: powerOf(machine, values) },
    problems: problems.length > 0 || differs ? problems : [none],
  };
}
