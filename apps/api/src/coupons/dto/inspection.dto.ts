import { ApiProperty } from '@nestjs/swagger';
import {
  MEASUREMENT_METHODS,
  MEASUREMENT_QUANTITIES,
  type MeasurementMethod,
  type MeasurementQuantity,
  OUTCOMES,
  type Outcome,
} from '@proofplate/recipe-model';
import { StoredCriterionDto } from '../../materials/dto/effect.dto';
import { COUPON_STATES } from './coupon.dto';

export class CellRatingDto {
  @ApiProperty({ description: 'Id of the rating', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Cell that was judged', format: 'uuid' }) cellId: string;
  @ApiProperty({ description: 'Member who judged', format: 'uuid' }) memberId: string;
  @ApiProperty({ description: 'Name of the member' }) by: string;
  @ApiProperty({ type: Number, nullable: true, description: '0 no mark … 5 reference; null: no rating, see tags and note' })
  rating: number | null;
  @ApiProperty({ type: String, nullable: true, enum: [...OUTCOMES, null], description: 'What the mark looks like' })
  outcome: Outcome | null;
  @ApiProperty({ type: [String], description: 'Tags' }) tags: string[];
  @ApiProperty({ description: 'Note; may be empty' }) note: string;
  @ApiProperty({ format: 'date-time', description: 'When it was last saved' }) ratedAt: string;
  @ApiProperty({ description: 'Number of the stored version; send it as seenVersion with the next change' }) version: number;
}

export class MeasurementDetailDto {
  @ApiProperty({ required: false, description: 'Colorimeter: illuminant, such as D65' }) illuminant?: string;
  @ApiProperty({ required: false, description: 'Colorimeter: observer, 2° or 10°' }) observer?: string;
  @ApiProperty({ required: false, description: 'Colorimeter: geometry, such as 45/0' }) geometry?: string;
  @ApiProperty({ required: false, description: 'Verifier: aperture, mil' }) apertureMil?: number;
  @ApiProperty({ required: false, description: 'Verifier: wavelength or kind of light' }) light?: string;
  @ApiProperty({ required: false, description: 'Verifier: angle of the light, degrees' }) angleDeg?: number;
}

export class MeasurementDto {
  @ApiProperty({ description: 'Id of the measurement', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Cell that was measured', format: 'uuid' }) cellId: string;
  @ApiProperty({ enum: MEASUREMENT_QUANTITIES, enumName: 'MeasurementQuantity', description: 'What was measured' })
  quantity: MeasurementQuantity;
  @ApiProperty({ type: Number, nullable: true, description: 'Value in the unit' }) value: number | null;
  @ApiProperty({ type: String, nullable: true, description: 'Grade in letters, of a code' }) grade: string | null;
  @ApiProperty({ description: 'Unit; "1" is a pure number' }) unit: string;
  @ApiProperty({ enum: MEASUREMENT_METHODS, enumName: 'MeasurementMethod', description: 'How it was measured' }) method: MeasurementMethod;
  @ApiProperty({ type: MeasurementDetailDto, description: 'Conditions of the method' }) methodDetail: MeasurementDetailDto;
  @ApiProperty({ description: 'Instrument; may be empty' }) instrument: string;
  @ApiProperty({ type: String, nullable: true, format: 'uuid', description: 'Photo it was read from' }) photoId: string | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Standard uncertainty, in the unit; null: not stated' })
  uncertainty: number | null;
  @ApiProperty({ format: 'date-time', description: 'When it was measured' }) measuredAt: string;
  @ApiProperty({ description: 'Name of the member who entered it' }) by: string;
  @ApiProperty({ type: String, nullable: true, format: 'uuid', description: 'Earlier measurement that it takes the place of' })
  supersedesId: string | null;
  @ApiProperty({ description: 'true: a later measurement took its place' }) isSuperseded: boolean;
  @ApiProperty({ description: 'true: of the quantity on this cell, this is the one that criteria and maps go by' }) counts: boolean;
  @ApiProperty({ description: 'Why it takes the place of another; may be empty' }) reason: string;
}

export class CorrectionDto {
  @ApiProperty({ description: 'Id of the correction', format: 'uuid' }) id: string;
  @ApiProperty({ type: String, nullable: true, format: 'uuid', description: 'Cell that it is about; null: the whole coupon' })
  cellId: string | null;
  @ApiProperty({ type: String, nullable: true, description: 'Address of the cell' }) address: string | null;
  @ApiProperty({ description: 'What is right instead' }) text: string;
  @ApiProperty({ description: 'Why it is corrected' }) reason: string;
  @ApiProperty({ format: 'date-time', description: 'When it was written' }) at: string;
  @ApiProperty({ description: 'Name of the member' }) by: string;
}

export class CriterionResultDto {
  @ApiProperty({ description: 'The criterion in words' }) criterion: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Measured value that counts; null: not measured' }) value: number | null;
  @ApiProperty({ type: Boolean, nullable: true, description: 'true: met, false: not met, null: not measured' }) meets: boolean | null;
}

export class CellVerdictDto {
  @ApiProperty({ description: 'Cell', format: 'uuid' }) cellId: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Place among the judged cells, equal ones share it; null: not judged yet' })
  rank: number | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Mean of all people’s ratings' }) meanRating: number | null;
  @ApiProperty({
    type: Boolean,
    nullable: true,
    description: 'true: all criteria met, false: at least one is not, null: something is not measured, or no criteria',
  })
  meets: boolean | null;
  @ApiProperty({ type: [CriterionResultDto], description: 'One per criterion, in their order' }) results: CriterionResultDto[];
}

export const MISSING_CODES = ['criteria', 'ratings', 'inspection', 'photo', 'photo-processing', 'photo-corners'] as const;
export type MissingCode = (typeof MISSING_CODES)[number];

export class MissingItemDto {
  @ApiProperty({ enum: MISSING_CODES, description: 'Kind of the point' }) code: MissingCode;
  @ApiProperty({ description: 'What is missing and the way out' }) text: string;
  @ApiProperty({ type: [String], description: 'Addresses of the cells that it is about' }) addresses: string[];
  @ApiProperty({ description: 'false: worth doing, but it stops nothing' }) isBlocking: boolean;
}

/** Everything that was found on a coupon’s cells. */
export class InspectionDto {
  @ApiProperty({ description: 'Coupon', format: 'uuid' }) couponId: string;
  @ApiProperty({ enum: COUPON_STATES, description: 'State of the coupon' }) state: string;
  @ApiProperty({ type: [StoredCriterionDto], nullable: true, description: 'Acceptance criteria as recorded; null: not yet' })
  criteria: StoredCriterionDto[] | null;
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When they were recorded' })
  criteriaRecordedAt: string | null;
  @ApiProperty({ description: 'true: something was rated or measured, so the criteria stay as they are' }) areCriteriaFixed: boolean;
  @ApiProperty({ type: [StoredCriterionDto], description: 'What the effect demands at present, as a proposal' })
  proposedCriteria: StoredCriterionDto[];
  @ApiProperty({ type: [CellRatingDto], description: 'Ratings of all people' }) ratings: CellRatingDto[];
  @ApiProperty({ type: [MeasurementDto], description: 'Measurements, superseded ones included' }) measurements: MeasurementDto[];
  @ApiProperty({ type: [CorrectionDto], description: 'Corrections, oldest first' }) corrections: CorrectionDto[];
  @ApiProperty({ type: [CellVerdictDto], description: 'Every cell against the criteria' }) verdicts: CellVerdictDto[];
  @ApiProperty({ type: [MissingItemDto], description: 'What the end of the inspection still needs' }) missingToInspect: MissingItemDto[];
  @ApiProperty({ type: [MissingItemDto], description: 'What sealing still needs' }) missingToSeal: MissingItemDto[];
  @ApiProperty({ description: 'Number of the coupon’s stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do' }) allowedActions: string[];
}

export class SavedRatingsDto {
  @ApiProperty({ type: [CellRatingDto], description: 'The ratings as stored now' }) ratings: CellRatingDto[];
}

export class SavedMeasurementsDto {
  @ApiProperty({ type: [MeasurementDto], description: 'The measurements as stored now' }) measurements: MeasurementDto[];
}
