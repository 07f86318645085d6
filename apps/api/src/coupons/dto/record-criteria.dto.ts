import { ApiProperty } from '@nestjs/swagger';
import { Type } from 'class-transformer';
import { ArrayMaxSize, IsArray, ValidateNested } from 'class-validator';
import { CriterionDto } from '../../materials/dto/effect.dto';

const MAX_CRITERIA = 20;

export class RecordCriteriaDto {
  @ApiProperty({ type: [CriterionDto], description: 'What a mark must meet. An empty list says: ratings alone decide.' })
  @IsArray({ message: 'Give the criteria as a list; an empty one says that ratings alone decide.' })
  @ArrayMaxSize(MAX_CRITERIA, { message: `Give at most ${MAX_CRITERIA} criteria.` })
  @ValidateNested({ each: true })
  @Type(() => CriterionDto)
  criteria: CriterionDto[];
}
