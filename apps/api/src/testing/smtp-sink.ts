import { createServer, type AddressInfo, type Server, type Socket } from 'node:net';

export interface SmtpSink {
  readonly server: Server;
  readonly port: number;
  /** Those whose last line arrived. */
  readonly mails: string[];
  /** What has arrived of the mail under way. */
  pending(): string;
  /** How many connections were opened so far. */
  connections(): number;
}

/** The least of an SMTP server (RFC 5321): keeps each mail whose last line arrived. */
export const startSmtpSink = async (answerToData = '250 2.0.0 taken'): Promise<SmtpSink> => {
  const mails: string[] = [];
  let opened = 0;
  let unfinished = '';
  const server = createServer((socket: Socket) => {
    let data: string | null = null;
    let rest = '';
    opened += 1;
    socket.write('220 sink ESMTP\r\n');
    socket.on('error', () => socket.destroy());
    socket.on('data', (chunk: Buffer) => {
      rest += chunk.toString('latin1');
      for (;;) {
        if (data === null) {
          const end = rest.indexOf('\r\n');
          if (end < 0) return;
          const command = rest.slice(0, end).toUpperCase();
          rest = rest.slice(end + 2);
          if (command === 'DATA') {
            data = '';
            socket.write('354 go on\r\n');
          } else if (command === 'QUIT') socket.end('221 bye\r\n');
          else socket.write('250 ok\r\n');
        } else {
          const end = rest.indexOf('\r\n.\r\n');
          unfinished = rest;
          if (end < 0) return;
          mails.push(rest.slice(0, end));
          rest = rest.slice(end + 5);
          data = null;
          socket.write(`${answerToData}\r\n`);
        }
      }
    });
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  return {
    server,
    port: (server.address() as AddressInfo).port,
    mails,
    pending: () => unfinished,
    connections: () => opened,
  };
};
