import { ensurePackages } from './lib/ensure-packages.mjs';
import { reportAndExit } from './lib/run-command.mjs';
import { runValidateSteps } from './lib/validate-steps.mjs';

/** The first part of `npm test`: what can be said without running the product. */
try {
  await ensurePackages();
  const { passed, failed } = await runValidateSteps();
  console.log(`\nvalidate: ${passed} passed, ${failed} failed`);
  process.exitCode = failed > 0 ? 1 : 0;
} catch (error) {
  reportAndExit(error);
}
