import { SOURCE_KIND_LABELS, SOURCE_KINDS, type SourceKind } from '@proofplate/recipe-model';
import type { Process } from './members.api';

export const SOURCES: readonly { value: SourceKind; label: string }[] = SOURCE_KINDS.map((value) => ({
  value,
  label: SOURCE_KIND_LABELS[value],
}));

const isSame = (one: Process, other: Process) => one.effectId === other.effectId && one.sourceKind === other.sourceKind;

export const isChosen = (chosen: readonly Process[], process: Process) => chosen.some((own) => isSame(own, process));

export function withProcess(chosen: readonly Process[], process: Process, isOn: boolean): readonly Process[] {
  const others = chosen.filter((own) => !isSame(own, process));
  return isOn ? [...others, { effectId: process.effectId, sourceKind: process.sourceKind }] : others;
}
