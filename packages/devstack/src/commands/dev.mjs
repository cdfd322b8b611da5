import { join } from 'node:path';
import { runCommand } from '../command.mjs';
import { followLog } from '../follow-log.mjs';
import { runStand } from '../run-stand.mjs';

await runCommand(
  (supervisor) =>
    runStand(supervisor, {
      mode: 'dev',
      onReady({ logs }) {
        for (const name of ['compiler', 'api', 'vite']) followLog(join(logs, `${name}.log`), name);
      },
    }),
  { codeWhenInterrupted: 0 },
);
