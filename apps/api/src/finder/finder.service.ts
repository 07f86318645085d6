import { Injectable } from '@nestjs/common';
import { type Caution, MATERIAL_FAMILIES, matchesWords, SOURCE_KIND_LABELS } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { NotFoundError } from '../common/errors/domain-error';
import { Env } from '../config/env.validation';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { isGeneralCaution, orderedCautionsFor } from '../materials/caution-order';
import { PhotosService } from '../photos/photos.service';
import { whyNotCarriedOver } from './carry-over';
import type { FinderCautionDto, FinderDto, NearMissDto, SheetCodeDto, WithdrawnRecipeDto } from './dto/finder.dto';
import type { FinderQuery } from './dto/finder.query.dto';
import { type NameOf, toAnswer, toFinderRecipe, toReferenceCell, type UrlsOf } from './finder.mapper';
import { type CatalogueRow, FinderRepository, familyOf, type RecipeRow, sourceKindOf } from './finder.repository';
import { type AnswerRow, FinderAnswersRepository } from './finder-answers.repository';
import { type Candidate, fillSlots, fits, labelsBy, type Sentence, SLOT_KEYS, type SlotChoice, type SlotItem } from './finder-slots';
import { type NearMiss, nearByWords, nearMisses } from './near-misses';
import { qrModules } from './sheet-code';

const MOST_MATCHES = 12;

/** What the sentence was asked against: the whole of the shop that the finder reads. */
type Ground = {
  readonly choice: SlotChoice;
  readonly rows: readonly RecipeRow[];
  readonly candidates: readonly Candidate[];
  readonly catalogue: ReadonlyMap<string, CatalogueRow>;
  readonly nameOf: NameOf;
};

/** What the sentence says, and by which words a recipe is found. */
type Asked = {
  readonly choice: SlotChoice;
  readonly words: string;
  readonly recipe: string | undefined;
  readonly labelOf: (candidate: Candidate) => string;
};

@Injectable()
export class FinderService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly finder: FinderRepository,
    private readonly answers: FinderAnswersRepository,
    private readonly photos: PhotosService,
    private readonly env: Env,
  ) {}

  /** The code only carries the address; who scans it needs a session of the shop to see anything. */
  sheetCode(recipeId: string): SheetCodeDto {
    const url = new URL('/machine', this.env.PUBLIC_ORIGIN);
    url.searchParams.set('recipe', recipeId);
    return { url: url.href, modules: qrModules(url.href) };
  }

  /** Completes the sentence: options with counts, and the one approved setting or what comes nearest. At most four queries. */
  async find(actor: Actor, query: FinderQuery): Promise<FinderDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const ground = await this.ground(tx, actor.shopId, query);
      const items = itemsOf(ground.catalogue);
      const asked: Asked = { choice: ground.choice, words: query.words ?? '', recipe: query.recipeId, labelOf: labelsBy(items) };
      const sentence = fillSlots(ground.candidates, items, asked);
      const only = onlyMatch(sentence, query);
      const cautions = cautionsOf(await this.finder.cautions(tx, actor.shopId), ground, only);
      const isForbidden = cautions.some(({ level }) => level === 'never');
      const near = sentence.matches.length > 0 || isForbidden ? [] : nearest(ground, asked);
      const wanted = only === undefined || isForbidden ? near.map(({ candidate }) => candidate) : [only];
      const found = await this.answers.answers(
        tx,
        actor.shopId,
        wanted.map(({ revisionId }) => revisionId),
      );
      const rowOf = (candidate: Candidate) => found.find(({ revisionId }) => revisionId === candidate.revisionId);
      return {
        ...headOf(sentence, ground),
        approvedCount: ground.candidates.length,
        cautions: cautions.map(toFinderCaution),
        isForbidden,
        answer: only === undefined || isForbidden ? null : this.answerOf(actor, only, rowOf(only), ground.nameOf),
        withdrawn: only === undefined ? withdrawnOf(ground, sentence, asked) : [],
        nearMisses: near.map((miss) => toNearMiss(miss, rowOf(miss.candidate), { ground, urlsOf: this.urlsOf })),
      };
    });
  }

  private readonly urlsOf: UrlsOf = (photo) => this.photos.urlsOf(photo);

  private answerOf(actor: Actor, candidate: Candidate, row: AnswerRow | undefined, nameOf: NameOf) {
    // withdrawn or superseded between two of the queries: the next look shows what holds then
    return row === undefined ? null : toAnswer(candidate, row, { actor, nameOf, urlsOf: this.urlsOf });
  }

  private async ground(tx: Tx, shopId: string, query: FinderQuery): Promise<Ground> {
    const catalogueRows = await this.finder.catalogue(tx, shopId);
    const catalogue = new Map(catalogueRows.map((row) => [row.id, row]));
    const choice = choiceOf(query);
    for (const slot of SLOT_KEYS) {
      const id = choice[slot];
      if (id !== undefined && catalogue.get(id)?.slot !== slot)
        throw new NotFoundError(`This ${slot} is not in the shop, or no longer. Choose it again.`);
    }
    const rows = (await this.finder.recipes(tx, shopId)).filter((row) => keyIds(row).every((id) => catalogue.has(id)));
    const candidates = rows.filter(({ state }) => state === 'approved').map(toCandidate);
    return { choice, rows, candidates, catalogue, nameOf: (id) => catalogue.get(id)?.name ?? '' };
  }
}

