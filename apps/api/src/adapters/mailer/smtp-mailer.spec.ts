import { startSmtpSink } from '../../testing/smtp-sink.js';
import { MailRefused } from './mailer.js';
import { SmtpMailer } from './smtp-mailer.js';

const mail = {
  to: 'wren@mail.example',
  subject: 'Zwölf Töne',
  html: '<p>one</p>',
  text: 'one\n.two\n',
  messageId: '<a@b.example>',
};

describe('sending over SMTP', () => {
  it('hands over before the last line, and the server takes the mail after it', async () => {
    const { server, port, mails, pending, connections } = await startSmtpSink();
    const mailer = new SmtpMailer(`smtp://127.0.0.1:${port}`, 'Workshop <bench@saltmarsh.example>');
    const steps: string[] = [];
    const beforeLastLine = async (): Promise<void> => {
      // Long enough for all but the last line to have arrived.
      await new Promise((resolve) => setTimeout(resolve, 100));
      steps.push(
        `handed over, all but the last line is there: ${/one/.test(pending())}, taken ${mails.length}`,
      );
    };
    await mailer.send(mail, { beforeLastLine });
    expect(steps).toEqual(['handed over, all but the last line is there: true, taken 0']);
    expect(mails).toHaveLength(1);
    await mailer.send({ ...mail, messageId: '<c@d.example>' }, { beforeLastLine });
    expect([mails.length, connections()]).toEqual([2, 1]);
    expect(mails[0]).toMatch(/^Message-ID: <a@b\.example>$/im);
    expect(mails[0]).toMatch(/^Auto-Submitted: auto-generated$/im);
    expect(mails[0]).toMatch(/\r\n\.\.two/);
    await mailer.close();
    server.close();
  });

  it('delivers nothing when the process fails before the last line', async () => {
    const { server, port, mails } = await startSmtpSink();
    const mailer = new SmtpMailer(`smtp://127.0.0.1:${port}`, 'Workshop <bench@saltmarsh.example>');
    await expect(
      mailer.send(mail, { beforeLastLine: () => Promise.reject(new Error('the database is away')) }),
    ).rejects.toThrow();
    await mailer.close();
    await new Promise((resolve) => server.close(resolve));
    expect(mails).toEqual([]);
  });

  it('tells a refusal for good from a fault that passes', async () => {
    for (const [answer, isFinal] of [
      ['550 5.1.1 no such mailbox', true],
      ['451 4.3.0 try again', false],
    ] as const) {
      const { server, port } = await startSmtpSink(answer);
      const mailer = new SmtpMailer(`smtp://127.0.0.1:${port}`, 'Workshop <bench@saltmarsh.example>');
      const fault: unknown = await mailer
        .send(mail, { beforeLastLine: () => Promise.resolve() })
        .catch((one: unknown) => one);
      expect([answer, fault instanceof MailRefused]).toEqual([answer, isFinal]);
      await mailer.close();
      server.close();
    }
  });
});
