import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { DocumentBuilder, SwaggerModule } from '@nestjs/swagger';

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
  const document = SwaggerModule.createDocument(app, description);
  SwaggerModule.setup('docs', app, document, {
    jsonDocumentUrl: 'docs/json',
    raw: ['json'],
    customSiteTitle: 'Loadweir',
    swaggerOptions: { validatorUrl: null },
  });
}
