import { Injectable, type CallHandler, type ExecutionContext, type NestInterceptor } from '@nestjs/common';
import { map, type Observable } from 'rxjs';
import { z } from 'zod';
import { endpointOf } from './endpoint.js';

/** Strips every answer to the contract's schema, so that no inner field ever leaves by accident. */
@Injectable()
export class AnswerShapeInterceptor implements NestInterceptor {
  intercept(context: ExecutionContext, next: CallHandler): Observable<unknown> {
    const schema = endpointOf(context)?.response;
    if (schema === 'stream') return next.handle();
    return next
      .handle()
      .pipe(map((answer: unknown) => (schema instanceof z.ZodType ? schema.parse(answer) : undefined)));
  }
}
