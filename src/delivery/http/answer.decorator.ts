import { applyDecorators, HttpCode } from '@nestjs/common';
import { ApiResponse } from '@nestjs/swagger';
import type { z } from 'zod';

/** The status of a route's usual answer, and for the description its shape. */
export const Answer = (status: number, schema?: z.ZodType) =>
  applyDecorators(
    HttpCode(status),
    ApiResponse({ status, ...(schema === undefined ? {} : { standardSchema: schema }) }),
  );
