import { ApiProperty } from '@nestjs/swagger';
import {
  type CouponState,
  type LevelSpacing,
  MATERIAL_FAMILY_KEYS,
  type MaterialFamily,
  type ParameterKey,
  SOURCE_KINDS,
  type SourceKind,
} from '@proofplate/recipe-model';
import { PageOf } from '../../common/pagination/page';
import { PanelDto } from '../../machines/dto/panel.dto';
import { PhysicalProfileDto } from '../../machines/dto/physical-profile.dto';
import { StoredCriterionDto } from '../../materials/dto/effect.dto';
import { PlatePhotoDto } from '../../photos/dto/photo.dto';
import { PARAMETER_KEY_ENUM, ParameterSetDto, SetValueDto } from './parameter-set.dto';

export const COUPON_STATES = ['planned', 'marked', 'inspected', 'sealed'] as const;
export const COUPON_PURPOSES = ['exploration', 'confirmation'] as const;
export const MARK_STATES = ['planned', 'marked', 'differs', 'skipped'] as const;
export type CouponPurpose = (typeof COUPON_PURPOSES)[number];
export type MarkState = (typeof MARK_STATES)[number];
export type FillDrawnBy = 'machine' | 'artwork';

export class NamedDto {
  @ApiProperty({ description: 'Id', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Name in the shop' }) name: string;
}

export class CouponMaterialDto extends NamedDto {
  @ApiProperty({ enum: MATERIAL_FAMILY_KEYS, description: 'Family of the material' }) family: MaterialFamily;
}

export class CouponEffectDto extends NamedDto {
  @ApiProperty({ description: 'Key of the effect' }) key: string;
}

export class CouponMachineDto extends NamedDto {
  @ApiProperty({ enum: SOURCE_KINDS, description: 'Kind of laser source' }) sourceKind: SourceKind;
}

export class CouponLensDto extends NamedDto {
  @ApiProperty({ description: 'Focal length, mm' }) focalLengthMm: number;
  @ApiProperty({ description: 'Side of the marking field, mm' }) fieldSizeMm: number;
  @ApiProperty({ type: Number, nullable: true, description: 'Spot measured on this machine, µm; null: not measured' })
  measuredSpotUm: number | null;
}

export class CouponProfileDto {
  @ApiProperty({ description: 'Id of the profile version', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Version of the machine’s profile' }) number: number;
  @ApiProperty({ description: 'Version of its physical part; evidence holds within one' }) physicalNumber: number;
  @ApiProperty({ type: PhysicalProfileDto, description: 'Source and scan head' }) physical: PhysicalProfileDto;
  @ApiProperty({ type: PanelDto, description: 'The fields of the control in its order' }) panel: PanelDto;
}

export class CouponCalibrationDto {
  @ApiProperty({ description: 'Id of the power calibration', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Day of the reading', format: 'date' }) measuredOn: string;
}

export class ConfirmedRevisionDto {
  @ApiProperty({ description: 'Id of the revision that the coupon is to prove', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Id of its recipe', format: 'uuid' }) recipeId: string;
  @ApiProperty({ description: 'Code of its recipe' }) recipeCode: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Number of the revision; null: still a draft' }) number: number | null;
  @ApiProperty({ description: 'State of the revision' }) state: string;
}

export class GridFactorDto {
  @ApiProperty({ ...PARAMETER_KEY_ENUM, description: 'The parameter that varies' }) parameter: ParameterKey;
  @ApiProperty({ enum: ['steps', 'ratios', 'list'], description: 'Equal steps, equal ratios, or levels as listed' })
  spacing: LevelSpacing | 'list';
  @ApiProperty({ type: [SetValueDto], description: 'The levels in order' }) levels: SetValueDto[];
}

export class PlateSizeDto {
  @ApiProperty({ description: 'Width, mm' }) widthMm: number;
  @ApiProperty({ description: 'Height, mm' }) heightMm: number;
}

export class TestGridDto {
  @ApiProperty({ description: 'Id of the grid', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Number of the grid on the coupon, from 1' }) number: number;
  @ApiProperty({ description: 'Rows of cells' }) rows: number;
  @ApiProperty({ description: 'Columns of cells' }) columns: number;
  @ApiProperty({ type: GridFactorDto, nullable: true, description: 'What varies down the rows; null: nothing' })
  rowFactor: GridFactorDto | null;
  @ApiProperty({ type: GridFactorDto, nullable: true, description: 'What varies across the columns; null: nothing' })
  columnFactor: GridFactorDto | null;
  @ApiProperty({ type: ParameterSetDto, description: 'The same in every cell' }) baseSetting: ParameterSetDto;
  @ApiProperty({ type: ParameterSetDto, nullable: true, description: 'Setting of corner marks, letters and code, marked first' })
  labelStep: ParameterSetDto | null;
  @ApiProperty({ description: 'Side of a cell, mm' }) cellMm: number;
  @ApiProperty({ description: 'Gap between cells, mm' }) gapMm: number;
  @ApiProperty({ description: 'Version of the plate’s geometry' }) layoutVersion: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Seed of the random run order; null: row by row' }) runOrderSeed: number | null;
  @ApiProperty({ enum: ['machine', 'artwork'], description: 'Who draws the fill lines' }) fillDrawnBy: FillDrawnBy;
  @ApiProperty({ type: PlateSizeDto, description: 'Size of the plate' }) plate: PlateSizeDto;
}

export class DoseCautionDto {
  @ApiProperty({ description: 'Dose from which cells are flagged, J/mm²' }) doseJPerMm2: number;
  @ApiProperty({ description: 'Where the number comes from' }) source: string;
}

export class DoseDto {
  @ApiProperty({ type: Number, nullable: true, description: 'Areal dose, J/mm²; null: see missingBecause' }) value: number | null;
  @ApiProperty({ type: String, nullable: true, description: 'Why there is no dose' }) missingBecause: string | null;
}

export class CouponCellDto {
  @ApiProperty({ description: 'Id of the cell', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Id of its grid', format: 'uuid' }) gridId: string;
  @ApiProperty({ description: 'Row letter and column number, such as B4' }) address: string;
  @ApiProperty({ description: 'Row from 0' }) rowIndex: number;
  @ApiProperty({ description: 'Column from 0' }) columnIndex: number;
  @ApiProperty({ description: 'Place in the order of marking, from 1' }) runOrder: number;
  @ApiProperty({ type: ParameterSetDto, description: 'As planned' }) parameters: ParameterSetDto;
  @ApiProperty({ type: ParameterSetDto, nullable: true, description: 'As really marked, only where it differs' })
  actualParameters: ParameterSetDto | null;
  @ApiProperty({ enum: MARK_STATES, description: 'What became of the cell' }) markState: MarkState;
  @ApiProperty({ description: 'Why it was skipped or differs' }) markNote: string;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was marked' }) markedAt: string | null;
  @ApiProperty({ type: DoseDto, description: 'Areal dose of what was really marked' }) dose: DoseDto;
  @ApiProperty({ description: 'Number of the stored version' }) version: number;
}

export class CouponActDto {
  @ApiProperty({ format: 'date-time', description: 'When' }) at: string;
  @ApiProperty({ type: String, nullable: true, description: 'Name of the member; null: not known' }) by: string | null;
}

/** What lists and pages have in common. */
export class CouponHeadDto {
  @ApiProperty({ description: 'Id of the coupon', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Code that people read, such as C-0117' }) code: string;
  @ApiProperty({ description: 'What the coupon is for, in the shop’s words; may be empty' }) title: string;
  @ApiProperty({ enum: COUPON_PURPOSES, description: 'Looking for a setting, or proving one' }) purpose: CouponPurpose;
  @ApiProperty({ enum: COUPON_STATES, description: 'State' }) state: CouponState;
  @ApiProperty({ type: CouponMaterialDto, description: 'Material' }) material: CouponMaterialDto;
  @ApiProperty({ type: NamedDto, description: 'Finish' }) finish: NamedDto;
  @ApiProperty({ type: CouponEffectDto, description: 'Effect that is wanted' }) effect: CouponEffectDto;
  @ApiProperty({ type: CouponMachineDto, description: 'Machine' }) machine: CouponMachineDto;
  @ApiProperty({ type: CouponLensDto, description: 'Lens' }) lens: CouponLensDto;
  @ApiProperty({ description: 'Lot of the material; may be empty' }) lot: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Thickness of the plate, mm' }) thicknessMm: number | null;
  @ApiProperty({ description: 'Where the plate is kept; may be empty' }) storedAt: string;
  @ApiProperty({ description: 'true: burnt before it was logged here' }) isImported: boolean;
  @ApiProperty({ description: 'true: invented for the demo shop' }) isInvented: boolean;
  @ApiProperty({ format: 'date-time', description: 'When it was entered' }) createdAt: string;
  @ApiProperty({ description: 'Who entered it' }) createdBy: string;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was marked' }) markedAt: string | null;
}

export class CouponDto extends CouponHeadDto {
  @ApiProperty({ type: CouponProfileDto, description: 'Profile version of the machine that marks it' }) profile: CouponProfileDto;
  @ApiProperty({ type: CouponCalibrationDto, nullable: true, description: 'Power calibration it was planned with' })
  calibration: CouponCalibrationDto | null;
  @ApiProperty({ type: ConfirmedRevisionDto, nullable: true, description: 'Revision that it is to prove' })
  confirms: ConfirmedRevisionDto | null;
  @ApiProperty({ description: 'Room, temperature and the like; may be empty' }) ambientNotes: string;
  @ApiProperty({ description: 'Notes; may be empty' }) notes: string;
  @ApiProperty({ type: [String], description: 'Fields that nobody knows any more' }) unknownFields: string[];
  @ApiProperty({ description: 'Where numbers of a published or rendered plate come from; may be empty' }) sourceNote: string;
  @ApiProperty({ type: DoseCautionDto, nullable: true, description: 'Dose from which cells of this material and finish went wrong' })
  doseCaution: DoseCautionDto | null;
  @ApiProperty({ type: [StoredCriterionDto], nullable: true, description: 'Acceptance criteria as recorded; null: not yet' })
  criteria: StoredCriterionDto[] | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When the criteria were recorded' })
  criteriaRecordedAt: string | null;
  @ApiProperty({ type: [String], description: 'Cautions that were acknowledged when it was planned' }) acknowledgedCautionIds: string[];
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When marking began' }) markingStartedAt: string | null;
  @ApiProperty({ type: CouponActDto, nullable: true, description: 'Who marked it, and when' }) marked: CouponActDto | null;
  @ApiProperty({ type: CouponActDto, nullable: true, description: 'Who finished the inspection, and when' }) inspected: CouponActDto | null;
  @ApiProperty({ type: CouponActDto, nullable: true, description: 'Who sealed it, and when' }) sealed: CouponActDto | null;
  @ApiProperty({ type: [TestGridDto], description: 'Grids on the plate' }) grids: TestGridDto[];
  @ApiProperty({ type: [CouponCellDto], description: 'Cells, row by row' }) cells: CouponCellDto[];
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do' }) allowedActions: string[];
}

/** The plate’s face for a thumbnail, row by row. */
export class CouponFaceDto {
  @ApiProperty({ description: 'Rows of cells' }) rows: number;
  @ApiProperty({ description: 'Columns of cells' }) columns: number;
  @ApiProperty({ enum: ['rating', 'dose'], description: 'What the values are: mean rating, or dose in J/mm² before anybody rated' })
  shows: 'rating' | 'dose';
  @ApiProperty({ type: 'array', items: { type: 'number', nullable: true }, description: 'One per cell; null: none' })
  values: (number | null)[];
  @ApiProperty({ description: 'Side of a cell, mm' }) cellMm: number;
  @ApiProperty({ description: 'Gap between cells, mm' }) gapMm: number;
  @ApiProperty({ type: PlatePhotoDto, nullable: true, description: 'Newest photo that can be laid flat; null: none' })
  photo: PlatePhotoDto | null;
}

export class CouponSummaryDto extends CouponHeadDto {
  @ApiProperty({ type: CouponFaceDto, nullable: true, description: 'Face of the first grid' }) face: CouponFaceDto | null;
  @ApiProperty({ description: 'Cells on the plate' }) cellCount: number;
  @ApiProperty({ description: 'Cells that somebody rated' }) ratedCount: number;
  @ApiProperty({ type: Number, nullable: true, description: 'Best rating so far' }) bestRating: number | null;
}

export class CouponPageDto extends PageOf(CouponSummaryDto) {}
