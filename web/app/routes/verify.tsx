import { VerifyView } from '../../features/verify/verify-view.tsx';
import { PageTitle } from '../../ui/heading.tsx';
import { Shell } from '../shell.tsx';

export function VerifyRoute() {
  return (
    <Shell title="Verify a bundle" crumbs={[{ label: 'Verify' }]}>
      <PageTitle below="Signatures, digests, the log, and a full evaluation: each proof is listed with what it proves.">
        Verify a bundle
      </PageTitle>
      <VerifyView />
    </Shell>
  );
}
