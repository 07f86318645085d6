import { ApiProperty } from '@nestjs/swagger';
import { type CautionLevel, ROUTE_KINDS, type RouteKind } from '@proofplate/recipe-model';
import { NamedDto } from '../../coupons/dto/coupon.dto';
import { PanelDto } from '../../machines/dto/panel.dto';
import { DerivedNumberDto, StepNumbersDto } from '../../recipes/dto/derived-number.dto';
import { EvidencePhotoDto, EvidencePlateDto } from '../../recipes/dto/evidence.dto';
import { MarkStepDto, SetUpStepDto } from '../../recipes/dto/mark-step.dto';
import { PowerShiftDto } from '../../recipes/dto/power-shift.dto';
import { LimitsOfUseDto, RecipeScopeDto } from '../../recipes/dto/scope.dto';
import { SLOT_KEYS, type SlotKey } from '../finder-slots';

export class SlotOptionDto extends NamedDto {
  @ApiProperty({ description: 'A second word, such as the kind of source; may be empty' }) detail: string;
  @ApiProperty({ description: 'Approved recipes with the other slots held' }) count: number;
  @ApiProperty({ type: String, nullable: true, description: 'Why there are none; null where there are some' }) reason: string | null;
}

export class SlotDto {
  @ApiProperty({ type: String, nullable: true, format: 'uuid', description: 'What was chosen' }) chosenId: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'uuid', description: 'What every recipe that is left has; null: they differ' })
  settledId: string | null;
  @ApiProperty({ description: 'Options that lead to an approved recipe' }) fitCount: number;
  @ApiProperty({ type: [SlotOptionDto], description: 'Those that fit first, by name' }) options: SlotOptionDto[];
}

export class SlotsDto implements Record<SlotKey, SlotDto> {
  @ApiProperty({ type: SlotDto, description: 'Machine' }) machine: SlotDto;
  @ApiProperty({ type: SlotDto, description: 'Lens' }) lens: SlotDto;
  @ApiProperty({ type: SlotDto, description: 'Material' }) material: SlotDto;
  @ApiProperty({ type: SlotDto, description: 'Finish' }) finish: SlotDto;
  @ApiProperty({ type: SlotDto, description: 'Effect' }) effect: SlotDto;
}

export class FinderCautionDto {
  @ApiProperty({ description: 'Id of the caution', format: 'uuid' }) id: string;
  @ApiProperty({ enum: ['never', 'care'], description: 'never: it must not be marked' }) level: CautionLevel;
  @ApiProperty({ description: 'What to do, first' }) subject: string;
  @ApiProperty({ description: 'Why' }) text: string;
  @ApiProperty({ description: 'Where it comes from' }) source: string;
  @ApiProperty({ description: 'true: it holds for all work, not for this one in particular' }) isGeneral: boolean;
}

export class FinderKeysDto {
  @ApiProperty({ type: NamedDto, description: 'Machine' }) machine: NamedDto;
  @ApiProperty({ type: NamedDto, description: 'Lens' }) lens: NamedDto;
  @ApiProperty({ type: NamedDto, description: 'Material' }) material: NamedDto;
  @ApiProperty({ type: NamedDto, description: 'Finish' }) finish: NamedDto;
  @ApiProperty({ type: NamedDto, description: 'Effect' }) effect: NamedDto;
}

export class FinderRecipeDto extends FinderKeysDto {
  @ApiProperty({ description: 'Id of the recipe', format: 'uuid' }) recipeId: string;
  @ApiProperty({ description: 'Code of the recipe' }) code: string;
  @ApiProperty({ description: 'Title of the recipe' }) title: string;
  @ApiProperty({ description: 'Number of its approved revision' }) revisionNumber: number;
}

export class ReferencePhotoDto extends EvidencePhotoDto {
  @ApiProperty({ format: 'date-time', description: 'When it was taken; when it was sent, where the camera did not say' }) takenAt: string;
}