function toFinderCaution(caution: Caution): FinderCautionDto {
  const { id, level, subject, text, source } = caution;
  return { id, level, subject, text, source, isGeneral: isGeneralCaution(caution) };
}

/** By its id, or by the code that people read. */
const isNamed = ({ recipeId, code }: Candidate, recipe: string) => recipe === recipeId || recipe === code;

/** The recipe that answers: the only one left, and only if the part was named. */
function onlyMatch({ matches }: Sentence, query: FinderQuery): Candidate | undefined {
  const { recipeId } = query;
  if (recipeId !== undefined) return matches.find((candidate) => isNamed(candidate, recipeId));
  const isPartNamed = query.materialId !== undefined || (query.words ?? '') !== '';
  return isPartNamed && matches.length === 1 ? matches[0] : undefined;
}

function headOf({ slots, matches }: Sentence, { nameOf }: Ground): Pick<FinderDto, 'slots' | 'matchCount' | 'matches'> {
  const open = (slot: Sentence['slots']['machine']) => ({ ...slot, options: [...slot.options] });
  return {
    slots: {
      machine: open(slots.machine),
      lens: open(slots.lens),
      material: open(slots.material),
      finish: open(slots.finish),
      effect: open(slots.effect),
    },
    matchCount: matches.length,
    matches: matches.slice(0, MOST_MATCHES).map((candidate) => toFinderRecipe(candidate, nameOf)),
  };
}

/** Cautions of the answered work, else of what is chosen so far: a material that must not be marked says so before a recipe is found. */
function cautionsOf(cautions: readonly Caution[], { choice, catalogue, rows }: Ground, only: Candidate | undefined): Caution[] {
  const keys: SlotChoice = only === undefined ? choice : { ...only.keys, material: choice.material ?? only.keys.material };
  const material = keys.material === undefined ? undefined : catalogue.get(keys.material);
  if (material === undefined) return [];
  const [machine, effect] = [catalogue.get(keys.machine ?? ''), catalogue.get(keys.effect ?? '')];
  const isRound = rows.find(({ recipeId }) => recipeId === only?.recipeId)?.isRound ?? false;
  return orderedCautionsFor(
    {
      family: familyOf(material),
      materialId: material.id,
      roundPart: isRound,
      ...(keys.finish === undefined ? {} : { finishId: keys.finish }),
      ...(machine === undefined ? {} : { sourceKind: sourceKindOf(machine) }),
      ...(effect === undefined ? {} : { effectKey: effect.kind }),
    },
    cautions,
  );
}

/** Nothing answers: what comes nearest to the chosen slots, or to the typed words where the material is still open. */
function nearest({ candidates, choice, catalogue }: Ground, asked: Asked): NearMiss[] {
  if (choice.material === undefined && asked.words !== '') return nearByWords(candidates, asked, asked.labelOf);
  return nearMisses(candidates, choice, (id) => catalogue.get(id)?.kind);
}

