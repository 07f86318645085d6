import { schema } from '@proofplate/db';
import type { Caution, Criterion, MaterialFamily } from '@proofplate/recipe-model';
import { and, eq } from 'drizzle-orm';
import { authored, inTurn, minutesAfter, type Stage, type Turn } from '../stage/stage';
import type { Cast, Effect, FinishKey, Material, MaterialKey, People } from './cast';
import { teller } from './shop';

const { caution, effect, finish, material } = schema;

const BEGIN = new Date('2026-01-16T09:00:00Z');

type MaterialSpec = {
  readonly name: string;
  readonly family: MaterialFamily;
  readonly grade?: string;
  readonly standardDesignation?: string;
  readonly thicknessMm?: number;
  readonly notes?: string;
};
const MATERIALS: Readonly<Record<MaterialKey, MaterialSpec>> = {
  'black anodised': { name: 'Black anodised 6061', family: 'aluminium', grade: '6061', standardDesignation: 'EN AW-6061', thicknessMm: 2 },
  'clear anodised': { name: 'Clear anodised 6061', family: 'aluminium', grade: '6061', standardDesignation: 'EN AW-6061', thicknessMm: 2 },
  '316L': { name: '316L', family: 'stainless-steel', grade: '316L', standardDesignation: '1.4404', thicknessMm: 1.5 },
  brass: { name: 'Brass CuZn37', family: 'brass', grade: 'CuZn37', standardDesignation: 'CW508L', thicknessMm: 3 },
  titanium: { name: 'Titanium grade 2', family: 'titanium', grade: 'grade 2', standardDesignation: '3.7035', thicknessMm: 0.8 },
  'powder coat': {
    name: 'Powder coat on 5083',
    family: 'aluminium',
    grade: '5083',
    thicknessMm: 3,
    notes: 'Polyester coat, 70 µm, blue. Ask for its safety data sheet.',
  },
  acrylic: { name: 'Cast acrylic 5 mm', family: 'acrylic', thicknessMm: 5 },
  slate: { name: 'Slate', family: 'stone', thicknessMm: 7 },
  vinyl: { name: 'Vinyl film, self-adhesive', family: 'pvc', thicknessMm: 0.1, notes: 'PVC. Listed so that nobody marks it by mistake.' },
  'not stated': { name: 'Plastic of a published table, not stated', family: 'unknown', notes: 'Nothing but the table is known.' },
};
type FinishSpec = { readonly name: string; readonly preparation: string; readonly treatment: string };
const FINISHES: Readonly<Record<FinishKey, FinishSpec>> = {
  'sealed satin': { name: 'Sealed satin', preparation: 'Wiped with isopropanol, dry', treatment: 'Dry wipe' },
  'sealed matt': { name: 'Sealed matt', preparation: 'Wiped with isopropanol, dry', treatment: 'Dry wipe' },
  brushed: { name: 'Brushed', preparation: 'Degreased; grain along x', treatment: 'Passivate where the drawing asks for it' },
  'bead blasted': { name: 'Bead blasted', preparation: 'Degreased', treatment: 'Passivate where the drawing asks for it' },
  turned: { name: 'Turned', preparation: 'Degreased', treatment: 'Brush, wax' },
  lacquered: { name: 'Lacquered', preparation: 'Wiped dry', treatment: '' },
  'blue gloss': { name: 'Blue gloss', preparation: 'Wiped dry', treatment: 'Wipe off the dust' },
  'as supplied': { name: 'As supplied', preparation: 'Film peeled off', treatment: 'Soft cloth' },
  riven: { name: 'Riven, natural', preparation: 'Brushed, dry', treatment: 'Soft brush' },
};

export async function fillCatalogue(
  stage: Stage,
  people: People,
  starter: { readonly cautions: readonly Caution[]; readonly effects: ReadonlyMap<string, Effect> },
): Promise<Pick<Cast, 'materials' | 'finishes' | 'effects' | 'cautions'>> {
  const by = teller(people.lead);
  const materials = await inTurn(stage, { at: BEGIN, by }, (turn) => addAll(MATERIALS, (spec) => addMaterial(turn, spec)));
  const finishes = await inTurn(stage, { at: minutesAfter(BEGIN, 20), by }, (turn) => addAll(FINISHES, (spec) => addFinish(turn, spec)));
  const effects = await inTurn(stage, { at: minutesAfter(BEGIN, 40), by }, (turn) => setCriteria(turn, starter.effects));
  const own = await inTurn(stage, { at: minutesAfter(BEGIN, 60), by }, (turn) => addCautions(turn, finishes));
  return { materials, finishes, effects, cautions: [...starter.cautions, ...own] };
}

