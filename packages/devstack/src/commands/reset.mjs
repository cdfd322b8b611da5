import { refuseWhenRunning, waitForWatchdog } from '../lock.mjs';
import { homeFolder } from '../paths.mjs';
import { say, sayFailure } from '../report.mjs';
import { removeStandData } from '../stand-data.mjs';

try {
  refuseWhenRunning(homeFolder, 'remove its data');
  await waitForWatchdog(homeFolder);
  const removed = removeStandData(homeFolder);
  say(
    removed.length === 0
      ? 'There was no data to remove.'
      : `Removed from .windchest: ${removed.join(', ')}. The next "npm start" begins with a fresh demo workshop.`,
  );
} catch (error) {
  sayFailure(error);
  process.exitCode = 1;
}
