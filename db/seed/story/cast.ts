import type { schema } from '@proofplate/db';
import type {
  Caution,
  Criterion,
  MaterialFamily,
  MeasuredCalibration,
  Panel,
  PhysicalProfile,
  Role,
  SourceKind,
} from '@proofplate/recipe-model';

/** The shop's rules as its row holds them. */
export type ShopPolicyRow = typeof schema.shop.$inferSelect.policy;

export type Person = {
  readonly personId: string;
  readonly memberId: string;
  readonly name: string;
  readonly role: Role;
  readonly email: string;
  readonly password: string;
};
export type People = Readonly<Record<Role, Person>>;

export type LensKey = 'F160' | 'F200' | 'F254';
export type BenchKey = 'bench 1' | 'bench 2' | 'bench 3';
export type Lens = { readonly id: string; readonly name: string };
export type Mounting = { readonly workingDistanceMm: number; readonly focusMethod: string };
export type Calibration = MeasuredCalibration & {
  readonly id: string;
  readonly at: Date;
  readonly measuredOn: string;
  readonly meter: string;
  readonly meterDueOn: string;
};
export type Bench = {
  readonly id: string;
  readonly name: string;
  readonly sourceKind: SourceKind;
  readonly profileId: string;
  readonly physical: PhysicalProfile;
  readonly panel: Panel;
  readonly mountings: Readonly<Partial<Record<LensKey, Mounting>>>;
  readonly calibrations: readonly Calibration[];
};

export type MaterialKey =
  | 'black anodised'
  | 'clear anodised'
  | '316L'
  | 'brass'
  | 'titanium'
  | 'powder coat'
  | 'acrylic'
  | 'slate'
  | 'vinyl'
  | 'not stated';
export type FinishKey =
  | 'sealed satin'
  | 'sealed matt'
  | 'brushed'
  | 'bead blasted'
  | 'turned'
  | 'lacquered'
  | 'blue gloss'
  | 'as supplied'
  | 'riven';
export type Material = { readonly id: string; readonly name: string; readonly family: MaterialFamily };
export type Effect = { readonly id: string; readonly key: string; readonly name: string; readonly criteria: readonly Criterion[] };

/** Everybody and everything that the later acts of the story refer to. */
export type Cast = {
  readonly people: People;
  readonly policy: ShopPolicyRow;
  readonly lenses: Readonly<Record<LensKey, Lens>>;
  readonly benches: Readonly<Record<BenchKey, Bench>>;
  /** Stands for the machine of the published table, of which nothing is stated. */
  readonly unstatedBench: { readonly id: string; readonly profileId: string };
  readonly materials: Readonly<Record<MaterialKey, Material>>;
  readonly finishes: Readonly<Record<FinishKey, { readonly id: string; readonly name: string }>>;
  readonly effects: ReadonlyMap<string, Effect>;
  readonly cautions: readonly Caution[];
};

/** @throws RangeError for an effect that the shop does not have */
export function effectOf({ effects }: Cast, key: string): Effect {
  const effect = effects.get(key);
  if (effect === undefined) throw new RangeError(`there is no effect ${key}`);
  return effect;
}
