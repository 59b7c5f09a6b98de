import { canonicalJson } from './canonical-json.ts';
import { digestJson } from './digest.ts';
import type { Bundle, SigningKey } from './model.ts';
import { signSeal } from './sign.ts';

export type BundleParts = Omit<Bundle, 'antinode' | 'seal'>;

/** Closes a bundle with the server's seal; returns the text of the file: canonical JSON and one line feed. */
export async function sealBundle(parts: BundleParts, serverKey: SigningKey): Promise<string> {
  const { manifest, files, report, signatures, keys, log } = parts;
  const content: Omit<Bundle, 'seal'> = { antinode: 'bundle/1', manifest, files, report, signatures, keys, log };
  const seal = await signSeal({ antinode: 'seal/1', bundle: digestJson(content) }, serverKey);
  return bundleText({ ...content, seal });
}

/** The one text that a bundle may have. */
export function bundleText(bundle: Bundle): string {
  return `${canonicalJson(bundle)}\n`;
}
