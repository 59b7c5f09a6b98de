import { createCipheriv, createDecipheriv, randomBytes } from 'node:crypto';

const NONCE_BYTES = 12;
const TAG_BYTES = 16;

/** AES-256-GCM: nonce, ciphertext and tag as base64url. `purpose` is bound in: a box of one kind does not open as another. */
export function closeBox(text: string, key: Uint8Array, purpose: string): string {
  const nonce = randomBytes(NONCE_BYTES);
  const cipher = createCipheriv('aes-256-gcm', key, nonce, { authTagLength: TAG_BYTES });
  cipher.setAAD(Buffer.from(purpose, 'utf8'));
  const body = Buffer.concat([cipher.update(text, 'utf8'), cipher.final()]);
  return Buffer.concat([nonce, body, cipher.getAuthTag()]).toString('base64url');
}

/** Throws when the key or the purpose is not the one with which it was closed, or a bit has changed. */
export function openBox(box: string, key: Uint8Array, purpose: string): string {
  const bytes = Buffer.from(box, 'base64url');
  const decipher = createDecipheriv('aes-256-gcm', key, bytes.subarray(0, NONCE_BYTES), { authTagLength: TAG_BYTES });
  decipher.setAAD(Buffer.from(purpose, 'utf8'));
  decipher.setAuthTag(bytes.subarray(-TAG_BYTES));
  const body = bytes.subarray(NONCE_BYTES, -TAG_BYTES);
  return Buffer.concat([decipher.update(body), decipher.final()]).toString('utf8');
}
