import { hasEssentialChange, scopesOverlap, showValue, stepsDiff } from '@proofplate/recipe-model';
import { type ApprovalCheck, check } from './approval-check';
import { type ApprovalFacts, isSameWork, provesOnCoupons } from './approval-facts';
import { calibrationCheck, powerShiftCheck } from './calibration-checks';
import { type Confirmation, confirmationOf } from './confirmation';
import { basisCheck, confirmationCheck, criteriaCheck, newConfirmationCheck, photoCheck } from './evidence-checks';
import type { RevisionRecord } from './stored-revision';

export type RevisionChecks = { readonly items: ApprovalCheck[]; readonly confirmation: Confirmation };

/** All that an approval needs of the revision itself; who may sign it is another question. Every failing one is listed. */
export function revisionChecks(facts: ApprovalFacts): RevisionChecks {
  const { record } = facts;
  const { content, route } = record.revision;
  const confirmation = confirmationOf({
    revisionId: record.revision.id,
    steps: content.steps,
    basis: record.basis,
    confirmation: record.confirmation,
    runs: record.runs,
    isSameWork: (cell) => isSameWork(cell, record),
  });
  const rests = route === 'coupons';
  // a transfer is a proposal of formulas: it carries a lead's grounds, and marks on the target all the same
  const isProved = provesOnCoupons(route);
  const items = [
    settingCheck(record),
    panelCheck(record),
    reasonCheck(record),
    neverCheck(record),
    acknowledgedCheck(facts),
    ...(rests ? [] : [groundsCheck(record)]),
    ...(rests ? [basisCheck(record)] : []),
    ...(isProved ? [confirmationCheck(confirmation, facts.policy, route)] : []),
    ...(isProved && facts.current !== null ? [newConfirmationCheck(facts, confirmation)] : []),
    ...(isProved ? [criteriaCheck(record), photoCheck(record, facts.policy)] : []),
    ...(facts.current === null ? [] : [changesCheck(record, facts.current)]),
    profileCheck(record),
    calibrationCheck(facts),
    ...powerShiftCheck(facts),
    scopeCheck(facts),
  ];
  return { items, confirmation };
}

function settingCheck({ revision }: RevisionRecord): ApprovalCheck {
  const { steps } = revision.content;
  const bare = steps.flatMap(({ parameters }, index) => {
    const { powerPercent, speedMmPerS, passes } = parameters.values;
    return powerPercent === undefined || speedMmPerS === undefined || passes === undefined ? [index + 1] : [];
  });
  const passes = steps.length > 0 && bare.length === 0;
  const found = passes
    ? `${steps.length} mark ${steps.length === 1 ? 'step' : 'steps'}, each with power, speed and passes.`
    : steps.length === 0
      ? 'There is no mark step.'
      : `Step ${bare.join(', ')} lacks power, speed or passes.`;
  return check('setting', 'Setting complete', { passes, found, wayOut: 'Enter what the panel will show.' });
}

function panelCheck({ revision, profile }: RevisionRecord): ApprovalCheck {
  const unshowable = revision.content.steps.flatMap(({ parameters: { values } }, index) =>
    profile.panel.fields.flatMap((field) => {
      const value = values[field.parameter];
      if (value === undefined) return [];
      const speed = values.speedMmPerS?.physical;
      const shown = showValue(field, value, speed === undefined ? {} : { speedMmPerS: speed });
      return shown?.isShowable === true ? [] : [`${field.label} in step ${index + 1}`];
    }),
  );
  return check('panel', 'Can be dialled in', {
    passes: unshowable.length === 0,
    found: unshowable.length === 0 ? 'The panel can show every value.' : `The panel cannot show ${unshowable.join(', ')}.`,
    wayOut: 'Choose the nearest value that it can show, and prove that one.',
  });
}

function reasonCheck({ revision }: RevisionRecord): ApprovalCheck {
  const passes = revision.reason.trim() !== '';
  return check('reason', 'Reason', { passes, found: passes ? revision.reason : 'No reason is given.', wayOut: 'Say why this setting.' });
}

function neverCheck({ cautions, revision }: RevisionRecord): ApprovalCheck {
  const never = cautions.filter(({ level }) => level === 'never');
  return check('never', 'Nothing forbids it', {
    passes: never.length === 0,
    found: never.length === 0 ? 'No caution says never.' : never.map(({ subject, source }) => `${subject} (${source})`).join(' '),
    wayOut:
      revision.content.scope.materialGroupId === undefined
        ? 'Choose another material, or ask the laser safety officer.'
        : 'Choose another material, take the one that it names out of the covered group, or ask the laser safety officer.',
  });
}

function acknowledgedCheck({ record, acknowledgedByAuthor }: ApprovalFacts): ApprovalCheck {
  const care = record.cautions.filter(({ level }) => level === 'care');
  const open = care.filter(({ id }) => !acknowledgedByAuthor.includes(id));
  return check('cautions-author', 'Cautions acknowledged by the author', {
    passes: open.length === 0,
    found: open.length === 0 ? `All ${care.length} acknowledged.` : `Not acknowledged: ${open.map(({ subject }) => subject).join(' ')}`,
    wayOut: 'The author reads and acknowledges each.',
  });
}

function groundsCheck({ revision, groundsByName }: RevisionRecord): ApprovalCheck {
  const passes = revision.grounds.trim() !== '' && groundsByName !== null;
  return check('grounds', 'Written grounds of a lead', {
    passes,
    found: passes ? `${groundsByName}: ${revision.grounds}` : 'It was not proved on coupons, and no lead has written why it may be used.',
    wayOut: 'A lead writes the grounds in the draft.',
  });
}

function changesCheck({ revision }: RevisionRecord, current: NonNullable<ApprovalFacts['current']>): ApprovalCheck {
  const changes = stepsDiff(current.steps, revision.content.steps);
  const words = changes.map(({ step, change, changes: items }) =>
    change === 'changed' ? `step ${step}: ${items.map(({ label }) => label.toLowerCase()).join(', ')}` : `step ${step} ${change}`,
  );
  const isEssential = hasEssentialChange(current.steps, revision.content.steps);
  const kind = isEssential ? 'Essential changes' : 'No essential change, so earlier evidence may be cited. Changed';
  return check('changes', 'Changes', {
    passes: true,
    isAdvisory: true,
    found: words.length === 0 ? `The same setting as revision ${current.number ?? ''}.` : `${kind}: ${words.join('; ')}.`,
  });
}

function profileCheck({ profile, presentPhysicalNumber, recipe }: RevisionRecord): ApprovalCheck {
  const passes = profile.physicalNumber === presentPhysicalNumber;
  return check('profile', 'Machine as proved', {
    passes,
    found: passes ? `${recipe.machine.name} is what it was.` : `${recipe.machine.name} has changed physically since this draft.`,
    wayOut: 'Make a new draft and prove it on the machine as it is now.',
  });
}

function scopeCheck({ record, mates }: ApprovalFacts): ApprovalCheck {
  const { scope } = record.revision.content;
  const overlapping = [...new Set(mates.filter((mate) => scopesOverlap(mate.scope, scope)).map(({ recipeCode }) => recipeCode))];
  return check('scope', 'One setting per part', {
    passes: overlapping.length === 0,
    found:
      overlapping.length === 0
        ? 'No other approved recipe covers the same parts.'
        : `${overlapping.join(', ')} covers some of the same parts with the same material, finish, effect, machine and lens.`,
    wayOut: 'Narrow the scope, or propose a change to that recipe.',
  });
}
