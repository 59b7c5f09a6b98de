import { useSearchParams } from 'react-router';
import { DeviceView } from '../../features/device/device-view.tsx';
import { normaliseUserCode } from '../../features/device/user-code.ts';
import { PageTitle } from '../../ui/heading.tsx';
import { Shell } from '../shell.tsx';
import { SignedIn } from '../signed-in.tsx';

export function DeviceRoute() {
  const [search, setSearch] = useSearchParams();
  return (
    <Shell title="Sign in a terminal" width="narrow" crumbs={[{ label: 'Sign in a terminal' }]}>
      <PageTitle>Sign in a terminal</PageTitle>
      <SignedIn>
        {(me) => (
          <DeviceView
            code={normaliseUserCode(search.get('code') ?? '')}
            onCode={(code) => setSearch({ code })}
            signedInAs={me.name}
          />
        )}
      </SignedIn>
    </Shell>
  );
}
