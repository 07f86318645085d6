import { ApiProperty } from '@nestjs/swagger';
import { NamedDto } from '../../coupons/dto/coupon.dto';
import { PanelDto } from '../../machines/dto/panel.dto';
import { MarkStepDto, SetUpStepDto } from '../../recipes/dto/mark-step.dto';
import { DeviationDto } from './deviation.dto';
import { RunHoldDto, RunRecipeDto, RunRevisionDto } from './run.dto';
import { RunCautionDto } from './run-surroundings.dto';

/** What has to be known and done before a run of a revision starts. */
export class StartSheetDto {
  @ApiProperty({ type: RunRecipeDto, description: 'Recipe' }) recipe: RunRecipeDto;
  @ApiProperty({ type: RunRevisionDto, description: 'Revision' }) revision: RunRevisionDto;
  @ApiProperty({ type: NamedDto, description: 'Machine' }) machine: NamedDto;
  @ApiProperty({ type: NamedDto, description: 'Material' }) material: NamedDto;
  @ApiProperty({ type: NamedDto, description: 'Finish' }) finish: NamedDto;
  @ApiProperty({ type: NamedDto, description: 'Effect' }) effect: NamedDto;
  @ApiProperty({ type: NamedDto, description: 'Lens that must be fitted' }) lens: NamedDto;
  @ApiProperty({ type: [NamedDto], description: 'Lenses of the shop, to say which one is fitted' }) lenses: NamedDto[];
  @ApiProperty({ type: PanelDto, description: 'The fields of the machine’s control, in its order' }) panel: PanelDto;
  @ApiProperty({ type: [MarkStepDto], description: 'Mark steps' }) steps: MarkStepDto[];
  @ApiProperty({ type: [SetUpStepDto], description: 'Set-up steps' }) setUpSteps: SetUpStepDto[];
  @ApiProperty({ type: [RunCautionDto], description: 'Cautions of the work, never first' }) cautions: RunCautionDto[];
  @ApiProperty({ type: [RunHoldDto], description: 'Open holds; nothing starts while there is one' }) holds: RunHoldDto[];
  @ApiProperty({ type: [DeviationDto], description: 'Deviations that a run may cite now' }) deviations: DeviationDto[];
  @ApiProperty({ type: [String], description: 'Kinds of run that may cite it now' }) kinds: string[];
}
