#!/usr/bin/env node
import { runCli } from './program.ts';
import { processSurroundings } from './terminal.ts';

// A reader that has seen enough (`antinode run … | head`) closes the pipe; that is no fault.
process.stdout.on('error', (cause: NodeJS.ErrnoException) => {
  if (cause.code === 'EPIPE') process.exit(0);
  throw cause;
});
process.once('SIGINT', () => process.exit(130));

process.exitCode = await runCli(process.argv.slice(2), processSurroundings());
