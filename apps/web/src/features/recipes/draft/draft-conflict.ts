import { PANEL_UNITS, type PanelUnit } from '@proofplate/physics';
import { codeWords } from '../../../lib/code-words';
import { formatEntered } from '../../../lib/format';
import type { Revision, RevisionChange } from '../recipes.api';
import type { DraftValues } from './draft-values';
import { fieldWords } from './field-words';

/** Parts of a draft that are saved, and decided on, as a whole. */
export const PARTS = [
  { key: 'steps', values: 'steps', label: 'Mark steps' },
  { key: 'setUpSteps', values: 'setUpSteps', label: 'Set-up steps' },
  { key: 'limits', values: 'limits', label: 'Limits of use' },
  { key: 'scope', values: 'scope', label: 'What it covers' },
  { key: 'reason', values: 'reason', label: 'Reason' },
  { key: 'route', values: 'route', label: 'Route' },
  { key: 'grounds', values: 'grounds', label: 'Grounds' },
  { key: 'effectiveFrom', values: 'effectiveFrom', label: 'Takes effect' },
  { key: 'reviewDue', values: 'reviewDue', label: 'Re-prove by' },
  { key: 'calibrationId', values: 'calibrationId', label: 'Power table' },
  { key: 'acknowledgedCautionIds', values: 'acknowledged', label: 'Acknowledged cautions' },
] as const satisfies readonly { key: keyof RevisionChange; values: keyof DraftValues; label: string }[];

export type PartKey = (typeof PARTS)[number]['key'];
/** Each part as text, so that two states of it can be told apart. */
export type SavedParts = Partial<Record<PartKey, string>>;

export function partsOf(change: RevisionChange): SavedParts {
  return Object.fromEntries(PARTS.flatMap(({ key }) => (change[key] === undefined ? [] : [[key, JSON.stringify(change[key])]])));
}

/** The parts that differ from what was saved last. */
export function changedParts(change: RevisionChange, saved: SavedParts): RevisionChange {
  const own = partsOf(change);
  return Object.fromEntries(
    Object.entries(change).filter(([key]) => PARTS.some((part) => part.key === key && own[part.key] !== saved[part.key])),
  );
}

export type DifferingLeaf = { name: string; mine: string; theirs: string };
export type ConflictPart = {
  key: PartKey;
  label: string;
  leaves: readonly DifferingLeaf[];
  /** Who changed it since the version that both started from. */
  changedBy: 'me' | 'them' | 'both';
};
export type Conflict = { theirs: Revision; parts: readonly ConflictPart[] };

type PanelFields = Revision['profile']['panel']['fields'];
type States = { saved: SavedParts; mine: RevisionChange; theirs: RevisionChange; fields: PanelFields };

/** Every part in which the two drafts differ, with both values. */
export function conflictParts(states: States): ConflictPart[] {
  const mine = partsOf(states.mine);
  const theirs = partsOf(states.theirs);
  return PARTS.flatMap(({ key, label }) => {
    if (mine[key] === undefined || mine[key] === theirs[key]) return [];
    const changedBy = theirs[key] === states.saved[key] ? 'me' : mine[key] === states.saved[key] ? 'them' : 'both';
    return [{ key, label, changedBy, leaves: differingLeaves([key, states.mine[key], states.theirs[key]], states.fields) }];
  });
}

function differingLeaves([part, mine, theirs]: [PartKey, unknown, unknown], fields: PanelFields): DifferingLeaf[] {
  const left = leavesOf(mine);
  const right = leavesOf(theirs);
  const names = [...new Set([...left.keys(), ...right.keys()])];
  return names
    .map((name) => ({
      name: name === '' ? '' : fieldWords(`${part}.${name}`, fields),
      mine: left.get(name) ?? 'nothing',
      theirs: right.get(name) ?? 'nothing',
    }))
    .filter((leaf) => leaf.mine !== leaf.theirs);
}

/** "0.values.powerPercent" → "60 %": a value and its unit stay together. */
function leavesOf(value: unknown, path: readonly string[] = []): Map<string, string> {
  const leaves = new Map<string, string>();
  if (isEntered(value)) leaves.set(path.join('.'), `${formatEntered(value.value)} ${PANEL_UNITS[value.unit].symbol}`.trim());
  else if (typeof value === 'object' && value !== null) {
    for (const [key, own] of Object.entries(value)) {
      for (const [name, text] of leavesOf(own, [...path, key])) leaves.set(name, text);
    }
  } else
    leaves.set(
      path.join('.'),
      typeof value === 'boolean'
        ? value
          ? 'yes'
          : 'no'
        : value === '' || value === null || value === undefined
          ? 'nothing'
          : (codeWords(String(value)) ?? String(value)),
    );
  return leaves;
}

function isEntered(value: unknown): value is { value: number; unit: PanelUnit } {
  return typeof value === 'object' && value !== null && 'value' in value && 'unit' in value;
}

/** The draft as decided: part by part mine or theirs. */
export function mergedValues(mine: DraftValues, theirs: DraftValues, keepsMine: ReadonlySet<PartKey>): DraftValues {
  const kept = PARTS.filter(({ key }) => keepsMine.has(key)).map(({ values }) => [values, mine[values]]);
  return { ...theirs, ...Object.fromEntries(kept) };
}
