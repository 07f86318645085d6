import type { EnteredPart, PartResults } from '@proofplate/recipe-model';
import type { PartResultsDto, PartSetUpDto } from './dto/part-set-up.dto';
import type { SavePartSetUpDto } from './dto/save-part-set-up.dto';
import type { PartSetUpRow } from './part-set-ups.repository';

export function toPartSetUpDto({ id, number, entered, ground, results, savedByName, createdAt }: PartSetUpRow): PartSetUpDto {
  return { id, number, entered, ground, results: toResultsDto(results), savedBy: savedByName, savedAt: createdAt.toISOString() };
}

function toResultsDto({ isMirrored, stripLimit, numbers }: PartResults): PartResultsDto {
  return { isMirrored, stripLimit, numbers: numbers.map((number) => ({ ...number, inputs: { ...number.inputs } })) };
}

/** What was typed, without the fields that were left out. */
export function enteredOf(dto: SavePartSetUpDto): EnteredPart {
  const given = Object.entries(dto).filter(([, value]) => value !== undefined);
  const plain = given.map(([field, value]) => [field, typeof value === 'object' ? { ...value } : value]);
  // the request class has exactly the fields of an entered part
  return Object.fromEntries(plain) as EnteredPart;
}
