import { PARAMETER_KEYS } from '@proofplate/recipe-model';
import { DELAYS } from '../../../components/setting-rows';
import type { Revision } from '../recipes.api';
import { fieldLabel } from './read-draft';

type PanelFields = Revision['profile']['panel']['fields'];

const WORDS: Readonly<Record<string, string>> = {
  purpose: 'Purpose of the step',
  fill: 'Fill',
  assist: 'Assist',
  pauseAfterS: 'Pause after it',
  text: 'What to do',
  caution: 'Caution beside it',
  mustTick: 'Must be ticked',
  photoId: 'Photo',
  thicknessMm: 'Thickness',
  partDiameterMm: 'Part diameter',
  featureKind: 'Kind of feature',
  featureSizeMm: 'Feature size',
  customerSpecification: 'Customer specification',
  materialGroupId: 'Material group',
  notes: 'Limits in words',
  from: 'from',
  to: 'to',
  reason: 'Reason for the change',
  route: 'How the setting was come by',
  grounds: 'Written grounds of a lead',
  effectiveFrom: 'Takes effect on',
  reviewDue: 'Re-prove by',
  calibrationId: 'Power table',
  limits: 'Limits of use',
  scope: 'What it covers',
};
/** Names of parts that only hold others. */
const UNSAID = new Set(['values', 'delaysUs', 'steps', 'setUpSteps']);

/** The name of a field of a draft in words: "steps.0.values.speedMmPerS" is "Step 1: Speed", by the panel's own label. */
export function fieldWords(name: string, fields: PanelFields): string {
  const path = name.split('.');
  const what = path[0] === 'setUpSteps' ? 'Set-up step' : 'Step';
  const step = path.find((part) => /^\d+$/.test(part));
  const words = path.filter((part) => part !== step && !UNSAID.has(part)).map((part) => partWords(part, fields));
  const said = words.join(' ');
  if (step === undefined) return said;
  return said === '' ? `${what} ${Number(step) + 1}` : `${what} ${Number(step) + 1}: ${said}`;
}

function partWords(part: string, fields: PanelFields): string {
  const parameter = PARAMETER_KEYS.find((key) => key === part);
  if (parameter !== undefined) return fieldLabel(parameter, fields);
  return WORDS[part] ?? DELAYS.find(({ key }) => key === part)?.label ?? part;
}
