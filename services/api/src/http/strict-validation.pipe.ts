import { Injectable, type ArgumentMetadata } from '@nestjs/common';
import { createZodValidationPipe } from 'nestjs-zod';

const StrictPipe = createZodValidationPipe({ strictSchemaDeclaration: true });

/** Every body, query and path parameter must be declared by a schema; a forgotten one fails at its first use. */
@Injectable()
export class StrictValidationPipe extends StrictPipe {
  override transform(value: unknown, metadata: ArgumentMetadata): unknown {
    // What our own decorators hand over (the signed-in person, the uploaded file) is not input as it was sent.
    if (metadata.type === 'custom') return value;
    const checked: unknown = super.transform(value, metadata);
    return checked;
  }
}
