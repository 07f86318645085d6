/** What the ledger is searched by, under the names of the api. */
export type LedgerFilters = {
  readonly actorMemberId?: string | undefined;
  readonly action?: string | undefined;
  readonly subjectCode?: string | undefined;
  readonly subjectId?: string | undefined;
  readonly fromDay?: string | undefined;
  readonly toDay?: string | undefined;
};

export type FilterName = keyof LedgerFilters;

/** Names in the address: short, because people read and share them. */
const IN_ADDRESS: Readonly<Record<FilterName, string>> = {
  actorMemberId: 'who',
  action: 'action',
  subjectCode: 'code',
  subjectId: 'subjectId',
  fromDay: 'from',
  toDay: 'to',
};
export const FILTER_NAMES = Object.keys(IN_ADDRESS) as FilterName[];

const CODE = /^[A-Z]+-\d+( [A-Z]+\d+)?$/;

export function filtersFromAddress(search: URLSearchParams): LedgerFilters {
  return Object.fromEntries(
    FILTER_NAMES.flatMap((name) => {
      const value = search.get(IN_ADDRESS[name]) ?? '';
      return value === '' ? [] : [[name, value]];
    }),
  );
}

/** The address with one filter set anew, or without it. */
export function addressWith(search: URLSearchParams, name: FilterName, value: string): URLSearchParams {
  const next = new URLSearchParams(search);
  if (value === '') next.delete(IN_ADDRESS[name]);
  else next.set(IN_ADDRESS[name], value);
  return next;
}

export function withoutFilters(search: URLSearchParams): URLSearchParams {
  return FILTER_NAMES.reduce((next, name) => addressWith(next, name, ''), search);
}

/** "r-31 " becomes "R-31"; undefined is no code. */
export function readCode(typed: string): string | undefined {
  const code = typed.trim().toUpperCase();
  return CODE.test(code) ? code : undefined;
}
