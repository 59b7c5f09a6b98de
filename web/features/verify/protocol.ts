import type { Report } from '../../../core/report/model.ts';
import type { Verification } from '../../../core/seal/model.ts';

/** What the page asks of the worker: a bundle's bytes, and the server key that the reader trusts, if any. */
export interface VerifyRequest {
  readonly file: Uint8Array;
  readonly serverKey?: string;
}

export type VerifyAnswer =
  | { readonly kind: 'verified'; readonly verification: Verification; readonly report: Report | null }
  | { readonly kind: 'failed'; readonly message: string };
