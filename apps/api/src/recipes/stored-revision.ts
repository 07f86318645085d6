import type {
  CautionLevel,
  CouponState,
  Criterion,
  MarkStep,
  MaterialFamily,
  Panel,
  ParameterSet,
  PhysicalProfile,
  RevisionContent,
  RevisionState,
  Role,
  RouteKind,
  SourceKind,
} from '@proofplate/recipe-model';
import type { SignOffMeaning } from './dto/sign-off.dto';

/** A revision row with its closed lists and its content as the model holds them. */
export type StoredRevision = {
  readonly id: string;
  readonly recipeId: string;
  readonly number: number | null;
  readonly state: RevisionState;
  readonly content: RevisionContent;
  readonly profileId: string;
  readonly calibrationId: string | null;
  readonly reason: string;
  readonly basedOnId: string | null;
  readonly route: RouteKind;
  readonly grounds: string;
  readonly groundsBy: string | null;
  readonly editorIds: readonly string[];
  readonly effectiveFrom: Date | null;
  readonly reviewDue: Date | null;
  readonly contentHash: string | null;
  readonly acknowledgedCautionIds: readonly string[];
  readonly submittedAt: Date | null;
  readonly approvedAt: Date | null;
  readonly withdrawnAt: Date | null;
  readonly supersededAt: Date | null;
  readonly createdAt: Date;
  readonly createdBy: string;
  readonly version: number;
};

/** A revision under lock, with its dates weighed by the database's clock. */
export type LockedRevision = StoredRevision & { readonly takesEffectLater: boolean };

export type RevisionBrief = StoredRevision & { readonly authorName: string; readonly isReviewOverdue: boolean };

export type StoredSignOff = {
  readonly id: string;
  readonly revisionId: string;
  readonly memberId: string;
  readonly printedName: string;
  readonly role: Role;
  readonly meaning: SignOffMeaning;
  readonly comment: string;
  readonly signedAt: Date;
  readonly contentHash: string;
  readonly ledgerHashBefore: string;
  readonly method: 'password' | 'session';
  readonly isByAuthor: boolean;
};

type Named = { readonly id: string; readonly name: string };

/** Material, finish, effect, machine and lens by name. */
export type RecipeKeys = {
  readonly material: Named & { readonly family: MaterialFamily };
  readonly finish: Named;
  readonly effect: Named & { readonly key: string };
  readonly machine: Named & { readonly sourceKind: SourceKind };
  readonly lens: Named;
};

/** The five ids that make two recipes answer the same question. */
export type KeyIds = {
  readonly materialId: string;
  readonly finishId: string;
  readonly effectId: string;
  readonly machineId: string;
  readonly lensId: string;
};

export type RevisionProfile = {
  readonly id: string;
  readonly number: number;
  readonly physicalNumber: number;
  readonly physical: PhysicalProfile;
  readonly panel: Panel;
};

export type RevisionCalibration = {
  readonly id: string;
  readonly measuredOn: string;
  readonly meter: string;
  readonly frequencyKhz: number | null;
  readonly pulseWidthNs: number | null;
  readonly points: readonly { percent: number; watts: number }[];
};

/** A revision with everything of other tables that one row can carry. */
export type RevisionHead = {
  readonly revision: StoredRevision;
  readonly recipe: RecipeKeys & { readonly id: string; readonly code: string; readonly title: string };
  readonly profile: RevisionProfile;
  /** Physical number of the machine's profile in force now. */
  readonly presentPhysicalNumber: number;
  readonly calibration: RevisionCalibration | null;
  readonly groundsByName: string | null;
  readonly optics: { readonly focalLengthMm: number; readonly measuredSpotUm: number | null };
};

export type EvidenceKind = 'basis' | 'confirmation';

export type StoredMeasurement = {
  readonly quantity: string;
  readonly value: number | null;
  readonly grade: string | null;
  readonly unit: string;
  readonly method: string;
  readonly measuredAt: string;
};

export type EvidencePhoto = {
  readonly shopId: string;
  readonly id: string;
  readonly masterSha256: string | null;
  readonly largeSha256: string | null;
  readonly smallSha256: string | null;
  readonly corners: { x: number; y: number }[] | null;
  readonly widthPx: number | null;
  readonly heightPx: number | null;
};

/** A cell with all that judging it needs. */
export type EvidenceCell = {
  readonly cellId: string;
  readonly address: string;
  readonly rowIndex: number;
  readonly columnIndex: number;
  readonly isMarked: boolean;
  readonly parameters: ParameterSet;
  readonly coupon: {
    readonly id: string;
    readonly code: string;
    readonly state: CouponState;
    readonly lot: string;
    readonly markedAt: Date | null;
    readonly sealedAt: Date | null;
    readonly criteria: readonly Criterion[] | null;
    readonly criteriaRecordedAt: Date | null;
    /** First rating, measurement or end of the inspection, whichever came first. */
    readonly firstLookedAt: Date | null;
    readonly unknownFields: readonly string[];
    /** True of a coupon of equal cells: it proves a setting and is never where one comes from. */
    readonly isProof: boolean;
    readonly confirmsRevisionId: string | null;
    readonly profileId: string;
    readonly physicalNumber: number;
    readonly calibrationId: string | null;
    readonly keys: KeyIds;
  };
  readonly plate: { rows: number; columns: number; cellMm: number; gapMm: number; layoutVersion: string };
  readonly meanRating: number | null;
  /** Those that no later one supersedes, newest first. */
  readonly measurements: readonly StoredMeasurement[];
  readonly photo: EvidencePhoto | null;
};

export type LinkedCell = EvidenceCell & { readonly revisionId: string; readonly kind: EvidenceKind };

export type RunMeasurement = { piece: number; quantity: string; value: number; unit: string; method: string };

/** A finished confirmation run. */
export type EvidenceRun = {
  readonly id: string;
  readonly revisionId: string;
  readonly code: string;
  readonly lot: string;
  readonly startedAt: Date;
  readonly hasBadResult: boolean;
  readonly steps: readonly MarkStep[] | null;
  readonly measurements: readonly RunMeasurement[];
};

export type RevisionCaution = {
  readonly id: string;
  readonly level: CautionLevel;
  readonly subject: string;
  readonly text: string;
  readonly source: string;
  /** It holds for all work, not for this one in particular. */
  readonly isGeneral: boolean;
};

/** Everything that is known about a revision: what its page shows and what its checks weigh. */
export type RevisionRecord = RevisionHead & {
  readonly brief: RevisionBrief;
  readonly ladder: readonly RevisionBrief[];
  readonly signOffs: readonly StoredSignOff[];
  readonly basis: readonly LinkedCell[];
  readonly confirmation: readonly LinkedCell[];
  readonly runs: readonly EvidenceRun[];
  readonly cautions: readonly RevisionCaution[];
};
