import { styleText } from 'node:util';

/** Where a command writes: results to `out`, all else to `err`. */
export interface Streams {
  readonly out: (text: string) => void;
  readonly err: (text: string) => void;
  readonly outIsTerminal: boolean;
  readonly errIsTerminal: boolean;
  readonly readStdin: () => Promise<Uint8Array>;
}

/** What a command may use of its surroundings; tests give their own. */
export interface Surroundings {
  readonly streams: Streams;
  readonly env: Readonly<Record<string, string | undefined>>;
  readonly cwd: string;
}

type Style = Parameters<typeof styleText>[0];
export type Paint = (style: Style, text: string) => string;

const plain: Paint = (_, text) => text;
const coloured: Paint = (style, text) => styleText(style, text, { validateStream: false });

/** Colour only on a terminal, and never against NO_COLOR, a dumb terminal or `--no-color`. */
export function paintFor(isTerminal: boolean, env: Surroundings['env'], wanted: boolean): Paint {
  const refused = !wanted || (env['NO_COLOR'] ?? '') !== '' || env['TERM'] === 'dumb';
  return isTerminal && !refused ? coloured : plain;
}

export function processSurroundings(): Surroundings {
  return {
    streams: {
      out: (text) => void process.stdout.write(text),
      err: (text) => void process.stderr.write(text),
      outIsTerminal: process.stdout.isTTY,
      errIsTerminal: process.stderr.isTTY,
      readStdin,
    },
    env: process.env,
    cwd: process.cwd(),
  };
}

async function readStdin(): Promise<Uint8Array> {
  const chunks: Buffer[] = [];
  for await (const chunk of process.stdin) chunks.push(chunk as Buffer);
  return Buffer.concat(chunks);
}
