import type { ServerKey } from '../auth/server-key.ts';
import type { Database } from '../db/database.ts';
import type { EvaluatePool } from '../evaluate/evaluate-pool.ts';

/** What every use case works with. */
export interface Context {
  readonly db: Database;
  readonly pool: EvaluatePool;
  readonly serverKey: ServerKey;
  /** Whether the invented people of the demo study may sign in. */
  readonly isDemo: boolean;
  readonly now: () => Date;
  /** Address under which people reach the server, without a slash at its end. */
  readonly address: () => string;
}
