/** What each kind of mail needs to be written. One outbox row is one mail to one person. */
export type Recipient = { readonly name: string; readonly address: string };

type Addressed = { readonly to: Recipient; readonly shopName: string };
type AboutRevision = Addressed & {
  readonly recipeId: string;
  readonly revisionId: string;
  readonly recipeCode: string;
  readonly recipeTitle: string;
  readonly revisionNumber: number;
  /** Printed name of whoever did it. */
  readonly by: string;
};

export type MailPayloads = {
  /** `token` is taken out of the row as soon as the mail is sent. */
  readonly invitation: Addressed & {
    readonly invitedBy: string;
    readonly role: string;
    readonly token: string;
    readonly expiresAt: string;
  };
  readonly 'password-reset': Omit<Addressed, 'shopName'> & { readonly token: string; readonly expiresAt: string };
  readonly 'revision-submitted': AboutRevision & { readonly comment?: string };
  readonly 'revision-approved': AboutRevision & { readonly comment?: string };
  readonly 'revision-returned': AboutRevision & { readonly reason: string };
  /** `stayingNumber`: the approved revision that stays, where a scheduled one was withdrawn. */
  readonly 'revision-withdrawn': AboutRevision & { readonly reason: string; readonly stayingNumber: number | null };
  readonly 'hold-placed': Addressed & {
    /** What is held, as people call it: "R-0007 Dark mark on 316L" or the machine's name. */
    readonly subject: string;
    readonly reason: string;
    readonly by: string;
  };
  /** To every lead: what came out wrong at a machine. */
  readonly 'bad-result': Addressed & {
    readonly runCode: string;
    /** "R-0007 Dark mark on 316L, revision 2". */
    readonly setting: string;
    readonly machine: string;
    readonly jobReference: string;
    readonly outcome: string;
    readonly note: string;
    readonly by: string;
  };
};

export type MailKind = keyof MailPayloads;
export type Mail = { [K in MailKind]: { readonly kind: K; readonly payload: MailPayloads[K] } }[MailKind];
