import { TokensView } from '../../features/tokens/tokens-view.tsx';
import { PageTitle } from '../../ui/heading.tsx';
import { Panel } from '../../ui/panel.tsx';
import { BoneRows } from '../../ui/skeleton.tsx';
import { Shell } from '../shell.tsx';
import { SignedIn } from '../signed-in.tsx';

export function TokensRoute() {
  return (
    <Shell title="Personal tokens" crumbs={[{ label: 'Personal tokens' }]}>
      <PageTitle below="For scripts, and for machines on which nobody can open a browser. A token acts as you.">
        Personal tokens
      </PageTitle>
      <SignedIn>
        {() => (
          <Panel fallback={<BoneRows rows={3} label="Loading your tokens" />}>
            <TokensView />
          </Panel>
        )}
      </SignedIn>
    </Shell>
  );
}
