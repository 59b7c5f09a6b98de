import { isAbsolute, resolve } from 'node:path';

export const LOG_LEVELS = ['silent', 'fatal', 'error', 'warn', 'info', 'debug'] as const;
export type LogLevel = (typeof LOG_LEVELS)[number];

/** `data` for a database in memory, gone when the server stops. */
export const IN_MEMORY = ':memory:';

export interface ServerConfig {
  /** Absolute path of the data folder, or `:memory:`. */
  readonly data: string;
  /** Address of a PostgreSQL server; without it the database is PGlite in the data folder. */
  readonly databaseUrl?: string;
  readonly host: string;
  /** 0: any free port. */
  readonly port: number;
  /** Origin under which browsers reach the server, where it is not the host and port. */
  readonly publicUrl?: string;
  readonly logLevel: LogLevel;
  /** 32 bytes under which the server's own key is encrypted; without it a key file in the data folder. */
  readonly masterKey?: Buffer;
  /** Seeds the demo study into an empty database, and lets its people sign in. */
  readonly isDemo: boolean;
}

/** What the command line may set; it wins over the environment. */
export interface ServerOptions {
  readonly data?: string | undefined;
  readonly host?: string | undefined;
  readonly port?: string | number | undefined;
  readonly logLevel?: string | undefined;
  readonly demo?: boolean | undefined;
}

/** Every bad variable at once, so that one start shows all that is wrong. */
export class ConfigError extends Error {
  readonly faults: readonly string[];

  constructor(faults: readonly string[]) {
    super(`the server's settings are wrong:\n${faults.map((fault) => `  ${fault}`).join('\n')}`);
    this.name = 'ConfigError';
    this.faults = faults;
  }
}

type Environment = Readonly<Record<string, string | undefined>>;

/** Reads the settings once, at the start. Throws a ConfigError that names each bad one. */
export function readConfig(env: Environment = process.env, options: ServerOptions = {}): ServerConfig {
  const faults: string[] = [];
  const read = <T>(name: string, text: string | undefined, parse: (text: string) => T | null, want: string) => {
    if (text === undefined || text === '') return undefined;
    const value = parse(text);
    if (value === null) faults.push(`${name} must be ${want}`);
    return value ?? undefined;
  };
  const databaseUrl = read('DATABASE_URL', env['DATABASE_URL'], databaseAddress, 'an address postgres://…');
  const publicUrl = read('PUBLIC_URL', env['PUBLIC_URL'], origin, 'an origin such as https://antinode.example');
  const masterKey = read('ANTINODE_MASTER_KEY', env['ANTINODE_MASTER_KEY'], keyBytes, '64 hexadecimal digits');
  const data = read('ANTINODE_DATA', options.data ?? env['ANTINODE_DATA'], folder, 'the path of a folder');
  const host = read('HOST', options.host ?? env['HOST'], hostName, 'a host name or an address');
  const port = read('PORT', options.port?.toString() ?? env['PORT'], portNumber, 'a whole number from 0 to 65535');
  const logLevel = read('LOG_LEVEL', options.logLevel ?? env['LOG_LEVEL'], level, `one of ${LOG_LEVELS.join(', ')}`);
  if (faults.length > 0) throw new ConfigError(faults);
  return {
    data: data ?? resolve('data'),
    host: host ?? '127.0.0.1',
    port: port ?? 5181,
    logLevel: logLevel ?? 'warn',
    isDemo: options.demo ?? false,
    ...(databaseUrl === undefined ? {} : { databaseUrl }),
    ...(publicUrl === undefined ? {} : { publicUrl }),
    ...(masterKey === undefined ? {} : { masterKey }),
  };
}

function databaseAddress(text: string): string | null {
  return URL.canParse(text) && /^postgres(ql)?:$/.test(new URL(text).protocol) ? text : null;
}

function origin(text: string): string | null {
  const url = URL.canParse(text) ? new URL(text) : null;
  if (!url || !/^https?:$/.test(url.protocol) || url.pathname !== '/' || url.search !== '') return null;
  return url.origin;
}

function keyBytes(text: string): Buffer | null {
  return /^[0-9a-f]{64}$/i.test(text) ? Buffer.from(text, 'hex') : null;
}

function folder(text: string): string | null {
  if (text.includes('\0')) return null;
  return text === IN_MEMORY || isAbsolute(text) ? text : resolve(text);
}

function hostName(text: string): string | null {
  return /^[A-Za-z0-9.:_-]+$/.test(text) ? text : null;
}

function portNumber(text: string): number | null {
  return /^\d{1,5}$/.test(text) && Number(text) <= 65_535 ? Number(text) : null;
}

function level(text: string): LogLevel | null {
  return LOG_LEVELS.find((known) => known === text) ?? null;
}
