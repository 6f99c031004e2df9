import type { INestApplication } from '@nestjs/common';
import { DocumentBuilder, type OpenAPIObject, SwaggerModule } from '@nestjs/swagger';
import { cleanupOpenApiDoc } from 'nestjs-zod';

const problemSchema = {
  type: 'object' as const,
  required: ['type', 'title', 'status', 'code'],
  properties: {
    type: { type: 'string' as const },
    title: { type: 'string' as const },
    status: { type: 'integer' as const },
    detail: { type: 'string' as const },
    instance: { type: 'string' as const },
    code: { type: 'string' as const },
    errors: { type: 'array' as const, items: { type: 'object' as const } },
  },
};

/** The description of the interface, made from the routes themselves. */
export function openApiDocument(app: INestApplication): OpenAPIObject {
  const base = new DocumentBuilder()
    .setOpenAPIVersion('3.1.0')
    .setTitle('Siltlight')
    .setDescription(
      'Radiative forcing of dust and other aerosol in past time slices. Errors are application/problem+json.',
    )
    .setVersion('1')
    .addBearerAuth({ type: 'http', scheme: 'bearer', description: 'A personal access token.' })
    .addGlobalResponse({
      status: 'default' as never,
      description: 'What went wrong, and what to do about it',
      content: { 'application/problem+json': { schema: problemSchema } },
    })
    .build();
  return cleanupOpenApiDoc(SwaggerModule.createDocument(app, base, { autoTagControllers: true }), {
    version: '3.1',
  });
}
