import { Controller, Ip, Req, Res } from '@nestjs/common';
import type { Answer, Handled } from '@windchest/contracts';
import { parse as parseCookies } from 'cookie';
import type { Request, Response } from 'express';
import { InjectConfig, type Config } from '../config/config.js';
import { Endpoint, Input } from '../http/endpoint.js';
import { MaybePerson, type SignedIn } from '../http/person.js';
import { Collections } from './collections.js';
import { FileGrants } from './file-grants.js';
import { Holders } from './holders.js';
import { ServeFile } from './serve-file.js';

/** Marks the browser to which addresses by a mailed link are bound. */
const COOKIE = 'windchest_files';
const cookieOf = (request: Request): string | undefined => parseCookies(request.headers.cookie ?? '')[COOKIE];

@Controller()
export class DeliveryController {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly collections: Collections,
    private readonly grants: FileGrants,
    private readonly serveFile: ServeFile,
    private readonly holders: Holders,
  ) {}

  @Endpoint('GET /collect/:token')
  open(
    @Input() { params }: Handled<'GET /collect/:token'>,
    @Ip() network: string,
  ): Promise<Answer<'GET /collect/:token'>> {
    return this.collections.open(params.token, network);
  }

  @Endpoint('POST /collect/:token/grants')
  async grant(
    @Input() { params, body }: Handled<'POST /collect/:token/grants'>,
    @Req() request: Request,
    @Res({ passthrough: true }) response: Response,
  ): Promise<Answer<'POST /collect/:token/grants'>> {
    const { grant, cookie } = await this.grants.forLink(params.token, body, cookieOf(request));
    response.cookie(COOKIE, cookie, {
      httpOnly: true,
      sameSite: 'lax',
      secure: this.config.BASE_URL.startsWith('https:'),
      path: '/api',
      maxAge: 86_400_000,
    });
    return grant;
  }

  @Endpoint('POST /collect/:token/replacement')
  replace(
    @Input() { params }: Handled<'POST /collect/:token/replacement'>,
    @Ip() network: string,
  ): Promise<void> {
    return this.collections.replace(params.token, network);
  }

  @Endpoint('POST /collect/lost')
  lost(@Input() { body }: Handled<'POST /collect/lost'>, @Ip() network: string): Promise<void> {
    return this.collections.replaceAllOf(body.email, network);
  }

  @Endpoint('GET /files/:grant')
  file(
    @Input() { params }: Handled<'GET /files/:grant'>,
    @MaybePerson() person: SignedIn | null,
    @Req() request: Request,
    @Res() response: Response,
  ): Promise<void> {
    return this.serveFile.serve(
      { grant: params.grant, person, cookie: cookieOf(request), isHead: request.method === 'HEAD' },
      response,
    );
  }

  @Endpoint('POST /workshop/orders/:orderId/link')
  resend(@Input() { params }: Handled<'POST /workshop/orders/:orderId/link'>): Promise<void> {
    return this.collections.resend(params.orderId);
  }

  @Endpoint('GET /workshop/holders')
  listHolders(@Input() input: Handled<'GET /workshop/holders'>): Promise<Answer<'GET /workshop/holders'>> {
    return this.holders.list(input);
  }
}