export class ReferenceMeasurementDto {
  @ApiProperty({ description: 'What was measured' }) quantity: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Value; null: a grade only' }) value: number | null;
  @ApiProperty({ type: String, nullable: true, description: 'Grade, where there is one' }) grade: string | null;
  @ApiProperty({ description: 'Unit; 1: a pure number' }) unit: string;
  @ApiProperty({ description: 'How; photo: an estimate under that photo’s light' }) method: string;
  @ApiProperty({ type: String, nullable: true, description: 'What was asked of it, such as “at least 0.9”; null: nothing' }) criterion:
    | string
    | null;
}

/** The mark to match. */
export class ReferenceCellDto {
  @ApiProperty({ description: 'Code of the coupon' }) couponCode: string;
  @ApiProperty({ description: 'Address of the cell' }) address: string;
  @ApiProperty({ type: EvidencePlateDto, description: 'The plate, for drawing' }) plate: EvidencePlateDto;
  @ApiProperty({ description: 'Lot of the material; may be empty' }) lot: string;
  @ApiProperty({ type: [ReferenceMeasurementDto], description: 'Measurements that hold' }) measurements: ReferenceMeasurementDto[];
  @ApiProperty({ type: ReferencePhotoDto, nullable: true, description: 'Photo of the plate; null: none is ready' })
  photo: ReferencePhotoDto | null;
}

export class FinderSignatureDto {
  @ApiProperty({ description: 'Name as printed when signing' }) printedName: string;
  @ApiProperty({ format: 'date-time', description: 'When, by the server’s clock' }) signedAt: string;
  @ApiProperty({ description: 'true: signed by its author, which the shop’s policy allowed' }) isByAuthor: boolean;
}

export class FinderHoldDto {
  @ApiProperty({ description: 'Id of the hold', format: 'uuid' }) id: string;
  @ApiProperty({ enum: ['recipe', 'machine'], description: 'What is held' }) subject: 'recipe' | 'machine';
  @ApiProperty({ description: 'Why' }) reason: string;
  @ApiProperty({ description: 'Who placed it' }) placedBy: string;
  @ApiProperty({ format: 'date-time', description: 'Since when' }) placedAt: string;
}

export class FocusDto {
  @ApiProperty({ type: Number, nullable: true, description: 'Working distance or focus reading, mm' }) workingDistanceMm: number | null;
  @ApiProperty({ description: 'How focus is found; may be empty' }) focusMethod: string;
}

/** The approved setting for the sentence. */
export class FinderAnswerDto extends FinderRecipeDto {
  @ApiProperty({ description: 'Id of the approved revision', format: 'uuid' }) revisionId: string;
  @ApiProperty({ type: [FinderHoldDto], description: 'Open holds; they come before everything else' }) holds: FinderHoldDto[];
  @ApiProperty({ type: PanelDto, description: 'The fields of the machine’s control, in its order' }) panel: PanelDto;
  @ApiProperty({ description: 'Version of the machine’s profile that it was proved on' }) profileNumber: number;
  @ApiProperty({ description: 'false: the machine’s source or optics were changed after it was proved' }) isProfilePresent: boolean;
  @ApiProperty({ type: [MarkStepDto], description: 'Mark steps in their order' }) steps: MarkStepDto[];
  @ApiProperty({ type: [StepNumbersDto], description: 'Numbers that follow from each mark step' }) derived: StepNumbersDto[];
  @ApiProperty({ type: [DerivedNumberDto], description: 'Totals over the mark steps; none for a single step' })
  derivedTotals: DerivedNumberDto[];
  @ApiProperty({ type: [SetUpStepDto], description: 'Set-up steps in their order' }) setUpSteps: SetUpStepDto[];
  @ApiProperty({ type: LimitsOfUseDto, description: 'Limits of use' }) limits: LimitsOfUseDto;
  @ApiProperty({ type: RecipeScopeDto, description: 'What it covers' }) scope: RecipeScopeDto;
  @ApiProperty({ type: FocusDto, nullable: true, description: 'How this lens is focused on this machine' }) focus: FocusDto | null;
  @ApiProperty({ type: ReferenceCellDto, nullable: true, description: 'The mark to match; null: it rests on no cell' })
  reference: ReferenceCellDto | null;
  @ApiProperty({ enum: ROUTE_KINDS, enumName: 'RouteKind', description: 'How the setting was come by' }) route: RouteKind;
  @ApiProperty({ type: FinderSignatureDto, nullable: true, description: 'Who approved it' }) signature: FinderSignatureDto | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'Until when it holds; null: not limited' }) holdsUntil:
    | string
    | null;
  @ApiProperty({ description: 'true: the day of its review is past' }) isOverdue: boolean;
  @ApiProperty({ type: PowerShiftDto, nullable: true, description: 'A later reading moved the watts by more than the policy allows' })
  checkDue: PowerShiftDto | null;
  @ApiProperty({ description: 'SHA-256 of the signed content' }) contentHash: string;
  @ApiProperty({ type: [String], description: 'Why no run can be started; empty: it can' }) blockedBecause: string[];
  @ApiProperty({ type: [String], description: 'What the caller may do: start-run, place-hold, release-hold, grant-deviation' })
  allowedActions: string[];
}

