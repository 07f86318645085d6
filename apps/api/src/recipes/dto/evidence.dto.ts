import { ApiProperty } from '@nestjs/swagger';
import type { CouponState } from '@proofplate/recipe-model';
import { ArrayMaxSize, ArrayUnique, IsArray, IsUUID } from 'class-validator';
import { COUPON_STATES } from '../../coupons/dto/coupon.dto';
import { ParameterSetDto } from '../../coupons/dto/parameter-set.dto';
import { StoredCriterionDto } from '../../materials/dto/effect.dto';
import { PlatePhotoDto } from '../../photos/dto/photo.dto';

const MOST_CELLS = 200;

export class EvidenceMeasurementDto {
  @ApiProperty({ description: 'What was measured' }) quantity: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Value; null: a grade only' }) value: number | null;
  @ApiProperty({ type: String, nullable: true, description: 'Grade, where there is one' }) grade: string | null;
  @ApiProperty({ description: 'Unit; 1: a pure number' }) unit: string;
  @ApiProperty({ description: 'How; photo: an estimate under that photo’s light' }) method: string;
  @ApiProperty({ format: 'date-time', description: 'When it was measured' }) measuredAt: string;
}

export class CriterionResultDto {
  @ApiProperty({ type: StoredCriterionDto, description: 'The criterion as recorded' }) criterion: StoredCriterionDto;
  @ApiProperty({ description: 'The criterion in words' }) text: string;
  @ApiProperty({ type: Number, nullable: true, description: 'The value that counts; null: not measured' }) value: number | null;
  @ApiProperty({ type: String, nullable: true, description: 'How it was measured' }) method: string | null;
  @ApiProperty({ description: 'true: within the criterion; what was not measured is not within it' }) meets: boolean;
}

/** Photo of the plate that a piece of evidence lies on. */
export class EvidencePhotoDto extends PlatePhotoDto {}

/** The plate that a cell lies on, as much as is needed to draw it. */
export class EvidencePlateDto {
  @ApiProperty({ description: 'Rows of cells' }) rows: number;
  @ApiProperty({ description: 'Columns of cells' }) columns: number;
  @ApiProperty({ description: 'Side of a cell, mm' }) cellMm: number;
  @ApiProperty({ description: 'Gap between cells, mm' }) gapMm: number;
  @ApiProperty({ description: 'Version of the plate’s geometry' }) layoutVersion: string;
}

/** A cell of a coupon that a revision rests on, or that proved it. */
export class EvidenceCellDto {
  @ApiProperty({ description: 'Id of the cell', format: 'uuid' }) cellId: string;
  @ApiProperty({ description: 'Row letter and column number, such as B4' }) address: string;
  @ApiProperty({ description: 'Row from 0' }) rowIndex: number;
  @ApiProperty({ description: 'Column from 0' }) columnIndex: number;
  @ApiProperty({ description: 'Id of the coupon', format: 'uuid' }) couponId: string;
  @ApiProperty({ description: 'Code of the coupon, such as C-0117' }) couponCode: string;
  @ApiProperty({ enum: COUPON_STATES, description: 'State of the coupon; only a sealed one counts' }) couponState: CouponState;
  @ApiProperty({ description: 'Lot of the material; may be empty' }) lot: string;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When the coupon was marked' }) markedAt: string | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When the coupon was sealed' }) sealedAt: string | null;
  @ApiProperty({ type: ParameterSetDto, description: 'What was really marked' }) parameters: ParameterSetDto;
  @ApiProperty({ type: [String], description: 'Essential parameters in which it differs from the revision; empty: the same mark' })
  essentialDifferences: string[];
  @ApiProperty({ type: Number, nullable: true, description: 'Mean rating over the people who rated it' }) meanRating: number | null;
  @ApiProperty({ type: [EvidenceMeasurementDto], description: 'Measurements that hold, newest first' })
  measurements: EvidenceMeasurementDto[];
  @ApiProperty({ type: [CriterionResultDto], description: 'Each acceptance criterion with its result' }) criteria: CriterionResultDto[];
  @ApiProperty({ type: Boolean, nullable: true, description: 'true: meets every criterion; null: none were recorded' }) meets:
    | boolean
    | null;
  @ApiProperty({ type: EvidencePlateDto, description: 'The plate, for drawing' }) plate: EvidencePlateDto;
  @ApiProperty({ type: EvidencePhotoDto, nullable: true, description: 'Newest photo of the coupon; null: none is ready' })
  photo: EvidencePhotoDto | null;
}

/** A finished confirmation run of the revision. */
export class EvidenceRunDto {
  @ApiProperty({ description: 'Id of the run', format: 'uuid' }) runId: string;
  @ApiProperty({ description: 'Code of the run, such as J-0007' }) code: string;
  @ApiProperty({ description: 'Lot of the material; may be empty' }) lot: string;
  @ApiProperty({ format: 'date-time', description: 'When it was started' }) startedAt: string;
  @ApiProperty({ description: 'Pieces that were measured' }) pieceCount: number;
  @ApiProperty({ description: 'Pieces that meet every criterion' }) meetingCount: number;
  @ApiProperty({ description: 'true: exactly the essential parameters of the revision' }) isSameSetting: boolean;
}

export class EvidenceDto {
  @ApiProperty({ type: [EvidenceCellDto], description: 'Cells that the setting comes from' }) basis: EvidenceCellDto[];
  @ApiProperty({ type: [EvidenceCellDto], description: 'Cells that proved it again' }) confirmation: EvidenceCellDto[];
  @ApiProperty({ type: [EvidenceRunDto], description: 'Finished confirmation runs' }) runs: EvidenceRunDto[];
}

export class EvidenceCandidatesDto {
  @ApiProperty({
    type: [EvidenceCellDto],
    description: 'Best rated cells of the recipe’s material, finish, machine and lens, marked or later',
  })
  basis: EvidenceCellDto[];
  @ApiProperty({ type: [EvidenceCellDto], description: 'Cells with exactly the revision’s essential parameters' })
  confirmation: EvidenceCellDto[];
}

export class SetEvidenceDto {
  @ApiProperty({ type: [String], description: 'Cells that the setting comes from' })
  @IsArray()
  @ArrayMaxSize(MOST_CELLS)
  @ArrayUnique()
  @IsUUID('all', { each: true, message: 'Choose cells of the shop’s coupons.' })
  basisCellIds: string[];

  @ApiProperty({ type: [String], description: 'Cells that proved it again' })
  @IsArray()
  @ArrayMaxSize(MOST_CELLS)
  @ArrayUnique()
  @IsUUID('all', { each: true, message: 'Choose cells of the shop’s coupons.' })
  confirmationCellIds: string[];
}
