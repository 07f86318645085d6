import { PARAMETERS, type ParameterClass, type ParameterKey } from '../vocabulary/parameters';

/** Everything in a parameter set or a step that can differ. */
export type SettingItem =
  | ParameterKey
  | 'fill'
  | 'assist'
  | 'laserOnDelayUs'
  | 'laserOffDelayUs'
  | 'jumpDelayUs'
  | 'cornerDelayUs'
  | 'purpose'
  | 'pauseAfterS';

const OTHER_ITEMS: Readonly<Record<Exclude<SettingItem, ParameterKey>, { label: string; class: ParameterClass }>> = {
  fill: { label: 'Fill', class: 'essential' },
  assist: { label: 'Assist', class: 'supplementary' },
  laserOnDelayUs: { label: 'Laser-on delay', class: 'non-essential' },
  laserOffDelayUs: { label: 'Laser-off delay', class: 'non-essential' },
  jumpDelayUs: { label: 'Jump delay', class: 'non-essential' },
  cornerDelayUs: { label: 'Corner delay', class: 'non-essential' },
  purpose: { label: 'Purpose of the step', class: 'supplementary' },
  pauseAfterS: { label: 'Pause after the step', class: 'supplementary' },
};

const STRICTNESS: readonly ParameterClass[] = ['non-essential', 'supplementary', 'essential'];

/** Classes that a shop states for itself. */
export type ShopClasses = Partial<Record<SettingItem, ParameterClass>>;

/** The words for an item of a setting. */
export function settingItemLabel(item: SettingItem): string {
  return meaningOf(item).label;
}

/** The class that counts: the shop's own where it is stricter, never where it is looser. */
export function parameterClassOf(item: SettingItem, shopClasses: ShopClasses = {}): ParameterClass {
  const ours = meaningOf(item).class;
  const theirs = shopClasses[item] ?? ours;
  return STRICTNESS.indexOf(theirs) > STRICTNESS.indexOf(ours) ? theirs : ours;
}

function meaningOf(item: SettingItem): { label: string; class: ParameterClass } {
  return isOther(item) ? OTHER_ITEMS[item] : PARAMETERS[item];
}

function isOther(item: SettingItem): item is Exclude<SettingItem, ParameterKey> {
  return Object.hasOwn(OTHER_ITEMS, item);
}
