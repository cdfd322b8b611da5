import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { InjectConfig, type Config } from '../config/config.js';
import { notFound } from '../http/refusal.js';
import { CreditNote } from './credit-note.model.js';
import { describeCreditNote, describeReceipt, type Letterhead } from './receipt-pdf/describe-receipt.js';
import { typesetReceipt } from './receipt-pdf/typeset-receipt.js';
import { Receipt } from './receipt.model.js';
import { sellerOf } from './seller.js';

export interface ReceiptFile {
  readonly fileName: string;
  readonly bytes: Buffer;
}

/** Receipts and credit notes as PDF, typeset when they are asked for: the same rows give the same bytes. */
@Injectable()
export class ReceiptFiles {
  constructor(
    @InjectModel(Receipt) private readonly receipts: typeof Receipt,
    @InjectModel(CreditNote) private readonly notes: typeof CreditNote,
    @InjectConfig() private readonly config: Config,
  ) {}

  /** Whether this person may see the order is for the caller to know. */
  async receipt(orderId: string): Promise<ReceiptFile> {
    const receipt = await this.receiptOf(orderId);
    return {
      fileName: `receipt-${receipt.label}.pdf`,
      bytes: await typesetReceipt(describeReceipt(receipt, this.letterhead())),
    };
  }

  async creditNote(orderId: string, creditNoteId: string): Promise<ReceiptFile> {
    const note = await this.notes.findOne({ where: { id: creditNoteId, orderId } });
    if (!note) throw notFound('credit note of this order');
    const receipt = await this.receiptOf(orderId);
    return {
      fileName: `credit-note-${note.label}.pdf`,
      bytes: await typesetReceipt(describeCreditNote(note, receipt, this.letterhead())),
    };
  }

  private async receiptOf(orderId: string): Promise<Receipt> {
    const receipt = await this.receipts.findOne({ where: { orderId } });
    if (!receipt) throw notFound('receipt: one is written when an order is paid');
    return receipt;
  }

  private letterhead(): Letterhead {
    const { WORKSHOP_NAME: name, BASE_URL: address, WORKSHOP_LOCALE: locale } = this.config;
    return { shop: { name, address }, seller: sellerOf(this.config), locale };
  }
}
