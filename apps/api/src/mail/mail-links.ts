/** Addresses of pages that mail leads to. A secret stands in the fragment: browsers keep it from servers, logs and referrers. */
export function mailLinks(publicOrigin: string) {
  const page = (path: string, token?: string) => {
    const url = new URL(path, publicOrigin);
    if (token !== undefined) url.hash = new URLSearchParams({ token }).toString();
    return url.href;
  };
  return {
    acceptInvitation: (token: string) => page('/accept-invitation', token),
    resetPassword: (token: string) => page('/reset-password', token),
    revision: (recipeCode: string, revisionId: string) =>
      page(`/recipes/${encodeURIComponent(recipeCode)}/revisions/${encodeURIComponent(revisionId)}`),
    signOff: () => page('/sign-off'),
    run: (code: string) => page(`/runs/${encodeURIComponent(code)}`),
    atTheMachine: () => page('/'),
  };
}

export type MailLinks = ReturnType<typeof mailLinks>;
