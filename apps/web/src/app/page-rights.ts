import { paths } from '../lib/paths';
import type { Role } from '../lib/session';

type Right = {
  /** The address itself and all below it. */
  under: string;
  from: Role;
  /** Who can do more, in the words of the refusal. */
  what: string;
};

/** Which pages need a role, the narrower address before the wider. The api holds the rights; this keeps closed doors from looking open. */
const RIGHTS: readonly Right[] = [
  { under: paths.newMachine, from: 'lead', what: 'Leads add machines.' },
  { under: paths.newMaterial, from: 'lead', what: 'Leads add materials.' },
  { under: paths.coupons, from: 'operator', what: 'Operators and leads plan, mark and judge coupons.' },
  {
    under: paths.recipes,
    from: 'operator',
    what: 'Operators and leads read and draft recipes. Approved settings are found at the machine.',
  },
  { under: paths.equipment, from: 'operator', what: 'Operators and leads see machines and lenses.' },
  {
    under: paths.materials,
    from: 'operator',
    what: 'Operators and leads see materials. Cautions stand beside each setting at the machine.',
  },
  { under: paths.signOffs, from: 'operator', what: 'Operators see what waits for a signature; leads sign.' },
  { under: paths.people, from: 'lead', what: 'Leads and owners see who works here.' },
  { under: paths.ledger, from: 'operator', what: 'Operators and leads read the ledger.' },
  { under: paths.shopSettings, from: 'lead', what: 'Leads see the rules of the shop; owners change them.' },
];

/** What the page at this address asks for; undefined: everybody may see it. */
export function pageRight(pathname: string): Right | undefined {
  return RIGHTS.find(({ under }) => pathname === under || pathname.startsWith(`${under}/`));
}

/** The code or id in the address of a recipe, whose approved setting everybody may look up. */
export function recipeInAddress(pathname: string): string | undefined {
  const [, key] = /^\/recipes\/([^/]+)/.exec(pathname) ?? [];
  return key === undefined || key === 'new' ? undefined : decodeURIComponent(key);
}
