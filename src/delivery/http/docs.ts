import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { DocumentBuilder, SwaggerModule } from '@nestjs/swagger';
import type { OpenAPIObject } from '@nestjs/swagger';

const cautions =
  'Flags are a screen, not a diagnosis: the team physician decides. Dates are YYYY-MM-DD, both ends included; ' +
  'instants carry Z or an offset. Every POST takes an Idempotency-Key. Errors are problem documents (RFC 9457).';

/** The description of all routes at /docs/json and a page to try them at /docs, with nothing from elsewhere. */
export function serveDocs(app: NestFastifyApplication): void {
  const description = new DocumentBuilder()
    .setTitle('Loadweir')
    .setDescription(cautions)
    .setVersion('1')
    .setOpenAPIVersion('3.0.3')
    .addBearerAuth({ type: 'http', scheme: 'bearer', description: 'A person’s access token: lw.…' })
    .addBearerAuth({ type: 'http', scheme: 'bearer', description: 'The operator’s key' }, 'operator')
    .build();
  // Made when first asked for: most starts of the service never are.
  const document = () => {
    const made = SwaggerModule.createDocument(app, description);
    for (const [path, item] of Object.entries(made.paths)) sayWhatAllShare(path, item);
    return made;
  };
  SwaggerModule.setup('docs', app, document, {
    jsonDocumentUrl: 'docs/json',
    raw: ['json'],
    customSiteTitle: 'Loadweir',
    customCss: '.swagger-ui .topbar { display: none }',
    swaggerOptions: { validatorUrl: null },
  });
}

type PathItem = OpenAPIObject['paths'][string];

/** What the way in and the way out do for every route: keys, the bearer's token, problem documents. */
function sayWhatAllShare(path: string, item: PathItem): void {
  for (const method of ['get', 'post', 'put', 'patch', 'delete'] as const) {
    const operation = item[method];
    if (operation === undefined) continue;
    operation.responses.default = { description: 'A problem', content: { 'application/problem+json': problem } };
    if (!path.startsWith('/v1/')) continue;
    operation.security ??= [{ bearer: [] }];
    const parameters = (operation.parameters ??= []);
    if (method === 'post' && !parameters.some((one) => 'name' in one && one.name === idempotencyKey.name)) {
      parameters.push(idempotencyKey);
    }
  }
}

const idempotencyKey = {
  name: 'Idempotency-Key',
  in: 'header' as const,
  required: false,
  description: 'The same request with the same key is done once and answered the same.',
  schema: { type: 'string', minLength: 1, maxLength: 200, pattern: '^[\\x21-\\x7e]+$' },
};

const text = { type: 'string' };
const fieldError = {
  type: 'object',
  required: ['field', 'allowed'],
  properties: { field: text, value: {}, allowed: text, hint: text },
};
const problem = {
  schema: {
    type: 'object',
    required: ['type', 'title', 'status', 'detail', 'instance', 'correlationId'],
    properties: {
      type: { type: 'string', example: 'urn:loadweir:problem:invalid-input' },
      title: text,
      status: { type: 'integer' },
      detail: text,
      instance: text,
      correlationId: text,
      errors: { type: 'array', items: fieldError },
    },
  },
};
