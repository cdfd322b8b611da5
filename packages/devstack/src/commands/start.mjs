import { runCommand } from '../command.mjs';
import { runStand } from '../run-stand.mjs';

await runCommand((supervisor) => runStand(supervisor, { mode: 'start' }), { codeWhenInterrupted: 0 });
