import { Injectable } from '@nestjs/common';
import { Steps } from '../../database/steps.js';

/** Run where a kit may have come to stand in the shop with something released: it was listed, or released. */
@Injectable()
export class KitInShopSteps extends Steps<{ readonly kitId: string }> {}
