import { Injectable, type PipeTransform } from '@nestjs/common';
import { NotFoundError } from '../errors/domain-error';

const UUID = /^[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/i;

/** An id in an address. What is no id at all names nothing, so it answers 404 like an unknown one. */
@Injectable()
export class IdPipe implements PipeTransform<string, string> {
  transform(value: string): string {
    if (!UUID.test(value)) throw new NotFoundError();
    return value.toLowerCase();
  }
}
