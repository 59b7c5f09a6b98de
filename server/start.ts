import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { makeApp, makeLogger } from './app.ts';
import { loadServerKey } from './auth/server-key.ts';
import type { ServerConfig } from './config.ts';
import type { OpenDatabase } from './db/database.ts';
import { openDatabase } from './db/open.ts';
import { makeEvaluatePool, type EvaluatePool, type PoolLimits } from './evaluate/evaluate-pool.ts';
import { seedDemo, type DemoPerson } from './seed/demo.ts';
import type { Context } from './services/context.ts';

export interface RunningServer {
  /** Address under which it answers, without a slash at its end. */
  readonly url: string;
  /** Id of the key with which it seals bundles: `verify --key` takes it. */
  readonly serverKey: string;
  /** Sign-ins of the demo study; empty without `isDemo`. */
  readonly demo: readonly DemoPerson[];
  readonly stop: () => Promise<void>;
}

/** What tests put in the place of the real thing. */
export interface StartOptions {
  readonly now?: () => Date;
  readonly pool?: Partial<PoolLimits>;
}

/** Opens the database, brings it up to date, and listens. */
export async function startServer(config: ServerConfig, options: StartOptions = {}): Promise<RunningServer> {
  const database = await openDatabase(config);
  const pool = makeEvaluatePool(options.pool);
  try {
    return await listen(config, database, pool, options);
  } catch (cause) {
    await pool.stop();
    await database.close();
    throw cause;
  }
}

async function listen(
  config: ServerConfig,
  database: OpenDatabase,
  pool: EvaluatePool,
  { now = () => new Date() }: StartOptions,
): Promise<RunningServer> {
  let url = config.publicUrl ?? '';
  const serverKey = await loadServerKey(database.db, config);
  const context: Context = { db: database.db, pool, serverKey, isDemo: config.isDemo, now, address: () => url };
  const demo = config.isDemo ? await seedDemo(context) : [];
  const server = createServer(makeApp(context, makeLogger(config)));
  const { port } = await bind(server, config);
  if (url === '') url = `http://${config.host.includes(':') ? `[${config.host}]` : config.host}:${port}`;
  const stop = async (): Promise<void> => {
    await close(server);
    await pool.stop();
    await database.close();
  };
  return { url, serverKey: serverKey.publicKey.kid, demo, stop };
}

function bind(server: Server, { host, port }: ServerConfig): Promise<AddressInfo> {
  return new Promise((resolve, reject) => {
    server.once('error', (cause: NodeJS.ErrnoException) => {
      const taken =
        cause.code === 'EADDRINUSE' ? new Error(`port ${port} of ${host} is taken by another program`) : cause;
      reject(taken);
    });
    server.listen(port, host, () => resolve(server.address() as AddressInfo));
  });
}

function close(server: Server): Promise<void> {
  return new Promise((resolve) => {
    server.close(() => resolve());
    // Browsers keep connections open; those that wait for nothing are ended.
    server.closeAllConnections();
  });
}
