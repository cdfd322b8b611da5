import { Injectable, type CanActivate, type ExecutionContext } from '@nestjs/common';
import type { Request } from 'express';
import { InjectConfig, type Config } from '../config/config.js';
import { endpointOf } from './endpoint.js';
import { Refusal } from './refusal.js';

const SAFE = new Set(['GET', 'HEAD', 'OPTIONS']);

/**
 * Protection of cookie sessions against requests from other sites: what changes anything must carry
 * the shop's own header, which another site's form cannot send and its script may not (no CORS), and
 * where the browser tells its origin it must be ours.
 */
@Injectable()
export class SameSiteGuard implements CanActivate {
  private readonly origin: string;

  constructor(@InjectConfig() config: Config) {
    this.origin = new URL(config.BASE_URL).origin;
  }

  canActivate(context: ExecutionContext): boolean {
    const request = context.switchToHttp().getRequest<Request>();
    if (SAFE.has(request.method) || endpointOf(context)?.isCalledFromOutside) return true;
    const { origin, 'sec-fetch-site': site, 'x-windchest': own } = request.headers;
    const isForeign =
      (origin !== undefined && origin !== this.origin) || (site !== undefined && site !== 'same-origin');
    if (own !== '1' || isForeign)
      throw new Refusal('cross-site-refused', 'This request did not come from a page of the shop.');
    return true;
  }
}
