import { Injectable, type PipeTransform } from '@nestjs/common';
import { NotFoundError } from '../common/errors/domain-error';

const RUN_KEY = /^(?:J-\d{1,9}|[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12})$/u;

/** Id or code of a run in an address. What is neither names nothing. */
@Injectable()
export class RunKeyPipe implements PipeTransform<string, string> {
  transform(value: string): string {
    const key = value.startsWith('J-') ? value : value.toLowerCase();
    if (!RUN_KEY.test(key)) throw new NotFoundError();
    return key;
  }
}
