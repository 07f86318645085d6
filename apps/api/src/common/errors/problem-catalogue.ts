/** What a problem type means and how to get past it. docs/problems.md lists the same texts; a test compares both. */
export type ProblemText = { readonly title: string; readonly status: number; readonly meaning: string };

const problem = (status: number, title: string, meaning: string): ProblemText => ({ status, title, meaning });

/** Problem types by code, the last part of their `type` URI. A module that adds an error class adds its line here. */
export const PROBLEMS: Readonly<Record<string, ProblemText>> = {
  'bad-request': problem(
    400,
    'The request cannot be read',
    'The body is no JSON, or a header field has a form that this server does not know. Repair it.',
  ),
  'idempotency-key-required': problem(
    400,
    'This call needs an Idempotency-Key',
    'Creating and signing calls carry the header Idempotency-Key: 8 to 128 visible characters, new for each act, the same for each retry.',
  ),
  'not-signed-in': problem(401, 'Sign in first', 'The access token is missing, wrong or over. Refresh the session or sign in again.'),
  'wrong-credentials': problem(401, 'E-mail or password is not right', 'Check both. A forgotten password can be reset by mail.'),
  'session-over': problem(401, 'This session is over', 'It was ended, replaced or has run out. Sign in again.'),
  'not-permitted': problem(403, 'Your role does not allow this', 'Ask an owner of the shop for the act or for another role.'),
  'wrong-origin': problem(403, 'The request came from another site', 'Session calls are accepted from the pages of this server only.'),
  'no-shop': problem(403, 'You are in no shop', 'Ask for an invitation, or sign up a shop of your own.'),
  'password-not-confirmed': problem(403, 'The password is not right', 'A signed act needs the password of the person who signs.'),
  'self-approval': problem(
    403,
    'Nobody approves what they wrote',
    'Another lead signs it. The policy of the shop may allow authors to sign; the signature then says so.',
  ),
  'not-your-process': problem(403, 'You do not sign for this process', 'Ask a lead who is named for it, or the owner.'),
  'not-found': problem(
    404,
    'There is no such thing here',
    'It does not exist in this shop, or no longer. Other shops’ things are never shown.',
  ),
  'method-not-allowed': problem(405, 'This cannot be done here', 'The address exists, but not for this method.'),
  conflict: problem(409, 'This clashes with what is stored', 'Look at the present state, then decide again.'),
  'already-exists': problem(409, 'This exists already', 'Something with the same name or key is stored. Use it, or choose another name.'),
  'still-in-use': problem(409, 'Something else refers to this', 'Remove or change what refers to it first, or archive it.'),
  'request-in-flight': problem(
    409,
    'The same request is still being worked on',
    'Send it again in a moment with the same Idempotency-Key.',
  ),
  'last-owner': problem(409, 'A shop keeps at least one owner', 'Make somebody else an owner first.'),
  'already-member': problem(409, 'This person is in the shop already', 'Change the role of the member instead of inviting again.'),
  'invitation-not-usable': problem(409, 'This invitation cannot be used', 'It was used, taken back or has run out. Ask for a new one.'),
  'reset-not-usable': problem(409, 'This link cannot be used', 'It was used or has run out. Ask for a new one.'),
  'address-taken': problem(
    409,
    'The address cannot be used for a new shop',
    'Sign in with it, or reset its password, or use another address.',
  ),
  'coupon-sealed': problem(
    409,
    'The coupon is sealed',
    'A sealed coupon and its photos never change. Add a correction, or mark a new coupon.',
  ),
  'photo-not-ready': problem(409, 'The photo is not ready', 'Wait until it is processed. A refused photo says what to do instead.'),
  'never-mark': problem(
    409,
    'This must not be marked',
    'A caution of the shop says never. The answer carries it with its reason and source. Choose another material, or ask the laser safety officer.',
  ),
  'caution-loosened': problem(
    409,
    'A caution only gets tighter',
    'Nobody loosens or removes a caution. Add one of the shop’s own beside it.',
  ),
  'coupon-state': problem(
    409,
    'The coupon is past this, or not there yet',
    'Load the coupon again: it goes from planned to marked, inspected and sealed.',
  ),
  'criteria-first': problem(
    409,
    'Record the acceptance criteria first',
    'Criteria are recorded before anything is rated or measured, so that results cannot bend them.',
  ),
  'criteria-fixed': problem(
    409,
    'The criteria stay as they were recorded',
    'Something was rated or measured already. Plan another coupon to judge by other criteria.',
  ),
  'inspection-incomplete': problem(
    409,
    'The inspection is not complete',
    'The answer lists everything that is missing. Rate each cell, or say why nobody does.',
  ),
  'not-ready-to-seal': problem(409, 'The coupon cannot be sealed yet', 'The answer lists everything that is missing.'),
  'on-hold': problem(409, 'This is on hold', 'The answer carries every hold with its reason. Nothing starts until a lead releases it.'),
  'not-approved': problem(
    409,
    'This revision is not approved',
    'Parts are marked with approved revisions only. A confirmation run proves a draft or a revision in review.',
  ),
  'review-overdue': problem(
    409,
    'The setting has to be proved again first',
    'The day of its review is past, and the shop’s policy stops runs until it is proved again.',
  ),
  'run-finished': problem(409, 'The run is finished', 'A finished run never changes. A bad result can still be told.'),
  'first-piece-not-released': problem(
    409,
    'The first piece was not released',
    'Compare the first piece with the mark to match and release it, or count every part as scrap.',
  ),
  'deviation-over': problem(
    409,
    'The deviation does not cover this',
    'It has ended by time or quantity. Ask a lead for a new one, or mark as the setting says.',
  ),
  'hold-state': problem(
    409,
    'The hold is not in the state for this',
    'A thing has one open hold at most, and a released one stays released.',
  ),
  'request-answered': problem(409, 'This request has its answer', 'Load the list again: somebody answered it or took it back.'),
  'revision-state': problem(
    409,
    'The revision is not in the state for this',
    'The answer carries the present state. A submitted revision never changes: a new draft copies it.',
  ),
  'checks-fail': problem(
    409,
    'Something that an approval needs is missing',
    'The answer lists every check that fails under checks, each with the way out.',
  ),
  'draft-open': problem(409, 'You have an open draft of this recipe', 'Go on with it (its id is in revisionId), or discard it first.'),
  'transfer-not-equivalent': problem(
    409,
    'What comes nearest is not equivalent',
    'The answer says why under reasons. Send acceptNotEquivalent to draft it all the same, or choose another machine or lens.',
  ),
  'group-signed': problem(
    409,
    'The group is part of what was submitted',
    'The answer names the recipes that cover the group. Make another group with the material, and propose a change that covers it.',
  ),
  'scope-signed': problem(409, 'The scope is part of what was submitted', 'Propose a change and set the scope in its draft.'),
  'stale-version': problem(
    412,
    'Somebody changed this in the meantime',
    'The answer carries the present state. Look at it, then make the change again.',
  ),
  'stale-revision': problem(
    412,
    'The revision is not what was shown',
    'Nothing was signed. The answer carries the revision as it is now; look at it, then decide again.',
  ),
  'too-large': problem(413, 'This is too large', 'Send less at once. The limits are 256 kB for data and 25 MB for a photo.'),
  'unsupported-type': problem(415, 'This kind of content is not accepted', 'Send JSON, or a photo as form data where a photo is expected.'),
  'unsupported-photo': problem(
    415,
    'This is not a photo that can be kept',
    'Send a JPEG, PNG or WebP picture, as form data with one field named file.',
  ),
  'heic-photo': problem(
    415,
    'HEIC photos cannot be opened here',
    'Set the phone’s camera to save JPEG and take the photo again, or open it on the phone and share or export it as JPEG.',
  ),
  'invalid-fields': problem(422, 'Some fields need another look', 'Each entry of errors names one field and says how to put it right.'),
  'not-ready-to-start': problem(
    422,
    'The run cannot start yet',
    'Each entry of errors names what is missing: the lens that must be fitted, or a set-up step that must be ticked.',
  ),
  'transfer-not-possible': problem(
    422,
    'There is no setting to draft',
    'Each entry of errors says what is missing of the source or the target, and where to enter it.',
  ),
  'idempotency-key-reused': problem(422, 'This Idempotency-Key belongs to another request', 'Use a new key for a new act.'),
  'version-required': problem(428, 'Say which version you are changing', 'Edits carry the header If-Match with the ETag that was read.'),
  'too-many-tries': problem(429, 'Too many tries', 'Wait for the time named in Retry-After.'),
  'internal-error': problem(
    500,
    'Something went wrong on our side',
    'It was written down under the id in instance. Try again; tell the id to whoever runs this server.',
  ),
  'try-again': problem(503, 'Too busy at the moment', 'Nothing was changed. Try again after the time named in Retry-After.'),
  'storage-unavailable': problem(
    503,
    'Photos cannot be stored or read at the moment',
    'Everything else works. Try the photo again after the time named in Retry-After.',
  ),
  'took-too-long': problem(
    503,
    'This took too long',
    'The request was given up at its deadline. Read the present state before trying again.',
  ),
};