/** The same keys with what was made of each. */
async function addAll<Key extends string, Spec, Made>(
  specs: Readonly<Record<Key, Spec>>,
  add: (spec: Spec) => Promise<Made>,
): Promise<Record<Key, Made>> {
  const made: Partial<Record<Key, Made>> = {};
  // Object.keys is typed string[]; the record has no other keys.
  for (const key of Object.keys(specs) as Key[]) made[key] = await add(specs[key]);
  // every key was filled just now
  return made as Record<Key, Made>;
}

async function addMaterial(turn: Turn, spec: MaterialSpec): Promise<Material> {
  const { name, family } = spec;
  const id = turn.newId();
  const supplier = 'Invented supplier';
  await turn.tx.insert(material).values({ ...authored(turn), id, supplier, ...spec });
  await turn.tell({ action: 'material.created', subjectType: 'material', subjectId: id, after: { supplier, ...spec } });
  return { id, name, family };
}

async function addFinish(turn: Turn, spec: FinishSpec): Promise<{ id: string; name: string }> {
  const id = turn.newId();
  await turn.tx.insert(finish).values({ ...authored(turn), id, ...spec });
  await turn.tell({ action: 'finish.created', subjectType: 'finish', subjectId: id, after: spec });
  return { id, name: spec.name };
}

const EVEN: Criterion = { quantity: 'evenness', comparison: 'at least', value: 90, unit: '%' };
const WIPES: Criterion = { quantity: 'wipe-test', comparison: 'at least', value: 20, unit: '×' };
/** Where the shop set the shipped starting values to what its parts need. */
const OWN_CRITERIA: Readonly<Record<string, readonly Criterion[]>> = {
  'dark-anneal': [
    { quantity: 'lightness', comparison: 'at most', value: 32, unit: '1' },
    { quantity: 'contrast', comparison: 'at least', value: 0.8, unit: '1' },
    EVEN,
    WIPES,
  ],
  'dye-bleaching': [
    { quantity: 'lightness', comparison: 'at least', value: 74, unit: '1' },
    { quantity: 'contrast', comparison: 'at least', value: 0.85, unit: '1' },
    EVEN,
    WIPES,
  ],
  'coating-removal': [
    { quantity: 'contrast', comparison: 'at least', value: 0.75, unit: '1' },
    EVEN,
    { quantity: 'tape-class', comparison: 'at most', value: 1, unit: '1' },
  ],
};

async function setCriteria(turn: Turn, effects: ReadonlyMap<string, Effect>): Promise<Map<string, Effect>> {
  const changed = new Map(effects);
  for (const [key, criteria] of Object.entries(OWN_CRITERIA)) {
    const before = effects.get(key);
    if (before === undefined) throw new RangeError(`there is no effect ${key}`);
    const { id, name } = before;
    const isOne = and(eq(effect.shopId, turn.shopId), eq(effect.id, id));
    await turn.tx
      .update(effect)
      .set({ criteria: [...criteria], version: 2 })
      .where(isOne);
    const entry = { action: 'effect.changed', subjectType: 'effect', subjectId: id };
    await turn.tell({ ...entry, before: { name, criteria: before.criteria }, after: { name, criteria } });
    changed.set(key, { ...before, criteria });
  }
  return changed;
}

async function addCautions(turn: Turn, finishes: Cast['finishes']): Promise<Caution[]> {
  const sealedIds = [finishes['sealed satin'].id, finishes['sealed matt'].id];
  const own: readonly Omit<Caution, 'id'>[] = [
    {
      level: 'care',
      subject: 'Wipe off every fingerprint before bleaching or darkening.',
      text: 'Skin oil leaves grey smears that stay under the oxide. Isopropanol is flammable: close the bottle and take it away first.',
      source: 'Hanne Voss, finding of this shop (invented)',
      appliesTo: { finishIds: sealedIds },
    },
    {
      level: 'care',
      subject: 'Let 316L housings cool before handling.',
      text: 'Thin rims hold the heat of an anneal for minutes and bend when they are gripped hot.',
      source: 'Ruaridh Keane, finding of this shop (invented)',
      appliesTo: { families: ['stainless-steel'], effectKeys: ['dark-anneal'] },
    },
  ];
  const rows = own.map((values) => ({ id: turn.newId(), ...values }));
  for (const { id, ...values } of rows) {
    await turn.tx.insert(caution).values({ ...authored(turn), id, ...values, appliesTo: { ...values.appliesTo } });
    await turn.tell({ action: 'caution.added', subjectType: 'caution', subjectId: id, after: values });
  }
  return rows;
}
