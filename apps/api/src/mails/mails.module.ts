import { Global, Module } from '@nestjs/common';
import { MailOutbox } from './mail-outbox.js';
import { SendMail } from './send-mail.js';

@Global()
@Module({ providers: [MailOutbox, SendMail], exports: [MailOutbox] })
export class MailsModule {}
