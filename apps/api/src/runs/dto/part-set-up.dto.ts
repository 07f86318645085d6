import { ApiProperty } from '@nestjs/swagger';
import type { PartNumber } from '@proofplate/recipe-model';
import { NamedDto } from '../../coupons/dto/coupon.dto';
import { SavePartSetUpDto } from './save-part-set-up.dto';

const STRIP_LIMITS = ['focus', 'edge angle', 'field'] as const;

/** Beam and lens as they are recorded; null: not recorded, and what needs it stays away with that reason. */
export class PartGroundDto {
  @ApiProperty({ type: NamedDto, description: 'Machine' }) machine: NamedDto;
  @ApiProperty({ type: NamedDto, description: 'Lens' }) lens: NamedDto;
  @ApiProperty({ description: 'Wavelength, nm' }) wavelengthNm: number;
  @ApiProperty({ type: Number, nullable: true, description: 'M² of the beam' }) m2: number | null;
  @ApiProperty({ type: Number, nullable: true, description: 'Beam diameter (1/e²) at the lens, mm' }) beamDiameterMm: number | null;
  @ApiProperty({ description: 'Focal length of the lens, mm' }) focalLengthMm: number;
  @ApiProperty({ description: 'Side of the marking field, mm' }) fieldSizeMm: number;
  @ApiProperty({ type: Number, nullable: true, description: 'Measured spot diameter (1/e²) in focus, µm' }) measuredSpotUm: number | null;
  @ApiProperty({ type: [Number], description: 'Focus offset of each mark step, mm; positive: the surface lies farther from the lens' })
  focusOffsetsMm: number[];
}

export class PartNumberDto implements PartNumber {
  @ApiProperty({ description: 'Key of the number' }) key: string;
  @ApiProperty({ description: 'Unit' }) unit: string;
  @ApiProperty({ description: 'How it is computed' }) formula: string;
  @ApiProperty({ description: 'Where the formula comes from' }) source: string;
  @ApiProperty({ type: Number, nullable: true, description: 'The value; null: see missingBecause' }) value: number | null;
  @ApiProperty({ type: String, nullable: true, description: 'Why there is no value' }) missingBecause: string | null;
  @ApiProperty({ description: 'true: it has no meaning for this shape' }) isRuledOutByMode: boolean;
  @ApiProperty({ type: String, nullable: true, description: 'Limit of the formula that the inputs break' }) outOfRange: string | null;
  @ApiProperty({ type: 'object', additionalProperties: { type: 'number' }, description: 'Numbers that went into it, by name with unit' })
  inputs: Record<string, number>;
}

export class PartResultsDto {
  @ApiProperty({ description: 'true: mirror the artwork, once, in one place' }) isMirrored: boolean;
  @ApiProperty({ enum: STRIP_LIMITS, type: String, nullable: true, description: 'What ends the widest strip; null: not known' })
  stripLimit: (typeof STRIP_LIMITS)[number] | null;
  @ApiProperty({ type: [PartNumberDto], description: 'All measures' }) numbers: PartNumberDto[];
}

export class PartSetUpDto {
  @ApiProperty({ description: 'Id', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'How often it was saved for this run' }) number: number;
  @ApiProperty({ type: SavePartSetUpDto, description: 'What was typed' }) entered: SavePartSetUpDto;
  @ApiProperty({ type: PartGroundDto, description: 'Beam and lens that it was worked out with' }) ground: PartGroundDto;
  @ApiProperty({ type: PartResultsDto, description: 'What followed' }) results: PartResultsDto;
  @ApiProperty({ description: 'Who saved it' }) savedBy: string;
  @ApiProperty({ format: 'date-time', description: 'When' }) savedAt: string;
}

/** The part of a run: as it was last saved, and what a new one would be worked out with. */
export class RunPartSetUpDto {
  @ApiProperty({ type: PartSetUpDto, nullable: true, description: 'Last saved; null: none' }) setUp: PartSetUpDto | null;
  @ApiProperty({ type: PartGroundDto, description: 'Beam and lens as they are recorded now' }) ground: PartGroundDto;
}
