import { nextRevisionState, type RevisionState } from '@proofplate/recipe-model';
import fc from 'fast-check';
import type { RecipeDto } from '../src/recipes/dto/recipe.dto';
import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import { createTestApp, type TestApp } from './support/app';
import { typed } from './support/coupons';
import { created } from './support/equipment';
import { makeMember, type TestMember } from './support/factories';
import { acts, call, changeDraft, FOR_CUSTOMER, makeRecipeShop, type RecipeShop } from './support/recipes';

jest.setTimeout(300_000);

/** Enough to meet every arrow and every refusal many times over; the nightly figures are for a machine of its own. */
const SEQUENCES = 100;
const MOST_COMMANDS = 8;

type Who = 'operator' | 'lead' | 'second' | 'trainee' | 'foreign';
type Act = 'submit' | 'recall' | 'return' | 'approve' | 'withdraw' | 'edit' | 'discard' | 'copy';
type Known = { id: string; state: RevisionState; author: Who; editors: Who[]; seen: RecipeRevisionDto };
type Model = { revisions: Known[]; numbersGiven: number };
type Real = { recipeId: string };

let test: TestApp;
let shop: RecipeShop;
let people: Record<Who, TestMember>;
let lastScope = 0;

beforeAll(async () => {
  test = await createTestApp();
  shop = await makeRecipeShop(test);
  const elsewhere = await makeMember(test, (await makeRecipeShop(test)).shop, 'owner');
  people = {
    operator: shop.operator,
    lead: shop.lead,
    second: await makeMember(test, shop.shop, 'lead'),
    trainee: shop.trainee,
    foreign: elsewhere,
  };
});
afterAll(() => test.close());

const STEP = {
  purpose: 'anneal',
  values: {
    powerPercent: typed(30, 'percentFromZero'),
    speedMmPerS: typed(400, 'mm/s'),
    frequencyKhz: typed(400, 'kHz'),
    pulseWidthNs: typed(30, 'ns'),
    passes: typed(1, 'count'),
  },
  fill: 'outline',
  assist: 'none',
};

/** A recipe by another route, so that a sequence is about states and not about evidence; a lead has written the grounds. */
async function begin(): Promise<{ model: Model; real: Real }> {
  lastScope += 1;
  const body = { ...shop.keys, route: 'customer-given', reason: 'Given.', steps: [STEP], scope: FOR_CUSTOMER(`Model ${lastScope}`) };
  const drafted = await created<RecipeRevisionDto>(test, shop.operator, '/api/recipes', body);
  const seen = await changeDraft(test, shop.lead, drafted, { grounds: 'Customer drawing.' });
  return {
    model: { revisions: [{ id: seen.id, state: 'draft', author: 'operator', editors: [], seen }], numbersGiven: 0 },
    real: { recipeId: seen.recipe.id },
  };
}

const isLead = (who: Who) => who === 'lead' || who === 'second';
const leadOnly = (act: Act) => act === 'return' || act === 'approve' || act === 'withdraw';
const MOVES = { submit: 'submit', recall: 'recall', return: 'returnToAuthor', approve: 'approve', withdraw: 'withdraw' } as const;

/** The status that the rules ask for, in the order in which the api looks. */
function expectedStatus(model: Model, { act, who }: { act: Act; who: Who }, target: Known): number {
  if (who === 'trainee') return 403;
  if (leadOnly(act) && !isLead(who) && who !== 'foreign') return 403;
  if (who === 'foreign') return 404;
  if (act === 'copy') return model.revisions.some(({ state, author }) => state === 'draft' && author === who) ? 409 : 201;
  const own = target.author === who;
  if (act === 'edit' || act === 'discard') {
    if (target.state !== 'draft') return 409;
    return own || isLead(who) ? (act === 'edit' ? 200 : 204) : 403;
  }
  if (nextRevisionState(target.state, MOVES[act]).kind === 'refused') return 409;
  if ((act === 'submit' || act === 'recall') && !own) return 403;
  return act === 'approve' && (own || target.editors.includes(who)) ? 403 : 200;
}

async function perform({ act, who }: { act: Act; who: Who }, target: Known, { recipeId }: Real) {
  const member = people[who];
  const { submit, recall, giveBack, approve, withdraw } = acts(test, target.id);
  const version = target.seen.version;
  const url = `/revisions/${target.id}`;
  const ways = {
    submit: () => submit(member, target.seen),
    recall: () => recall(member),
    return: () => giveBack(member),
    approve: () => approve(member, target.seen),
    withdraw: () => withdraw(member),
    edit: () => call(test, member, { method: 'PATCH', url, version, payload: { reason: `By ${who}.` } }),
    discard: () => call(test, member, { method: 'DELETE', url, version }),
    copy: () => call(test, member, { method: 'POST', url: `/recipes/${recipeId}/drafts`, payload: { basedOnRevisionId: target.id } }),
  };
  return ways[act]();
}

