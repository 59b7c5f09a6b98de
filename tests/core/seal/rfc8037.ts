import type { SigningKey } from '../../../core/seal/model.ts';

/** The key of RFC 8037 appendix A.1. */
export const RFC_8037_KEY: SigningKey = {
  kty: 'OKP',
  crv: 'Ed25519',
  x: '11qYAYKxCrfVS_7TyWQHOg7hcvPapiMlrwIaaPcHURo',
  d: 'nWGxne_9WmC6hEr0kuwsxERJxWl7MmkZcDusAxyuf2A',
};
