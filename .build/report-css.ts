/** The report's style sheet as one file: KaTeX, the report's own rules, and all fonts inlined, so that a report needs no network. */
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { build, type Plugin } from 'esbuild';

const root = join(import.meta.dirname, '..');

/** Scripts that reports are written in. Faces of other scripts would double the size of every report file. */
const SUBSETS = /(?:-latin-(?!ext)|-greek-)/;

const FONT_FACE = /@font-face\s*{[^}]*}/g;
const OLDER_FORMAT = /,\s*url\([^)]*\.(?:woff|ttf)\)\s*format\([^)]*\)/g;

/** Keeps of each font the faces that reports need, in woff2 alone. */
const chosenFaces: Plugin = {
  name: 'chosen-faces',
  setup(build) {
    build.onLoad({ filter: /@fontsource.*\.css$/ }, async ({ path }) => ({
      contents: (await woff2Only(path)).replace(FONT_FACE, (face) => (SUBSETS.test(face) ? face : '')),
      loader: 'css',
    }));
    build.onLoad({ filter: /katex.*\.css$/ }, async ({ path }) => ({ contents: await woff2Only(path), loader: 'css' }));
  },
};

async function woff2Only(path: string): Promise<string> {
  return (await readFile(path, 'utf8')).replace(OLDER_FORMAT, '');
}

export async function buildReportCss(): Promise<void> {
  await build({
    absWorkingDir: root,
    entryPoints: ['web/report/standalone.css'],
    outfile: 'dist/report/report.css',
    bundle: true,
    minify: true,
    logLevel: 'warning',
    loader: { '.woff2': 'dataurl' },
    plugins: [chosenFaces],
  });
}
