import { ApiProperty, ApiPropertyOptional, PartialType } from '@nestjs/swagger';
import { type CautionLevel, MATERIAL_FAMILY_KEYS, type MaterialFamily } from '@proofplate/recipe-model';
import { Transform, Type } from 'class-transformer';
import { ArrayMaxSize, IsIn, IsOptional, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { NumberBetween } from '../../common/decorators/number-between.decorator';
import { RequiredText, TrimmedText } from '../../common/decorators/trimmed-text.decorator';
import { ArchivedQuery } from '../../common/pagination/archived.query';
import { PageOf } from '../../common/pagination/page';

export const MAX_NAME_LENGTH = 120;
const MAX_WORD_LENGTH = 120;
const MAX_NOTES_LENGTH = 2000;
const MAX_SOURCE_LENGTH = 300;
const SOURCE_MESSAGE = 'Say where the number comes from; without a source it is not kept.';

export class ConductivityDto {
  @ApiProperty({ description: 'Thermal conductivity, W/(m·K)' })
  @NumberBetween(0.001, 3000, { what: 'The conductivity', unit: 'W/(m·K)' })
  value: number;

  @ApiProperty({ description: 'Where the number comes from', maxLength: MAX_SOURCE_LENGTH })
  @RequiredText(MAX_SOURCE_LENGTH, SOURCE_MESSAGE)
  source: string;
}

export class DensityDto {
  @ApiProperty({ description: 'Density, kg/m³' })
  @NumberBetween(1, 25_000, { what: 'The density', unit: 'kg/m³' })
  value: number;

  @ApiProperty({ description: 'Where the number comes from', maxLength: MAX_SOURCE_LENGTH })
  @RequiredText(MAX_SOURCE_LENGTH, SOURCE_MESSAGE)
  source: string;
}

export class HeatCapacityDto {
  @ApiProperty({ description: 'Specific heat capacity, J/(kg·K)' })
  @NumberBetween(10, 20_000, { what: 'The heat capacity', unit: 'J/(kg·K)' })
  value: number;

  @ApiProperty({ description: 'Where the number comes from', maxLength: MAX_SOURCE_LENGTH })
  @RequiredText(MAX_SOURCE_LENGTH, SOURCE_MESSAGE)
  source: string;
}

/** Numbers of the material, each with its source. */
export class MaterialPropertiesDto {
  @ApiPropertyOptional({ type: ConductivityDto, description: 'Thermal conductivity' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => ConductivityDto)
  thermalConductivityWPerMK?: ConductivityDto;

  @ApiPropertyOptional({ type: DensityDto, description: 'Density' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => DensityDto)
  densityKgPerM3?: DensityDto;

  @ApiPropertyOptional({ type: HeatCapacityDto, description: 'Specific heat capacity' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => HeatCapacityDto)
  heatCapacityJPerKgK?: HeatCapacityDto;
}

export class CreateMaterialDto {
  @ApiProperty({ description: 'Name in the shop, such as the one on the rack; unique', maxLength: MAX_NAME_LENGTH })
  @RequiredText(MAX_NAME_LENGTH, 'Give the material the name that people in the shop use.')
  name: string;

  @ApiProperty({
    description: 'Family: its code, its label or a synonym ("vinyl" is PVC). A word that is not listed counts as unknown',
    maxLength: MAX_WORD_LENGTH,
  })
  @RequiredText(MAX_WORD_LENGTH, 'Say what the material is, such as stainless steel or acrylic.')
  family: string;

  @ApiPropertyOptional({ description: 'Grade or alloy', maxLength: MAX_WORD_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_WORD_LENGTH)
  grade?: string;

  @ApiPropertyOptional({ description: 'Designation of a standard', maxLength: MAX_WORD_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_WORD_LENGTH)
  standardDesignation?: string;

  @ApiPropertyOptional({ description: 'Who supplies it', maxLength: MAX_WORD_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_WORD_LENGTH)
  supplier?: string;

  @ApiPropertyOptional({ type: Number, nullable: true, description: 'Usual thickness, mm; null: none' })
  @IsOptional()
  @NumberBetween(0.001, 1000, { what: 'The thickness', unit: 'mm' })
  thicknessMm?: number | null;

  @ApiPropertyOptional({ type: MaterialPropertiesDto, description: 'Numbers of the material, each with its source' })
  @MayBeAbsent()
  @ValidateNested()
  @Type(() => MaterialPropertiesDto)
  properties?: MaterialPropertiesDto;

  @ApiPropertyOptional({ description: 'Anything worth knowing', maxLength: MAX_NOTES_LENGTH })
  @MayBeAbsent()
  @TrimmedText(MAX_NOTES_LENGTH)
  notes?: string;
}

/** Only what is given changes. */
export class UpdateMaterialDto extends PartialType(CreateMaterialDto) {}

export class MaterialCautionDto {
  @ApiProperty({ description: 'Id of the caution', format: 'uuid' }) id: string;
  @ApiProperty({ enum: ['never', 'care'], description: 'never: it must not be marked; care: look here first' }) level: CautionLevel;
  @ApiProperty({ description: 'What to do' }) subject: string;
}

export class MaterialDto {
  @ApiProperty({ description: 'Id of the material', format: 'uuid' }) id: string;
  @ApiProperty({ description: 'Name in the shop' }) name: string;
  @ApiProperty({ enum: MATERIAL_FAMILY_KEYS, description: 'Family from the closed list' }) family: MaterialFamily;
  @ApiProperty({ description: 'The family in words' }) familyLabel: string;
  @ApiProperty({ description: 'Grade or alloy; empty: not entered' }) grade: string;
  @ApiProperty({ description: 'Designation of a standard; empty: not entered' }) standardDesignation: string;
  @ApiProperty({ description: 'Supplier; empty: not entered' }) supplier: string;
  @ApiProperty({ type: Number, nullable: true, description: 'Usual thickness, mm' }) thicknessMm: number | null;
  @ApiProperty({ type: MaterialPropertiesDto, description: 'Numbers of the material, each with its source' })
  properties: MaterialPropertiesDto;
  @ApiProperty({ description: 'Notes of the shop' }) notes: string;
  @ApiProperty({ type: [MaterialCautionDto], description: 'Cautions that name this material or its family, never first' })
  cautions: MaterialCautionDto[];
  @ApiProperty({ type: String, nullable: true, format: 'date-time', description: 'When it was archived; null: in use' })
  archivedAt: string | null;
  @ApiProperty({ description: 'Number of the stored version; the ETag is "v" and this number' }) version: number;
  @ApiProperty({ type: [String], description: 'What the caller may do: edit, archive, restore' }) allowedActions: string[];
}

export class MaterialPageDto extends PageOf(MaterialDto) {}

export class ListMaterialsQuery extends ArchivedQuery {
  @ApiPropertyOptional({ enum: MATERIAL_FAMILY_KEYS, isArray: true, description: 'Only these families; give it once for each' })
  @IsOptional()
  @Transform(({ value }: { value: unknown }) => (Array.isArray(value) ? value : [value]))
  @ArrayMaxSize(MATERIAL_FAMILY_KEYS.length)
  @IsIn(MATERIAL_FAMILY_KEYS, { each: true, message: 'This is no family of the list.' })
  family?: MaterialFamily[];

  @ApiPropertyOptional({ description: 'Words to find in name, grade, designation or supplier', maxLength: MAX_WORD_LENGTH })
  @IsOptional()
  @TrimmedText(MAX_WORD_LENGTH)
  q?: string;
}

export class FamilyCountDto {
  @ApiProperty({ enum: MATERIAL_FAMILY_KEYS, description: 'Family' }) family: MaterialFamily;
  @ApiProperty({ description: 'The family in words' }) label: string;
  @ApiProperty({ description: 'Materials in use that belong to it' }) count: number;
}

export class MaterialFacetsDto {
  @ApiProperty({ type: [FamilyCountDto], description: 'Families that have materials, by label' }) families: FamilyCountDto[];
}
