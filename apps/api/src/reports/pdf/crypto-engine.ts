import { webcrypto } from 'node:crypto';
import { CryptoEngine, setEngine } from 'pkijs';

/** What pkijs computes with: Node's own cryptography. Its types name those of a browser. */
export const cryptoEngine = new CryptoEngine({ name: 'node', crypto: webcrypto as never });
// Some doors of pkijs take no engine and use the one that was set.
setEngine('node', cryptoEngine);