export class DifferenceDto {
  @ApiProperty({ enum: [...SLOT_KEYS], description: 'Slot that differs' }) slot: SlotKey;
  @ApiProperty({ description: 'What the recipe has' }) has: string;
  @ApiProperty({ description: 'What was asked for' }) wanted: string;
}

export class NearMissDto extends FinderRecipeDto {
  @ApiProperty({ type: [DifferenceDto], description: 'What differs; everything else is the same' }) differs: DifferenceDto[];
  @ApiProperty({ type: [String], description: 'Typed words that are not found in it' }) missingWords: string[];
  @ApiProperty({ description: 'Why it can’t be carried over as it stands, in words' }) whyNot: string;
  @ApiProperty({ type: ReferenceCellDto, nullable: true, description: 'Plate and cell that stand for it' })
  reference: ReferenceCellDto | null;
}

export class WithdrawnRecipeDto extends FinderRecipeDto {
  @ApiProperty({ type: String, nullable: true, description: 'Who withdrew it' }) by: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When' }) at: string | null;
  @ApiProperty({ description: 'Why; may be empty' }) reason: string;
}

export class FinderDto {
  @ApiProperty({ type: SlotsDto, description: 'The slots of the sentence with their options' }) slots: SlotsDto;
  @ApiProperty({ description: 'Approved recipes of the shop' }) approvedCount: number;
  @ApiProperty({ description: 'Approved recipes that fit' }) matchCount: number;
  @ApiProperty({ type: [FinderRecipeDto], description: 'The first of them, by code' }) matches: FinderRecipeDto[];
  @ApiProperty({ type: [FinderCautionDto], description: 'Cautions of the chosen or answered work, never first' })
  cautions: FinderCautionDto[];
  @ApiProperty({ description: 'true: a caution says never' }) isForbidden: boolean;
  @ApiProperty({ type: FinderAnswerDto, nullable: true, description: 'The one approved setting; null: none, several, or forbidden' })
  answer: FinderAnswerDto | null;
  @ApiProperty({
    type: [WithdrawnRecipeDto],
    description: 'Recipes for exactly this, or named by the address, that were withdrawn and have no approved revision',
  })
  withdrawn: WithdrawnRecipeDto[];
  @ApiProperty({ type: [NearMissDto], description: 'Where nothing fits: what comes nearest' }) nearMisses: NearMissDto[];
}

/** What is printed on a set-up sheet, so that scanning it opens what holds now. */
export class SheetCodeDto {
  @ApiProperty({ description: 'Address that the code opens' }) url: string;
  @ApiProperty({ type: [String], description: 'Rows of the QR symbol, 1 = dark, without quiet zone' }) modules: string[];
}

export class FoundDto {
  @ApiProperty({ enum: ['recipe', 'coupon', 'material', 'machine'], description: 'Kind of record' })
  kind: 'recipe' | 'coupon' | 'material' | 'machine';
  @ApiProperty({ description: 'Id of the record', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Code; empty where there is none' }) code: string;
  @ApiProperty({ description: 'Name or title' }) name: string;
}

export class FoundListDto {
  @ApiProperty({ type: [FoundDto], description: 'What was found, best first' }) items: FoundDto[];
}
