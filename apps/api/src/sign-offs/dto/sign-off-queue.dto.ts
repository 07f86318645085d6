import { ApiProperty } from '@nestjs/swagger';
import { PageOf } from '../../common/pagination/page';
import { RevisionBriefDto, RevisionRecipeDto } from '../../recipes/dto/recipe-revision.dto';

/** A revision that waits for a signature. */
export class QueuedRevisionDto {
  @ApiProperty({ type: RevisionRecipeDto, description: 'The recipe' }) recipe: RevisionRecipeDto;
  @ApiProperty({ type: RevisionBriefDto, description: 'The revision in review' }) revision: RevisionBriefDto;
  @ApiProperty({ description: 'true: the caller wrote it' }) isOwn: boolean;
  @ApiProperty({ description: 'true: the recipe has an approved revision that this one would supersede' }) hasCurrent: boolean;
  @ApiProperty({ type: [String], description: 'What the caller may do: approve, return, recall' }) allowedActions: string[];
}

export class SignOffQueueDto extends PageOf(QueuedRevisionDto) {
  @ApiProperty({ description: 'How many wait in all' }) totalCount: number;
}
