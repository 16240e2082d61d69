import { installationKeySchema } from '#shared/contracts/packages';
import { defineRoute } from '../../http/define-route';
import type { InstallationKey } from '../installation-key';

/** GET /installation-key */
export const showInstallationKey = (key: InstallationKey) =>
  defineRoute({
    method: 'get',
    path: '/installation-key',
    summary: 'The public key that approvals and packages are signed with',
    access: { kind: 'public', reason: 'A public key is for everybody who checks a document.' },
    response: installationKeySchema,
    handle: async () => ({ publicKey: key.publicKey, fingerprint: key.fingerprint }),
  });
