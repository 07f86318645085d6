import type { RevisionContent } from '@proofplate/recipe-model';
import { type FieldProblem } from '../common/errors/domain-error';

/** Tick of a set-up step, by its place from 0. */
export const setUpTick = (index: number) => `set-up.${index}`;
/** Tick of a value on the setting card: mark step from 0 and parameter. */
export const settingTick = (step: number, parameter: string) => `setting.${step}.${parameter}`;

/** Everything that can be ticked in a run of this revision. */
export function tickableKeys({ setUpSteps, steps }: RevisionContent): ReadonlySet<string> {
  const setUp = setUpSteps.map((_, index) => setUpTick(index));
  const setting = steps.flatMap(({ parameters }, step) => Object.keys(parameters.values).map((parameter) => settingTick(step, parameter)));
  return new Set([...setUp, ...setting]);
}

/** What is ticked that this revision does not have, and what must be ticked before the start and is not. */
export function tickProblems(content: RevisionContent, ticked: readonly string[], { isStart }: { isStart: boolean }): FieldProblem[] {
  const known = tickableKeys(content);
  const unknown = ticked
    .filter((key) => !known.has(key))
    .map((key) => ({ pointer: '#/ticks', detail: `This setting has nothing to tick under “${key}”. Load it again.` }));
  if (!isStart) return unknown;
  const missing = content.setUpSteps.flatMap(({ text, mustTick }, index) =>
    mustTick && !ticked.includes(setUpTick(index)) ? [{ pointer: '#/ticks', detail: `Do and tick step ${index + 1} first: ${text}` }] : [],
  );
  return [...unknown, ...missing];
}
