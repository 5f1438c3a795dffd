import { Injectable } from '@nestjs/common';
import type { ArgumentMetadata, PipeTransform } from '@nestjs/common';
import { z } from 'zod';
import { ValidationError } from '../../platform/errors.ts';
import { fieldErrors } from '../../platform/field-errors.ts';

/**
 * Checks every body, query and path parameter against the zod schema of its decorator. An argument without a schema is
 * a defect and is refused, because nothing would be checked.
 */
@Injectable()
export class ZodPipe implements PipeTransform {
  async transform(value: unknown, { type, schema, data }: ArgumentMetadata): Promise<unknown> {
    if (type === 'custom') return value;
    if (!(schema instanceof z.ZodType)) throw new Error(`a handler takes a ${type} without a zod schema`);
    const given = type === 'body' && (value === undefined || value === null) ? {} : value;
    const result = await schema.safeParseAsync(given, { reportInput: true });
    if (!result.success) throw new ValidationError(fieldErrors(result.error, data ?? ''));
    return result.data;
  }
}
