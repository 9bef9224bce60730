import { Injectable, type INestApplication } from '@nestjs/common';
import { DocumentBuilder, SwaggerModule, type OpenAPIObject } from '@nestjs/swagger';
import { cleanupOpenApiDoc } from 'nestjs-zod';

/** Holds the document, which can be made only once every route is known. */
@Injectable()
export class OpenApiDocument {
  private made: OpenAPIObject | undefined;

  make(app: INestApplication): void {
    const settings = new DocumentBuilder()
      .setTitle('Noonwell')
      .setDescription(
        'Heat and power from one dish, hour by hour. Errors are problem details (RFC 9457). Units stand in the names of fields.',
      )
      .setVersion('1')
      .setOpenAPIVersion('3.1.0')
      .addBearerAuth()
      .build();
    this.made = cleanupOpenApiDoc(SwaggerModule.createDocument(app, settings));
  }

  get document(): OpenAPIObject {
    if (this.made === undefined) throw new Error('The document is made when the app is.');
    return this.made;
  }
}
