import { ApiProperty, ApiPropertyOptional } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { ArrayMaxSize, ArrayMinSize, IsArray, IsIn, IsNumber, Max, Min, ValidateNested } from 'class-validator';
import { MayBeAbsent } from '../../common/decorators/may-be-absent';
import { CornerDto } from './photo.dto';

const CORNERS = 4;

class GivenCornerDto extends CornerDto {
  @IsNumber({ allowNaN: false, allowInfinity: false }) @Min(0) @Max(1) declare x: number;
  @IsNumber({ allowNaN: false, allowInfinity: false }) @Min(0) @Max(1) declare y: number;
}

export class SetCornersDto {
  @ApiProperty({
    type: [CornerDto],
    minItems: CORNERS,
    maxItems: CORNERS,
    description: 'Corners of the plate, clockwise from the origin mark',
  })
  @IsArray()
  @ArrayMinSize(CORNERS)
  @ArrayMaxSize(CORNERS)
  @ValidateNested({ each: true })
  @Type(() => GivenCornerDto)
  corners: GivenCornerDto[];

  @ApiPropertyOptional({ enum: ['hand', 'marks'], default: 'hand', description: 'Set by a person, or found by the corner marks' })
  @MayBeAbsent()
  @IsIn(['hand', 'marks'])
  foundBy: 'hand' | 'marks' = 'hand';
}
