export {};

function portFrom(name: string, environment: NodeJS.ProcessEnv): number {
  const text = environment[name] || '0';
  if (!/^\d{1,5}$/.test(text) || Number(text) > 65_535) {
    throw new Error(`${name} must be a port number from 0 to 65535, not "${text}".`);
  }
  return Number(text);
}

// maildev tells its address through `console.info`; standard output is for the one line that says ready.
console.info = console.error;

try {
  const mailDirectory = process.env.FAKE_MAIL_DIR;
  if (!mailDirectory) throw new Error('FAKE_MAIL_DIR must name a folder for the messages.');
  const smtpPort = portFrom('FAKE_MAIL_SMTP_PORT', process.env);
  const webPort = portFrom('FAKE_MAIL_WEB_PORT', process.env);
  // maildev is slow to load: a wrong setting is told before that.
  const { startFakeMail } = await import('./index.js');
  const mail = await startFakeMail({ smtpPort, webPort, mailDirectory });
  let isStopping = false;
  const stop = () => {
    if (isStopping) return;
    isStopping = true;
    void mail.stop().then(() => process.exit(0));
  };
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);
  console.log(JSON.stringify({ ready: true, url: mail.url, smtpPort: mail.smtpPort }));
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
}
