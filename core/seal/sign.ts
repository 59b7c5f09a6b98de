import { signJws } from './jws.ts';
import type { LogHead, SealClaims, SignatureClaims, SigningKey } from './model.ts';

/** A person's signature over a manifest. */
export async function signClaims(claims: SignatureClaims, key: SigningKey): Promise<string> {
  return signJws('antinode-signature+jws', claims, key);
}

/** The server's word on the state of its log. */
export async function signLogHead(head: LogHead, key: SigningKey): Promise<string> {
  return signJws('antinode-log-head+jws', head, key);
}

/** The server's word that a bundle is whole. */
export async function signSeal(claims: SealClaims, key: SigningKey): Promise<string> {
  return signJws('antinode-seal+jws', claims, key);
}
