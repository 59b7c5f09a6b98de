import { isSealClaims } from './claims.ts';
import { digestJson } from './digest.ts';
import { openJws } from './jws.ts';
import { isSoundKey } from './keys.ts';
import type { Bundle, Proof, PublicKey } from './model.ts';
import { invalid, judge, notAllowed, unless, type Fault } from './verdict.ts';

/** That the carried server key is sound, and is the wanted one where the reader knows which that is. */
export function proveServerKey(server: PublicKey, wanted: string | undefined): Proof {
  return judge(
    'Key of the server',
    [
      ...unless(isSoundKey(server), invalid('the key is malformed, or its id is not its thumbprint')),
      ...unless(
        wanted === undefined || wanted === server.kid,
        notAllowed(`the bundle was sealed with the key ${server.kid}, not with the wanted one`),
      ),
    ],
    wanted === undefined
      ? `as carried in the bundle: compare ${server.kid} with the one your team server publishes`
      : `${server.kid}, as wanted`,
  );
}

/** That the server has sealed exactly this bundle. */
export async function proveSeal(bundle: Bundle, serverKeys: ReadonlyMap<string, PublicKey>): Promise<Proof> {
  return judge('Seal of the server', await sealFaults(bundle, serverKeys), 'over all the rest of the bundle');
}

async function sealFaults(bundle: Bundle, serverKeys: ReadonlyMap<string, PublicKey>): Promise<readonly Fault[]> {
  const { seal, ...content } = bundle;
  const opened = await openJws(seal, 'antinode-seal+jws', serverKeys);
  if ('fault' in opened) return [opened];
  if (!isSealClaims(opened.payload)) return [invalid('it does not say what a seal must say')];
  return unless(opened.payload.bundle === digestJson(content), invalid('the bundle is not the one that was sealed'));
}
