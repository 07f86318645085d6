// Every address of the application, so that a renamed page is renamed once.

export const paths = {
  home: '/',
  machine: '/machine',
  machineWith: (recipeId: string) => `/machine?recipe=${encodeURIComponent(recipeId)}`,
  setUpSheet: (recipeId: string) => `/machine/sheet?recipe=${encodeURIComponent(recipeId)}`,
  coupons: '/coupons',
  planCoupon: '/coupons/plan',
  importCoupon: '/coupons/import',
  coupon: (code: string) => `/coupons/${encodeURIComponent(code)}`,
  markCoupon: (code: string) => `/coupons/${encodeURIComponent(code)}/mark`,
  recipes: '/recipes',
  newRecipe: '/recipes/new',
  recipe: (code: string) => `/recipes/${encodeURIComponent(code)}`,
  recipeRevision: (recipeId: string, revisionId: string) =>
    `/recipes/${encodeURIComponent(recipeId)}/revisions/${encodeURIComponent(revisionId)}`,
  transferRevision: (recipeId: string, revisionId: string) =>
    `/recipes/${encodeURIComponent(recipeId)}/revisions/${encodeURIComponent(revisionId)}/transfer`,
  /** Of the approved revision. */
  transferRecipe: (code: string) => `/recipes/${encodeURIComponent(code)}/transfer`,
  compareRevisions: (code: string) => `/recipes/${encodeURIComponent(code)}/compare`,
  signOffs: '/sign-off',
  signOff: (revisionId: string) => `/sign-off/${encodeURIComponent(revisionId)}`,
  runs: '/runs',
  /** The runs of one recipe; the code is what the list calls it. */
  runsOf: ({ id, code }: { id: string; code: string }) => `/runs?recipeId=${encodeURIComponent(id)}&recipe=${encodeURIComponent(code)}`,
  startRun: (revisionId: string) => `/runs/start?revision=${encodeURIComponent(revisionId)}`,
  requests: '/requests',
  run: (code: string) => `/runs/${encodeURIComponent(code)}`,
  partSheet: (code: string) => `/runs/${encodeURIComponent(code)}/part`,
  partSetUp: '/part-set-up',
  partOfRun: (code: string) => `/part-set-up?run=${encodeURIComponent(code)}`,
  partOfRevision: (revisionId: string) => `/part-set-up?revision=${encodeURIComponent(revisionId)}`,
  equipment: '/equipment',
  newMachine: '/equipment/machines/new',
  editMachine: (id: string) => `/equipment/machines/${encodeURIComponent(id)}/edit`,
  machineDetail: (id: string) => `/equipment/machines/${encodeURIComponent(id)}`,
  materials: '/materials',
  newMaterial: '/materials/new',
  finishes: '/materials/finishes',
  materialGroups: '/materials/groups',
  effects: '/materials/effects',
  cautions: '/materials/cautions',
  material: (id: string) => `/materials/${encodeURIComponent(id)}`,
  people: '/people',
  person: (id: string) => `/people/${encodeURIComponent(id)}`,
  ledger: '/ledger',
  /** Every event of the thing with this code. */
  ledgerOf: (code: string) => `/ledger?code=${encodeURIComponent(code)}`,
  shopSettings: '/shop-settings',
  /** What the numbers mean. */
  scienceIndex: '/science',
  science: (page: string) => `/science/${encodeURIComponent(page)}`,
  account: '/account',
  more: '/more',
  signIn: '/sign-in',
  signUp: '/sign-up',
  acceptInvitation: '/accept-invitation',
  forgotPassword: '/forgot-password',
  resetPassword: '/reset-password',
} as const;

/** The sign-in page that leads back to where the person was. */
export function signInFrom(here: string): string {
  return here === paths.home ? paths.signIn : `${paths.signIn}?next=${encodeURIComponent(here)}`;
}

/** A `next` address of our own; anything else leads home, so that a crafted link cannot send a person elsewhere. */
export function safeNext(next: string | null): string {
  if (next === null || !/^\/(?![/\\])/.test(next)) return paths.home;
  return next;
}