/** What the model knows after an act that was allowed. */
function advance(model: Model, { act, who }: { act: Act; who: Who }, target: Known, seen: RecipeRevisionDto | undefined): void {
  if (act === 'discard') {
    model.revisions = model.revisions.filter((revision) => revision !== target);
    return;
  }
  if (seen === undefined) throw new Error('an act that is allowed answers with the revision');
  if (act === 'copy') {
    model.revisions.push({ id: seen.id, state: 'draft', author: who, editors: [], seen });
    return;
  }
  target.seen = seen;
  if (act === 'edit') {
    if (who !== target.author) target.editors.push(who);
    return;
  }
  if (act === 'approve') for (const revision of model.revisions) if (revision.state === 'approved') revision.state = 'superseded';
  const moved = nextRevisionState(target.state, MOVES[act]);
  if (moved.kind === 'moved') target.state = moved.state;
  if (act === 'submit') model.numbersGiven += 1;
}

/** The record agrees with the model: states, numbers without a gap, one approved revision at most. */
async function compare(model: Model, { recipeId }: Real): Promise<void> {
  const recipe = (await call(test, shop.lead, { url: `/recipes/${recipeId}` })).json<RecipeDto>();
  const stored = recipe.revisions.map(({ id, state }) => `${id} ${state}`).sort();
  expect(stored).toEqual(model.revisions.map(({ id, state }) => `${id} ${state}`).sort());
  const numbers = recipe.revisions.flatMap(({ number }) => (number === null ? [] : [number])).sort((a, b) => a - b);
  expect(numbers).toEqual(Array.from({ length: model.numbersGiven }, (_, index) => index + 1));
  expect(recipe.current?.id).toBe(model.revisions.find(({ state }) => state === 'approved')?.id);
}

class RevisionCommand implements fc.AsyncCommand<Model, Real> {
  constructor(
    readonly act: Act,
    readonly who: Who,
    readonly pick: number,
  ) {}

  check(model: Readonly<Model>): boolean {
    return model.revisions.length > 0;
  }

  async run(model: Model, real: Real): Promise<void> {
    const target = model.revisions[this.pick % model.revisions.length];
    if (target === undefined) throw new Error('there is a revision to act on');
    const expected = expectedStatus(model, this, target);
    const answer = await perform(this, target, real);
    // a draft that another one was copied from stays, which the table of moves does not know
    const isCited = this.act === 'discard' && answer.statusCode === 409 && answer.json<{ code: string }>().code === 'still-in-use';
    if (isCited) return;
    expect({ command: this.toString(), state: target.state, status: answer.statusCode }).toEqual({
      command: this.toString(),
      state: target.state,
      status: expected,
    });
    if (answer.statusCode < 300) advance(model, this, target, answer.statusCode === 204 ? undefined : await this.seenAfter(answer.json()));
  }

  /** A copy says nothing of its reason and grounds yet, and without them nothing is submitted; a lead gives grounds. */
  private async seenAfter(answered: RecipeRevisionDto): Promise<RecipeRevisionDto> {
    if (this.act !== 'copy') return answered;
    const reasoned = await changeDraft(test, people[this.who], answered, { reason: 'Proposed again.' });
    return changeDraft(test, people.lead, reasoned, { grounds: 'Customer drawing.' });
  }

  toString(): string {
    return `${this.who} ${this.act}s #${this.pick}`;
  }
}

const oftener = <Value>(values: readonly (readonly [Value, number])[]) =>
  fc.oneof(...values.map(([value, weight]) => ({ arbitrary: fc.constant(value), weight })));
const commands = fc
  .tuple(
    oftener<Act>([
      ['submit', 6],
      ['approve', 6],
      ['copy', 4],
      ['withdraw', 2],
      ['return', 2],
      ['recall', 2],
      ['edit', 2],
      ['discard', 1],
    ]),
    oftener<Who>([
      ['operator', 6],
      ['lead', 5],
      ['second', 3],
      ['trainee', 1],
      ['foreign', 1],
    ]),
    fc.nat(5),
  )
  .map(([act, who, pick]) => new RevisionCommand(act, who, pick));

it('the states of revisions move along the arrows only, whoever does what in which order', async () => {
  await fc.assert(
    fc.asyncProperty(fc.commands([commands], { maxCommands: MOST_COMMANDS }), async (sequence) => {
      const start = await begin();
      await fc.asyncModelRun(() => start, sequence);
      await compare(start.model, start.real);
    }),
    { numRuns: SEQUENCES, endOnFailure: true },
  );
});
