// Loaded before each file of window tests: keeps a picture of the window when a test has failed.
import { afterEach } from 'vitest';
import { pictureOfFailure } from './scenarios.ts';

afterEach(async ({ task }) => {
  if (task.result?.state === 'fail') await pictureOfFailure(task.name);
});
