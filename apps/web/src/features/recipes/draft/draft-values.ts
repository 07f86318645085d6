import { PANEL_UNITS } from '@proofplate/physics';
import { type EnteredValue, type ParameterKey, type Range, showNumber } from '@proofplate/recipe-model';
import { decimalSignOf, typedNumber } from '../../../lib/read-number';
import type { Revision } from '../recipes.api';

type Step = Revision['steps'][number];
type PanelField = Revision['profile']['panel']['fields'][number];

/** Everything that is typed into a draft, as text. */
export type DraftValues = {
  steps: StepValues[];
  setUpSteps: SetUpValues[];
  limits: { thicknessMm: RangeValues; partDiameterMm: RangeValues; notes: string };
  scope: {
    thicknessMm: RangeValues;
    partDiameterMm: RangeValues;
    featureKind: string;
    featureSizeMm: RangeValues;
    customerSpecification: string;
    materialGroupId: string;
  };
  reason: string;
  route: Revision['route'];
  grounds: string;
  effectiveFrom: string;
  reviewDue: string;
  calibrationId: string;
  acknowledged: string[];
};

export type RangeValues = { from: string; to: string };
export type SetUpValues = { text: string; caution: string; mustTick: boolean; photoId: string };
export type StepValues = {
  purpose: Step['purpose'];
  fill: Step['parameters']['fill'];
  assist: Step['parameters']['assist'];
  values: Partial<Record<ParameterKey, string>>;
  /** As stored: what is not typed anew is sent back exactly as it was entered. */
  stored: Partial<Record<ParameterKey, EnteredValue>>;
  delaysUs: Record<DelayName, string>;
  pauseAfterS: string;
};

export const DELAY_NAMES = ['laserOn', 'laserOff', 'jump', 'corner'] as const;
export type DelayName = (typeof DELAY_NAMES)[number];

export function draftValues(revision: Revision, locale: string): DraftValues {
  const { steps, setUpSteps, limits, scope, profile, cautions } = revision;
  return {
    steps: steps.map((step) => stepValues(step, profile.panel.fields, locale)),
    setUpSteps: setUpSteps.map(({ text, caution = '', mustTick, photoId = '' }) => ({ text, caution, mustTick, photoId })),
    limits: {
      thicknessMm: rangeValues(limits.thicknessMm, locale),
      partDiameterMm: rangeValues(limits.partDiameterMm, locale),
      notes: limits.notes,
    },
    scope: {
      thicknessMm: rangeValues(scope.thicknessMm, locale),
      partDiameterMm: rangeValues(scope.partDiameterMm, locale),
      featureKind: scope.featureKind ?? '',
      featureSizeMm: rangeValues(scope.featureSizeMm, locale),
      customerSpecification: scope.customerSpecification ?? '',
      materialGroupId: scope.materialGroupId ?? '',
    },
    reason: revision.reason,
    route: revision.route,
    grounds: revision.grounds,
    effectiveFrom: dayOf(revision.effectiveFrom),
    reviewDue: dayOf(revision.reviewDue),
    calibrationId: revision.calibration?.id ?? '',
    acknowledged: cautions.filter(({ isAcknowledged }) => isAcknowledged).map(({ id }) => id),
  };
}

export function stepValues(step: Step, fields: readonly PanelField[], locale: string): StepValues {
  const { values, fill, assist, delaysUs } = step.parameters;
  const stored = Object.fromEntries(Object.entries(values).map(([key, value]) => [key, value.entered]));
  const texts = fields.map((field) => {
    const value = values[field.parameter];
    return [field.parameter, value === undefined ? '' : storedText(value.entered, field, locale)];
  });
  return {
    purpose: step.purpose,
    fill,
    assist,
    values: Object.fromEntries(texts),
    stored,
    delaysUs: {
      laserOn: typedNumber(delaysUs?.laserOn, locale),
      laserOff: typedNumber(delaysUs?.laserOff, locale),
      jump: typedNumber(delaysUs?.jump, locale),
      corner: typedNumber(delaysUs?.corner, locale),
    },
    pauseAfterS: step.pauseAfterS === 0 ? '' : typedNumber(step.pauseAfterS, locale),
  };
}

/** An entered value as it stands in its field: the unit is added only where it is not the panel's own. */
export function storedText({ value, unit }: EnteredValue, field: Pick<PanelField, 'unit'>, locale: string): string {
  const text = showNumber(value, decimalSignOf(locale)).replace('−', '-');
  return unit === field.unit ? text : `${text} ${PANEL_UNITS[unit].symbol}`;
}

export function emptyStep(fields: readonly PanelField[]): StepValues {
  return {
    purpose: 'fill',
    fill: 'both directions',
    assist: 'none',
    values: Object.fromEntries(fields.map(({ parameter }) => [parameter, ''])),
    stored: {},
    delaysUs: { laserOn: '', laserOff: '', jump: '', corner: '' },
    pauseAfterS: '',
  };
}

function rangeValues(range: Range | undefined, locale: string): RangeValues {
  return { from: typedNumber(range?.from, locale), to: typedNumber(range?.to, locale) };
}

/** Day in UTC, as a date field holds it. */
function dayOf(time: string | null): string {
  return time === null ? '' : time.slice(0, 10);
}
