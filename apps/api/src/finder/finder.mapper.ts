import { type Criterion, powerShift, showNumber } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import type { PhotoUrlsDto } from '../photos/dto/photo.dto';
import { asMeasured } from '../recipes/calibration-checks';
import type { PowerShiftDto } from '../recipes/dto/power-shift.dto';
import { revisionNumbers } from '../recipes/step-numbers';
import type { FinderAnswerDto, FinderKeysDto, FinderRecipeDto, ReferenceCellDto, ReferencePhotoDto } from './dto/finder.dto';
import { answerActions } from './finder.policy';
import type { AnswerRow, PhotoRow, ReferenceCellRow } from './finder-answers.repository';
import type { Candidate, SlotKey } from './finder-slots';

export type UrlsOf = (photo: PhotoRow) => PhotoUrlsDto | null;
export type NameOf = (id: string) => string;

export function toFinderRecipe(candidate: Candidate, nameOf: NameOf): FinderRecipeDto {
  const { recipeId, code, title, revisionNumber, keys } = candidate;
  return { recipeId, code, title, revisionNumber, ...namedKeys(keys, nameOf) };
}

export function toAnswer(
  candidate: Candidate,
  row: AnswerRow,
  { actor, nameOf, urlsOf }: { actor: Pick<Actor, 'role'>; nameOf: NameOf; urlsOf: UrlsOf },
): FinderAnswerDto {
  const blockedBecause = blockers(row);
  return {
    ...toFinderRecipe(candidate, nameOf),
    revisionId: row.revisionId,
    holds: row.holds.map((hold) => ({ ...hold, placedAt: iso(hold.placedAt) })),
    panel: row.panel,
    profileNumber: row.profileNumber,
    isProfilePresent: row.isProfilePresent,
    steps: row.content.steps,
    ...revisionNumbers(row.content.steps, row),
    setUpSteps: row.content.setUpSteps,
    limits: row.content.limits,
    scope: row.content.scope,
    focus: row.focus,
    reference: row.reference === null ? null : toReferenceCell(row.reference, urlsOf),
    route: row.route,
    signature: row.signature === null ? null : { ...row.signature, signedAt: iso(row.signature.signedAt) },
    holdsUntil: row.reviewDue === null ? null : iso(row.reviewDue),
    isOverdue: row.isOverdue,
    checkDue: checkDueOf(row),
    contentHash: row.contentHash,
    blockedBecause,
    allowedActions: answerActions(actor, { isBlocked: blockedBecause.length > 0, isHeld: row.holds.length > 0 }),
  };
}

export function toReferenceCell(row: ReferenceCellRow, urlsOf: UrlsOf): ReferenceCellDto {
  const { couponCode, address, plate, lot } = row;
  const criteria = row.criteria ?? [];
  const measurements = row.measurements.map((measurement) => ({ ...measurement, criterion: criterionFor(measurement.quantity, criteria) }));
  return { couponCode, address, plate, lot, measurements, photo: row.photo === null ? null : toReferencePhoto(row.photo, urlsOf) };
}

function toReferencePhoto(photo: PhotoRow, urlsOf: UrlsOf): ReferencePhotoDto {
  const { id, corners, widthPx, heightPx, capturedAt, createdAt } = photo;
  return { id, urls: urlsOf(photo), corners, widthPx, heightPx, takenAt: iso(capturedAt ?? createdAt) };
}

/** A later reading of the power meter that moves the watts by more than the policy allows; the setting itself stays as it was signed. */
function checkDueOf({ physical, content, calibration, laterReadings, powerShiftPercent }: AnswerRow): PowerShiftDto | null {
  if (calibration === null) return null;
  const newer = laterReadings.map((reading) => ({ ...asMeasured(reading), measuredOn: reading.measuredOn }));
  const shift = powerShift({ profile: physical, steps: content.steps, cited: asMeasured(calibration), newer });
  if (shift === null || Math.abs(shift.shiftPercent) <= powerShiftPercent) return null;
  return { ...shift, citedOn: calibration.measuredOn, limitPercent: powerShiftPercent, isCheckDue: true };
}

/** "at least 0.9": the quantity stands before it already. */
function criterionFor(quantity: string, criteria: readonly Criterion[]): string | null {
  const found = criteria.find((criterion) => criterion.quantity === quantity);
  if (found === undefined) return null;
  const { comparison, value, upper } = found;
  return upper === undefined ? `${comparison} ${showNumber(value)}` : `${comparison} ${showNumber(value)} and ${showNumber(upper)}`;
}

function blockers(row: AnswerRow): string[] {
  const held = row.holds.map(({ subject, reason }) => `A hold is on the ${subject}: ${reason}`);
  return row.isOverdue && row.overdueBlocks
    ? [...held, 'Its review is overdue, and the shop’s policy stops runs until it is proved again.']
    : held;
}

function namedKeys(keys: Candidate['keys'], nameOf: NameOf): FinderKeysDto {
  const named = (slot: SlotKey) => ({ id: keys[slot], name: nameOf(keys[slot]) });
  return { machine: named('machine'), lens: named('lens'), material: named('material'), finish: named('finish'), effect: named('effect') };
}

/** Times come out of JSON and of the driver as text with a zone. */
const iso = (time: string) => new Date(time).toISOString();
