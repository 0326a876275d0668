import '../lend-digest';
import { runCheck } from './run-check';

process.exitCode = await runCheck(process.argv.slice(2), {
  out: (text) => process.stdout.write(text),
  err: (text) => process.stderr.write(text),
});
