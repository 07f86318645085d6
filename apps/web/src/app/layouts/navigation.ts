import {
  CouponIcon,
  EquipmentIcon,
  type Icon,
  LedgerIcon,
  MachineIcon,
  MaterialIcon,
  PeopleIcon,
  RecipeIcon,
  RoundPartIcon,
  RunIcon,
  ShopIcon,
  SignOffIcon,
} from '../../components/icons';
import { paths } from '../../lib/paths';
import { ROLES } from '../../lib/roles';
import type { Role } from '../../lib/session';

export type NavigationEntry = {
  to: string;
  label: string;
  /** For the bottom bar, where a word has the width of a thumb. */
  shortLabel: string;
  icon: Icon;
  /** Place in the bottom bar for those who hold it often; the others stand under More. */
  group: 'work' | 'shop';
  from: Role;
};

const ROLE_ORDER: readonly Role[] = ROLES.map(({ value }) => value);
const BAR_PLACES = 4;

const ENTRIES: readonly NavigationEntry[] = [
  { to: paths.machine, label: 'At the machine', shortLabel: 'Machine', icon: MachineIcon, group: 'work', from: 'trainee' },
  { to: paths.coupons, label: 'Coupons', shortLabel: 'Coupons', icon: CouponIcon, group: 'work', from: 'operator' },
  { to: paths.recipes, label: 'Recipes', shortLabel: 'Recipes', icon: RecipeIcon, group: 'work', from: 'operator' },
  { to: paths.signOffs, label: 'Sign-off', shortLabel: 'Sign-off', icon: SignOffIcon, group: 'work', from: 'lead' },
  { to: paths.runs, label: 'Runs', shortLabel: 'Runs', icon: RunIcon, group: 'work', from: 'trainee' },
  { to: paths.partSetUp, label: 'Part set-up', shortLabel: 'Part', icon: RoundPartIcon, group: 'work', from: 'trainee' },
  { to: paths.equipment, label: 'Equipment', shortLabel: 'Equipment', icon: EquipmentIcon, group: 'shop', from: 'operator' },
  { to: paths.materials, label: 'Materials', shortLabel: 'Materials', icon: MaterialIcon, group: 'shop', from: 'operator' },
  { to: paths.people, label: 'People', shortLabel: 'People', icon: PeopleIcon, group: 'shop', from: 'lead' },
  { to: paths.ledger, label: 'Ledger', shortLabel: 'Ledger', icon: LedgerIcon, group: 'shop', from: 'operator' },
  { to: paths.shopSettings, label: 'Shop settings', shortLabel: 'Shop', icon: ShopIcon, group: 'shop', from: 'owner' },
];

/** The entries a role can use, in the order of the work. */
export function navigationFor(role: Role): readonly NavigationEntry[] {
  return ENTRIES.filter(({ from }) => ROLE_ORDER.indexOf(from) <= ROLE_ORDER.indexOf(role));
}

/** Up to four entries for the bottom bar (More is the fifth) and the rest. */
export function barFor(role: Role): { bar: readonly NavigationEntry[]; rest: readonly NavigationEntry[] } {
  const entries = navigationFor(role);
  const bar = entries.filter(({ group }) => group === 'work').slice(0, BAR_PLACES);
  return { bar, rest: entries.filter((entry) => !bar.includes(entry)) };
}
