import { type ArgumentMetadata, Injectable, ValidationPipe } from '@nestjs/common';
import type { ValidationError } from 'class-validator';
import { type FieldProblem, InvalidError } from '../errors/domain-error';
import { fieldSentence } from './field-sentence';

/** Checks every request class; a refusal names each wrong field once, with a JSON pointer and a sentence for people. */
@Injectable()
export class RequestValidationPipe extends ValidationPipe {
  constructor() {
    super({
      whitelist: true,
      forbidNonWhitelisted: true,
      forbidUnknownValues: true,
      transform: true,
      exceptionFactory: (errors) => invalidFields(fieldProblems(errors)),
    });
  }

  override async transform(value: unknown, metadata: ArgumentMetadata): Promise<unknown> {
    const isObject = typeof value === 'object' && value !== null && !Array.isArray(value);
    const wantsObject = metadata.type === 'body' && metadata.metatype !== undefined && metadata.metatype !== Object;
    if (wantsObject && !isObject) {
      // an absent body still names every field that is needed; a list or a bare value cannot
      if (value === undefined || value === null) return super.transform({}, metadata);
      throw invalidFields([{ pointer: '#', detail: 'Send one JSON object.' }]);
    }
    const broken = firstUnstorableText(value, '#');
    if (broken !== undefined)
      throw invalidFields([{ pointer: broken, detail: 'This holds a character that cannot be stored. Type it again.' }]);
    return super.transform(value, metadata);
  }
}

const invalidFields = (problems: FieldProblem[]) =>
  new InvalidError(problems.length === 1 ? 'One field needs another look.' : `${problems.length} fields need another look.`, problems);

/** Every wrong field, nested ones included, in the order of the request class. */
export function fieldProblems(errors: readonly ValidationError[], parent = '#'): FieldProblem[] {
  return errors.flatMap((error) => {
    const pointer = `${parent}/${escapePointer(error.property)}`;
    const nested = fieldProblems(error.children ?? [], pointer);
    return error.constraints === undefined ? nested : [{ pointer, detail: fieldSentence(error) }, ...nested];
  });
}

/** RFC 6901 escaping, then percent-encoding for the URI fragment. */
const escapePointer = (property: string) => encodeURIComponent(property.replaceAll('~', '~0').replaceAll('/', '~1'));

/** NUL, and half of a surrogate pair: neither PostgreSQL nor a hash can hold them. */
const LONE_SURROGATE = /\p{Surrogate}/u;

/** The pointer of the first string that cannot be stored. */
function firstUnstorableText(value: unknown, pointer: string): string | undefined {
  if (typeof value === 'string') return value.includes('\u0000') || LONE_SURROGATE.test(value) ? pointer : undefined;
  if (typeof value !== 'object' || value === null || Buffer.isBuffer(value)) return undefined;
  for (const [key, inner] of Object.entries(value)) {
    const found = firstUnstorableText(inner, `${pointer}/${escapePointer(key)}`);
    if (found !== undefined) return found;
  }
  return undefined;
}
