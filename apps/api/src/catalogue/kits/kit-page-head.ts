import { Injectable, type OnModuleInit } from '@nestjs/common';
import { decimalText } from '@windchest/money';
import { InjectConfig, type Config } from '../../config/config.js';
import { escapeHtml, PageHeads, type PageHead } from '../../http/page-heads.js';
import { Refusal } from '../../http/refusal.js';
import { ShopKits } from './shop-kits.js';

/** Title, description and structured data of a kit's page, for shared links and search engines. */
@Injectable()
export class KitPageHead implements OnModuleInit {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly heads: PageHeads,
    private readonly kits: ShopKits,
  ) {}

  onModuleInit(): void {
    this.heads.register((path) => this.headOf(path));
  }

  private async headOf(path: string): Promise<PageHead | null> {
    const slug = /^\/kits\/([a-z0-9-]{2,60})\/?$/.exec(path)?.[1];
    if (!slug) return null;
    const kit = await this.kits.read(slug).catch((fault: unknown) => {
      if (fault instanceof Refusal) return null;
      throw fault;
    });
    if (!kit) return null;
    const price = decimalText(kit.price);
    const product = {
      '@context': 'https://schema.org',
      '@type': 'Product',
      name: kit.name,
      description: kit.tagline,
      sku: `${kit.slug} ${kit.revision}`,
      brand: { '@type': 'Brand', name: this.config.WORKSHOP_NAME },
      offers: {
        '@type': 'Offer',
        url: new URL(`/kits/${kit.slug}`, this.config.BASE_URL).href,
        price,
        priceCurrency: kit.price.currency,
        availability: 'https://schema.org/InStock',
      },
    };
    return {
      title: kit.name,
      description: kit.tagline || `${kit.name}, ${kit.revision}: an instrument to print at home.`,
      extra: [
        `<meta property="og:type" content="product">`,
        `<meta property="product:price:amount" content="${escapeHtml(price)}">`,
        `<meta property="product:price:currency" content="${escapeHtml(kit.price.currency)}">`,
        `<script type="application/ld+json">${scriptJson(product)}</script>`,
      ].join('\n    '),
    };
  }
}

/** JSON that cannot end the script element it stands in, whatever a kit is called. */
const scriptJson = (value: unknown): string =>
  JSON.stringify(value).replace(
    /[<>&\u2028\u2029]/g,
    (sign) => `\\u${sign.charCodeAt(0).toString(16).padStart(4, '0')}`,
  );
