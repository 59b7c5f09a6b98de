import { ConfigError, readConfig, type ServerOptions } from './config.ts';
import { startServer, type RunningServer } from './start.ts';

/** What the command line loads for `serve`. Settings that are wrong are told as text; nothing is started then. */
export async function serve(
  env: Readonly<Record<string, string | undefined>>,
  options: ServerOptions,
): Promise<RunningServer | { readonly faults: readonly string[] }> {
  try {
    return await startServer(readConfig(env, options));
  } catch (cause) {
    if (cause instanceof ConfigError) return { faults: cause.faults };
    throw cause;
  }
}