/** What was withdrawn of what was asked for: the recipe that an address names, else all that fit a sentence which nothing answers. */
function withdrawnOf({ rows, nameOf }: Ground, { matches }: Sentence, { choice, words, recipe, labelOf }: Asked): WithdrawnRecipeDto[] {
  if (recipe === undefined && matches.length > 0) return [];
  return rows
    .filter((row) => row.state === 'withdrawn')
    .filter((row) =>
      recipe === undefined
        ? fits(toCandidate(row), choice) && matchesWords(words, labelOf(toCandidate(row)))
        : isNamed(toCandidate(row), recipe),
    )
    .slice(0, MOST_MATCHES)
    .map((row) => ({
      ...toFinderRecipe(toCandidate(row), nameOf),
      by: row.withdrawal?.by ?? null,
      at: row.withdrawal === null ? null : new Date(row.withdrawal.at).toISOString(),
      reason: row.withdrawal?.reason ?? '',
    }));
}

function toNearMiss(
  { candidate, differs, missingWords }: NearMiss,
  row: AnswerRow | undefined,
  { ground, urlsOf }: { ground: Ground; urlsOf: UrlsOf },
): NearMissDto {
  const { choice, nameOf } = ground;
  const wantedMachine = differs.includes('machine') ? ground.catalogue.get(choice.machine ?? '') : undefined;
  const nameIn = (slot: (typeof SLOT_KEYS)[number]) => ({ has: nameOf(candidate.keys[slot]), wanted: nameOf(choice[slot] ?? '') });
  const whyNot =
    row === undefined
      ? ''
      : whyNotCarriedOver({
          differs,
          steps: row.content.steps,
          proved: { name: nameOf(candidate.keys.machine), physical: row.physical },
          wanted: wantedMachine?.physical == null ? null : { name: wantedMachine.name, physical: wantedMachine.physical },
          lens: nameIn('lens'),
        });
  return {
    ...toFinderRecipe(candidate, nameOf),
    differs: differs.map((slot) => ({ slot, ...nameIn(slot) })),
    missingWords: [...missingWords],
    whyNot,
    reference: row == null || row.reference === null ? null : toReferenceCell(row.reference, urlsOf),
  };
}

function choiceOf({ machineId, lensId, materialId, finishId, effectId }: FinderQuery): SlotChoice {
  return {
    ...(machineId === undefined ? {} : { machine: machineId }),
    ...(lensId === undefined ? {} : { lens: lensId }),
    ...(materialId === undefined ? {} : { material: materialId }),
    ...(finishId === undefined ? {} : { finish: finishId }),
    ...(effectId === undefined ? {} : { effect: effectId }),
  };
}

const keyIds = ({ machineId, lensId, materialId, finishId, effectId }: RecipeRow) => [machineId, lensId, materialId, finishId, effectId];

function toCandidate(row: RecipeRow): Candidate {
  const { recipeId, code, title, revisionId, revisionNumber, groupMaterialIds } = row;
  const keys = { machine: row.machineId, lens: row.lensId, material: row.materialId, finish: row.finishId, effect: row.effectId };
  return { recipeId, code, title, revisionId, revisionNumber, keys, materialIds: [...new Set([row.materialId, ...groupMaterialIds])] };
}

function itemsOf(catalogue: ReadonlyMap<string, CatalogueRow>): SlotItem[] {
  return [...catalogue.values()].map((row) => ({
    slot: row.slot,
    id: row.id,
    name: row.name,
    detail: detailOf(row),
    searchText: row.slot === 'material' ? [row.words, familyWords(row)].join(' ') : row.words,
  }));
}

/** Other words for the family. Grades are left out: "6061" must not find a 5083 because both are aluminium. */
function familyWords(row: CatalogueRow): string {
  const { label, synonyms } = MATERIAL_FAMILIES[familyOf(row)];
  return [label, ...synonyms.filter((synonym) => !/\d/u.test(synonym))].join(' ');
}

function detailOf(row: CatalogueRow): string {
  if (row.slot === 'machine') return SOURCE_KIND_LABELS[sourceKindOf(row)];
  if (row.slot === 'material') return MATERIAL_FAMILIES[familyOf(row)].label;
  return row.slot === 'lens' ? `${row.kind} mm` : '';
}
