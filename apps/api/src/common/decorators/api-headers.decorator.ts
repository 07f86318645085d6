import { ApiHeader } from '@nestjs/swagger';

/** Describes the If-Match header of an edit. */
export const ApiIfMatch = () =>
  ApiHeader({
    name: 'If-Match',
    required: true,
    description: 'ETag of the version that was read, such as "v3"',
    schema: { type: 'string' },
  });
