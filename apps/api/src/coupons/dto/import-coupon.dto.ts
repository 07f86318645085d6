import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { ASSISTS, type Assist, FILLS, type Fill, PARAMETER_KEYS, type ParameterKey } from '@proofplate/recipe-model';
import { Type } from 'class-transformer';
import {
  ArrayMaxSize,
  ArrayMinSize,
  IsArray,
  IsBoolean,
  IsIn,
  IsInt,
  IsString,
  Max,
  MaxLength,
  Min,
  ValidateNested,
} from 'class-validator';
import { IsDay } from '../../common/decorators/is-day';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { DoseDto } from './coupon.dto';
import { TypedValueDto, TypedValuesDto } from './entered-setting.dto';
import { PARAMETER_KEY_ENUM, ParameterSetDto } from './parameter-set.dto';
import { CELL_MM, CouponSubjectDto, GAP_MM, MAX_LEVELS_ON_PLATE } from './plan-coupon.dto';

const MAX_TABLE_LENGTH = 100_000;

/** A factor whose levels somebody still knows. */
export class KnownFactorDto {
  @ApiProperty({ ...PARAMETER_KEY_ENUM, description: 'The parameter that varies' })
  @IsIn([...PARAMETER_KEYS], { message: 'Choose what varies from the list.' })
  parameter: ParameterKey;

  @ApiProperty({ type: [TypedValueDto], description: 'The levels in order, one per row or column' })
  @IsArray()
  @ArrayMinSize(1, { message: 'Enter at least one level.' })
  @ArrayMaxSize(MAX_LEVELS_ON_PLATE, { message: `A plate has room for ${MAX_LEVELS_ON_PLATE} levels each way.` })
  @ValidateNested({ each: true })
  @Type(() => TypedValueDto)
  levels: TypedValueDto[];
}

export class KnownGridDto {
  @ApiProperty({ description: 'Rows of cells', minimum: 1, maximum: MAX_LEVELS_ON_PLATE })
  @IsInt({ message: 'The number of rows must be a whole number.' })
  @Min(1, { message: 'A plate has at least one row.' })
  @Max(MAX_LEVELS_ON_PLATE, { message: `Rows are lettered A to Z, so there are ${MAX_LEVELS_ON_PLATE} at most.` })
  rows: number;

  @ApiProperty({ description: 'Columns of cells', minimum: 1, maximum: MAX_LEVELS_ON_PLATE })
  @IsInt({ message: 'The number of columns must be a whole number.' })
  @Min(1, { message: 'A plate has at least one column.' })
  @Max(MAX_LEVELS_ON_PLATE, { message: `A plate has ${MAX_LEVELS_ON_PLATE} columns at most.` })
  columns: number;

  @ApiPropertyOptional({ type: KnownFactorDto, description: 'What varies down the rows; absent: nobody knows' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => KnownFactorDto)
  rowFactor?: KnownFactorDto;

  @ApiPropertyOptional({ type: KnownFactorDto, description: 'What varies across the columns; absent: nobody knows' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => KnownFactorDto)
  columnFactor?: KnownFactorDto;
}

/** A plate that was burnt before it was logged here. What nobody knows is left out, and marked as unknown. */
export class ImportCouponDto extends CouponSubjectDto {
  @ApiPropertyOptional({ format: 'date', description: 'Day on which it was marked; absent: not known' })
  @MayBeAbsent()
  @IsDay()
  markedOn?: string;

  @ApiPropertyOptional({ description: 'true: the caller marked it; otherwise it is not known who did' })
  @MayBeAbsent()
  @IsBoolean()
  markedByMe?: boolean;

  @ApiPropertyOptional({ description: 'true: source and scan head have not been changed since; otherwise that is not known' })
  @MayBeAbsent()
  @IsBoolean()
  isMachineUnchanged?: boolean;

  @ApiPropertyOptional({ enum: FILLS, enumName: 'Fill', description: 'How the cells were filled; absent: not known' })
  @MayBeAbsent()
  @IsIn([...FILLS], { message: 'Choose how the area was filled, or leave it unknown.' })
  fill?: Fill;

  @ApiPropertyOptional({ enum: ASSISTS, enumName: 'Assist', description: 'Assist; absent: not known' })
  @MayBeAbsent()
  @IsIn([...ASSISTS], { message: 'Choose the assist, or leave it unknown.' })
  assist?: Assist;

  @ApiPropertyOptional({ description: 'Side of a cell, mm; absent: not known' })
  @MayBeAbsent()
  @NumberBetween(CELL_MM.least, CELL_MM.most, { what: 'The side of a cell', unit: 'mm' })
  cellMm?: number;

  @ApiPropertyOptional({ description: 'Gap between cells, mm; absent: not known' })
  @MayBeAbsent()
  @NumberBetween(GAP_MM.least, GAP_MM.most, { what: 'The gap between cells', unit: 'mm' })
  gapMm?: number;

  @ApiPropertyOptional({ type: TypedValuesDto, description: 'What was the same in every cell, as far as it is known' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => TypedValuesDto)
  common?: TypedValuesDto;

  @ApiPropertyOptional({ type: KnownGridDto, description: 'Size of the grid and the levels that are known; or give a table' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => KnownGridDto)
  grid?: KnownGridDto;

  @ApiPropertyOptional({ description: 'Rows pasted from a spreadsheet, headings first; or give a grid', maxLength: MAX_TABLE_LENGTH })
  @MayBeAbsent()
  @IsString()
  @MaxLength(MAX_TABLE_LENGTH, { message: 'This table is too long. Paste one plate at a time.' })
  table?: string;

  @ApiPropertyOptional({ enum: ['.', ','], description: 'Decimal sign of the table; absent: a point' })
  @MayBeAbsent()
  @IsIn(['.', ','], { message: 'The decimal sign is a point or a comma.' })
  decimalSign?: '.' | ',';

  @ApiPropertyOptional({ description: 'true: import the rows that can be read although others are refused' })
  @MayBeAbsent()
  @IsBoolean()
  leaveOutRefusedRows?: boolean;
}

export class ImportedCellDto {
  @ApiProperty({ description: 'Row letter and column number' }) address: string;
  @ApiProperty({ description: 'Row from 0' }) rowIndex: number;
  @ApiProperty({ description: 'Column from 0' }) columnIndex: number;
  @ApiProperty({ type: ParameterSetDto, description: 'What is known of it' }) parameters: ParameterSetDto;
  @ApiProperty({ type: DoseDto, description: 'Areal dose' }) dose: DoseDto;
  @ApiProperty({ description: 'Note from the table' }) note: string;
}

export class RefusedRowDto {
  @ApiProperty({ description: 'Line of the pasted text, from 1' }) line: number;
  @ApiProperty({ description: 'The line as pasted, cut short' }) text: string;
  @ApiProperty({ description: 'Why it is refused, and the way out' }) reason: string;
}

/** What an import would store. */
export class ImportPreviewDto {
  @ApiProperty({ description: 'Rows of cells' }) rows: number;
  @ApiProperty({ description: 'Columns of cells' }) columns: number;
  @ApiProperty({ type: [ImportedCellDto], description: 'Cells' }) cells: ImportedCellDto[];
  @ApiProperty({ type: [RefusedRowDto], description: 'Rows of the table that cannot be read' }) refusedRows: RefusedRowDto[];
  @ApiProperty({ type: [String], description: 'Headings that say nothing here; their columns are left out' }) ignoredHeadings: string[];
  @ApiProperty({ type: [String], description: 'What will be marked as unknown' }) unknownFields: string[];
}
