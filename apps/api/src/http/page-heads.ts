import { Injectable } from '@nestjs/common';
import { InjectConfig, type Config } from '../config/config.js';

export interface PageHead {
  readonly title: string;
  readonly description: string;
  /** More tags, already escaped. */
  readonly extra?: string;
}
export type HeadMaker = (path: string) => Promise<PageHead | null>;
/** More tags, already escaped. */
export type TagMaker = (path: string) => Promise<string | null>;

export const escapeHtml = (text: string): string =>
  text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');

/** Titles and share tags of the single-page store; rooms register makers for their own addresses. */
@Injectable()
export class PageHeads {
  private readonly makers: HeadMaker[] = [];
  private readonly tagMakers: TagMaker[] = [];

  constructor(@InjectConfig() private readonly config: Config) {}

  register(maker: HeadMaker): void {
    this.makers.push(maker);
  }

  /** Tags that a room adds to another room's page. */
  registerTags(maker: TagMaker): void {
    this.tagMakers.push(maker);
  }

  async headFor(path: string): Promise<string> {
    let head: PageHead | null = null;
    for (const maker of this.makers) head ??= await maker(path);
    const tags = await Promise.all(this.tagMakers.map((maker) => maker(path)));
    const name = this.config.WORKSHOP_NAME;
    const {
      title,
      description,
      extra = '',
    } = head ?? {
      title: name,
      description: 'Musical instruments you print at home, measured, voiced and proved.',
    };
    const address = new URL(path, this.config.BASE_URL).href;
    return [
      `<title>${escapeHtml(title === name ? name : `${title} · ${name}`)}</title>`,
      `<meta name="description" content="${escapeHtml(description)}">`,
      `<meta property="og:title" content="${escapeHtml(title)}">`,
      `<meta property="og:description" content="${escapeHtml(description)}">`,
      `<meta property="og:site_name" content="${escapeHtml(name)}">`,
      `<meta property="og:url" content="${escapeHtml(address)}">`,
      extra,
      ...tags.filter((tag) => tag !== null),
    ].join('\n    ');
  }
}
