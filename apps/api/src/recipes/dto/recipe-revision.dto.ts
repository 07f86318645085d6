import { ApiProperty } from '@nestjs/swagger';
import {
  CAUTION_LEVEL_LABELS,
  type CautionLevel,
  codesOf,
  PARAMETER_CLASS_LABELS,
  type ParameterClass,
  REVISION_STATE_LABELS,
  type RevisionState,
  ROUTE_KINDS,
  type RouteKind,
} from '@proofplate/recipe-model';
import { DoseCautionDto, NamedDto } from '../../coupons/dto/coupon.dto';
import { PanelDto } from '../../machines/dto/panel.dto';
import { PhysicalProfileDto } from '../../machines/dto/physical-profile.dto';
import { DerivedNumberDto, StepNumbersDto } from './derived-number.dto';
import { EvidenceDto } from './evidence.dto';
import { MarkStepDto, SetUpStepDto } from './mark-step.dto';
import { RecipeKeysDto } from './recipe-keys.dto';
import { LimitsOfUseDto, RecipeScopeDto } from './scope.dto';
import { SignOffDto } from './sign-off.dto';

export const REVISION_STATES = codesOf(REVISION_STATE_LABELS);
const STATE = { enum: REVISION_STATES, enumName: 'RevisionState' } as const;
const ROUTE = { enum: ROUTE_KINDS, enumName: 'RouteKind' } as const;

/** A revision in a list: the rungs of the ladder. */
export class RevisionBriefDto {
  @ApiProperty({ description: 'Id of the revision', format: 'uuid' }) id: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Number from 1 without gaps; null: a draft' }) number: number | null;
  @ApiProperty({ ...STATE, description: 'State' }) state: RevisionState;
  @ApiProperty({ ...ROUTE, description: 'How the setting was come by' }) route: RouteKind;
  @ApiProperty({ description: 'Reason for the change; may be empty in a draft' }) reason: string;
  @ApiProperty({ type: NamedDto, description: 'Author: member and name' }) author: NamedDto;
  @ApiProperty({ type: String, nullable: true, format: 'uuid', description: 'Revision that it was copied from' }) basedOnId: string | null;
  @ApiProperty({ format: 'date-time', description: 'When the draft was begun' }) createdAt: string;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was submitted' }) submittedAt: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was approved' }) approvedAt: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When a newer one became current' }) supersededAt:
    | string
    | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was withdrawn' }) withdrawnAt: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it takes effect; null: with its approval' })
  effectiveFrom: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it is to be proved again' }) reviewDue:
    | string
    | null;
  @ApiProperty({ description: 'true: approved, and the day of its review is past' }) isReviewOverdue: boolean;
  @ApiProperty({ type: [SignOffDto], description: 'Signatures, oldest first' }) signOffs: SignOffDto[];
}

export class RevisionProfileDto {
  @ApiProperty({ description: 'Id of the profile version', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Version of the machine’s profile' }) number: number;
  @ApiProperty({ description: 'Version of its physical part; evidence holds within one' }) physicalNumber: number;
  @ApiProperty({ description: 'true: the machine is still what it was' }) isPresent: boolean;
  @ApiProperty({ type: PhysicalProfileDto, description: 'Source and scan head' }) physical: PhysicalProfileDto;
  @ApiProperty({ type: PanelDto, description: 'The fields of the control in its order' }) panel: PanelDto;
}

export class RevisionOpticsDto {
  @ApiProperty({ description: 'Focal length of the lens, mm' }) focalLengthMm: number;
  @ApiProperty({ type: Number, nullable: true, description: 'Spot diameter (1/e²) that somebody measured, µm' }) measuredSpotUm:
    | number
    | null;
}

export class RevisionCalibrationDto {
  @ApiProperty({ description: 'Id of the power calibration', format: 'uuid' }) id: string;
  @ApiProperty({ format: 'date', description: 'Day of the reading' }) measuredOn: string;
  @ApiProperty({ description: 'Power meter' }) meter: string;
}

export class RevisionCautionDto {
  @ApiProperty({ description: 'Id of the caution', format: 'uuid' }) id: string;
  @ApiProperty({ enum: codesOf(CAUTION_LEVEL_LABELS), enumName: 'CautionLevel', description: 'never: it must not be marked' })
  level: CautionLevel;
  @ApiProperty({ description: 'What to do, first' }) subject: string;
  @ApiProperty({ description: 'Why' }) text: string;
  @ApiProperty({ description: 'Where it comes from' }) source: string;
  @ApiProperty({ description: 'true: it holds for all work, not for this one in particular' }) isGeneral: boolean;
  @ApiProperty({ description: 'true: the author acknowledged it' }) isAcknowledged: boolean;
}

export class ChangeSizeDto {
  @ApiProperty({ description: 'Later minus earlier' }) delta: number;
  @ApiProperty({ description: 'Unit of the difference' }) symbol: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Percent of the earlier value; null: not meaningful' }) percent: number | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Percentage points, for values that are percents themselves' })
  points: number | null;
}

