import { Body, Controller, Get, Param, Patch, Post, Query } from '@nestjs/common';
import { ApiBearerAuth, ApiCreatedResponse, ApiOkResponse, ApiOperation, ApiTags } from '@nestjs/swagger';
import type { Actor } from '../common/actor';
import { ApiIfMatch } from '../common/decorators/api-headers.decorator';
import { AtLeast } from '../common/decorators/at-least.decorator';
import { CurrentMember } from '../common/decorators/current-member.decorator';
import { Idempotent } from '../common/decorators/idempotent.decorator';
import { IfMatch } from '../common/decorators/if-match.decorator';
import { IdPipe } from '../common/pipes/id.pipe';
import { CreateDraftDto, CreateRecipeDto, RecipeFromCellDto, UpdateRecipeDto } from './dto/create-recipe.dto';
import { ListRecipesQuery } from './dto/list-recipes.query.dto';
import { ListPowerShiftsQuery, RecipePowerShiftPageDto } from './dto/power-shift.dto';
import { RecipeDto, RecipePageDto } from './dto/recipe.dto';
import { RecipeRevisionDto } from './dto/recipe-revision.dto';
import { PowerShiftsService } from './power-shifts.service';
import { RecipeDraftingService } from './recipe-drafting.service';
import { RecipesService } from './recipes.service';

@ApiTags('recipes')
@ApiBearerAuth()
@Controller('recipes')
@AtLeast('operator')
export class RecipesController {
  constructor(
    private readonly recipes: RecipesService,
    private readonly drafting: RecipeDraftingService,
    private readonly powerShifts: PowerShiftsService,
  ) {}

  @Get()
  @ApiOperation({ summary: 'Recipes of the shop with counts for every choice; what needs the caller first' })
  @ApiOkResponse({ type: RecipePageDto })
  list(@CurrentMember() actor: Actor, @Query() query: ListRecipesQuery) {
    return this.recipes.list(actor, query);
  }

  @Post('from-cell')
  @Idempotent()
  @ApiOperation({ summary: 'Draft a recipe from a cell: a new recipe, or a draft of one with the same five keys' })
  @ApiCreatedResponse({ type: RecipeRevisionDto })
  fromCell(@CurrentMember() actor: Actor, @Body() dto: RecipeFromCellDto) {
    return this.drafting.fromCell(actor, dto);
  }

  @Post()
  @Idempotent()
  @ApiOperation({ summary: 'Begin a recipe whose setting does not come from a coupon' })
  @ApiCreatedResponse({ type: RecipeRevisionDto })
  create(@CurrentMember() actor: Actor, @Body() dto: CreateRecipeDto) {
    return this.drafting.create(actor, dto);
  }

  @Get('power-shifts')
  @ApiOperation({ summary: 'Approved settings and how far later readings of the power meter have moved their watts' })
  @ApiOkResponse({ type: RecipePowerShiftPageDto })
  listPowerShifts(@CurrentMember() actor: Actor, @Query() query: ListPowerShiftsQuery) {
    return this.powerShifts.list(actor, query);
  }

  @Get(':recipeId')
  @ApiOperation({ summary: 'One recipe with its ladder, its holds and the approved revision' })
  @ApiOkResponse({ type: RecipeDto })
  get(@CurrentMember() actor: Actor, @Param('recipeId', IdPipe) recipeId: string) {
    return this.recipes.get(actor, recipeId);
  }

  @Patch(':recipeId')
  @ApiIfMatch()
  @ApiOperation({ summary: 'Change the title; the scope only while nothing was submitted' })
  @ApiOkResponse({ type: RecipeDto })
  update(
    @CurrentMember() actor: Actor,
    @Param('recipeId', IdPipe) recipeId: string,
    @IfMatch() version: number,
    @Body() dto: UpdateRecipeDto,
  ) {
    return this.recipes.update(actor, recipeId, version, dto);
  }

  @Post(':recipeId/drafts')
  @Idempotent()
  @ApiOperation({ summary: 'Propose a change: a draft that copies an earlier revision' })
  @ApiCreatedResponse({ type: RecipeRevisionDto })
  createDraft(@CurrentMember() actor: Actor, @Param('recipeId', IdPipe) recipeId: string, @Body() dto: CreateDraftDto) {
    return this.drafting.createDraft(actor, recipeId, dto);
  }
}