export class SettingChangeDto {
  @ApiProperty({ description: 'Which item differs' }) item: string;
  @ApiProperty({ description: 'The item in words' }) label: string;
  @ApiProperty({ enum: codesOf(PARAMETER_CLASS_LABELS), enumName: 'ParameterClass', description: 'How much the change counts' })
  class: ParameterClass;
  @ApiProperty({ enum: ['added', 'removed', 'changed'], description: 'Kind of change' }) change: 'added' | 'removed' | 'changed';
  @ApiProperty({ type: String, nullable: true, description: 'Earlier value as entered, with its unit' }) before: string | null;
  @ApiProperty({ type: String, nullable: true, description: 'Later value as entered, with its unit' }) after: string | null;
  @ApiProperty({ type: ChangeSizeDto, nullable: true, description: 'Size of the change; null for words' }) size: ChangeSizeDto | null;
}

export class StepChangeDto {
  @ApiProperty({ description: 'Number of the mark step, from 1' }) step: number;
  @ApiProperty({ enum: ['added', 'removed', 'changed'], description: 'Kind of change' }) change: 'added' | 'removed' | 'changed';
  @ApiProperty({ description: 'Purpose of the step in words' }) purpose: string;
  @ApiProperty({ type: [SettingChangeDto], description: 'What differs within the step' }) changes: SettingChangeDto[];
}

export class RevisionRecipeDto extends RecipeKeysDto {
  @ApiProperty({ description: 'Id of the recipe', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Code that people read, such as R-0042' }) code: string;
  @ApiProperty({ description: 'Title' }) title: string;
}

export class RecipeRevisionDto extends RevisionBriefDto {
  @ApiProperty({ type: RevisionRecipeDto, description: 'The recipe that it belongs to' }) recipe: RevisionRecipeDto;
  @ApiProperty({ type: [MarkStepDto], description: 'Mark steps in their order' }) steps: MarkStepDto[];
  @ApiProperty({ type: [SetUpStepDto], description: 'Set-up steps in their order' }) setUpSteps: SetUpStepDto[];
  @ApiProperty({ type: LimitsOfUseDto, description: 'Limits of use' }) limits: LimitsOfUseDto;
  @ApiProperty({ type: RecipeScopeDto, description: 'What it covers beyond the five keys' }) scope: RecipeScopeDto;
  @ApiProperty({ type: RevisionProfileDto, description: 'Profile version of the machine' }) profile: RevisionProfileDto;
  @ApiProperty({ type: RevisionCalibrationDto, nullable: true, description: 'Power calibration that it cites' })
  calibration: RevisionCalibrationDto | null;
  @ApiProperty({ description: 'Written grounds of a lead, where it was not proved on coupons' }) grounds: string;
  @ApiProperty({ type: NamedDto, nullable: true, description: 'Lead who gave the grounds' }) groundsBy: NamedDto | null;
  @ApiProperty({ type: EvidenceDto, description: 'What it rests on and what proved it' }) evidence: EvidenceDto;
  @ApiProperty({ type: [RevisionCautionDto], description: 'Cautions that apply, never first' }) cautions: RevisionCautionDto[];
  @ApiProperty({
    type: [StepChangeDto],
    description: 'Differences from the approved revision; from the earlier one once it is approved itself',
  })
  changes: StepChangeDto[];
  @ApiProperty({
    type: RevisionBriefDto,
    nullable: true,
    description: 'The revision that the changes are counted from; null: there is none',
  })
  comparedWith: RevisionBriefDto | null;
  @ApiProperty({ type: [StepNumbersDto], description: 'Numbers that follow from each mark step' }) derived: StepNumbersDto[];
  @ApiProperty({ type: [DerivedNumberDto], description: 'Totals over the mark steps; none for a single step' })
  derivedTotals: DerivedNumberDto[];
  @ApiProperty({ type: RevisionOpticsDto, description: 'Lens and spot that the numbers rest on' }) optics: RevisionOpticsDto;
  @ApiProperty({ type: DoseCautionDto, nullable: true, description: 'Dose from which cells of this material and finish went wrong' })
  doseCaution: DoseCautionDto | null;
  @ApiProperty({ description: 'SHA-256 of the content as it stands now, hexadecimal; what a signature is bound to' }) contentHash: string;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({
    type: [String],
    description: 'What the caller may do: edit, discard, submit, recall, return, approve, withdraw, copy, start-confirmation',
  })
  allowedActions: string[];
}
